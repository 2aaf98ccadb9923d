using System.Globalization;
using ResourceCheck.Diagnostics;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Arrays written by NumPy and figures evaluated by NumPy: see tests/reference/make_state_fixtures.py.</summary>
public sealed class FixtureTests
{
    /// <summary>Both sides work in double precision on the same numbers.</summary>
    private const double Tolerance = 1e-10;

    [Theory]
    [InlineData("c16-c-v1")]
    [InlineData("c16-f-v1")]
    [InlineData("c16-c-v2")]
    [InlineData("c16-big-f")]
    [InlineData("c8-c")]
    [InlineData("c8-big-c")]
    [InlineData("f8-f")]
    [InlineData("f8-big-c")]
    [InlineData("f4-big-f")]
    [InlineData("vector-c16")]
    [InlineData("vector-f4")]
    [InlineData("four")]
    public void Arrays_of_every_type_order_and_version_have_their_figures(string name)
    {
        Outcome<StateDescription> described = StateFile.Describe(Fixture.PathOf($"{name}.npy"), mend: false);
        Assert.Empty(described.Findings);
        Dictionary<string, double> found = described.Value!.Figures.ToDictionary(figure => figure.Name, figure => figure.Value);
        (string Figure, double Value)[] expected = [.. Expected(name)];
        Assert.NotEmpty(expected);
        Assert.All(expected, e => Assert.Equal(e.Value, found[e.Figure], Tolerance));
        Assert.Equal(expected.Count(e => e.Figure.StartsWith("negativity", StringComparison.Ordinal)), found.Keys.Count(f => f.StartsWith("negativity", StringComparison.Ordinal)));
    }

    [Fact]
    public void The_order_of_storage_does_not_matter() =>
        Assert.Equal(Read("c16-c-v1").Density!, Read("c16-f-v1").Density!);

    [Fact]
    public void A_vector_stays_a_vector() => Assert.NotNull(Read("vector-c16").Ket);

    private static PreparedState Read(string name) => StateFile.Read(Fixture.PathOf($"{name}.npy"), mend: false).Value!;

    private static IEnumerable<(string Figure, double Value)> Expected(string name)
    {
        foreach (string line in File.ReadLines(Fixture.PathOf("expected.csv")).Where(line => line.StartsWith($"{name},", StringComparison.Ordinal)))
        {
            int last = line.LastIndexOf(',');
            yield return (line[(name.Length + 1)..last].Trim('"'), double.Parse(line[(last + 1)..], CultureInfo.InvariantCulture));
        }
    }
}
