using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using Xunit;

namespace ResourceCheck.Tests.Scripts;

public sealed class ParameterTests
{
    [Fact]
    public void A_list_allows_what_it_lists()
    {
        ParameterInfo x = Single("parameter x = 1 in {0, 1, -1/2}");
        Assert.Equal(("x", Rational.One), (x.Name, x.Default));
        Assert.Equal([Rational.Zero, Rational.One, Rational.From(-1, 2)], x.Values!);
        Assert.Equal((Rational.From(-1, 2), Rational.One), (x.From, x.To));
        Assert.False(x.Allows(2));
    }

    [Fact]
    public void The_ends_of_a_whole_range_are_rounded_inwards()
    {
        ParameterInfo n = Single("parameter n = 4 in 1.5..9 / 2");
        Assert.Equal([2, 3, 4], n.Values!.Select(v => (int)v.Numerator));
        Assert.True(n.Allows(2));
        Assert.False(n.Allows(5));
        Assert.False(n.Allows(Rational.From(5, 2)));
    }

    [Fact]
    public void A_huge_whole_range_costs_nothing()
    {
        ParameterInfo n = Single("parameter n = 4 in 1..1e300");
        Assert.True(n.Allows(123456789));
        Assert.False(n.Allows(0));
        Assert.Equal(7, (int)n.Values![6].Numerator);
    }

    [Fact]
    public void A_real_range_allows_every_number_inside()
    {
        ParameterInfo t = Single("parameter t = 0.06 in 0 to 0.5");
        Assert.Null(t.Values);
        Assert.True(t.Allows(Rational.From(1, 3)));
        Assert.False(t.Allows(1));
    }

    [Theory]
    [InlineData("parameter t = n in 0 to 1")]
    [InlineData("parameter t = 1 / 0 in 0 to 1")]
    [InlineData("parameter t = 1 in {0, n}")]
    [InlineData("parameter t = 1 in 0..n")]
    public void What_is_no_fixed_number_is_left_to_binding(string text) => Assert.Empty(Read(text));

    private static ParameterInfo Single(string text) => Assert.Single(Read(text));

    private static IReadOnlyList<ParameterInfo> Read(string text) => Script.ParametersOf(Script.Parse(new SourceText("t", text)).Tree);
}
