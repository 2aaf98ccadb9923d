using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using Xunit;

namespace ResourceCheck.Tests.Binding;

/// <summary>The value of every operator and function, none included: the table of the fine print, worked by hand.</summary>
public sealed class EvaluatorTests
{
    // Slots of the table: Ada holds a = 0, b = 1, c = none, t = true, f = false, x = level.
    private static readonly Value[] Slots = [Value.Of(0), Value.Of(1), Value.None, Value.True, Value.False, new BasisValue(BasisKind.Level, -1, null)];

    [Theory]
    [InlineData("c = none", "true")]
    [InlineData("a = none", "false")]
    [InlineData("a != none", "true")]
    [InlineData("c != none", "false")]
    [InlineData("c < 1", "false")]
    [InlineData("c >= 1", "false")]
    [InlineData("b >= 1", "true")]
    [InlineData("b > 1", "false")]
    [InlineData("a <= 0", "true")]
    [InlineData("c + 1", "none")]
    [InlineData("-c", "none")]
    [InlineData("b / a", "none")]
    [InlineData("b mod a", "none")]
    [InlineData("(a - b) mod 3", "2")]
    [InlineData("b / 3", "1/3")]
    [InlineData("0.1 + 0.2 = 0.3", "true")]
    [InlineData("b * 20", "20")]
    [InlineData("t and c = none", "true")]
    [InlineData("t and f or t", "true")]
    [InlineData("not f", "true")]
    [InlineData("if t then b else a", "1")]
    [InlineData("if c = 1 then b else a", "0")]
    [InlineData("distinct(a, b)", "true")]
    [InlineData("distinct(a, b, a)", "false")]
    [InlineData("distinct(a, b, c)", "false")]
    [InlineData("same(a, a)", "true")]
    [InlineData("same(c, c)", "false")]
    [InlineData("same(x, level)", "true")]
    [InlineData("same(x, fourier)", "false")]
    [InlineData("missing(a, b)", "2")]
    [InlineData("missing(a, b, c)", "2")]
    [InlineData("missing(a)", "none")]
    [InlineData("missing(a, b, 2)", "none")]
    [InlineData("largest(a, b)", "1")]
    [InlineData("largest(a, c)", "none")]
    [InlineData("abs(a - b)", "1")]
    [InlineData("abs(c)", "none")]
    [InlineData("x = level", "true")]
    [InlineData("x = fourier", "false")]
    [InlineData("phased(0) = fourier", "true")]
    [InlineData("fourier on 3 = fourier", "true")]
    [InlineData("fourier on 2 = fourier", "false")]
    [InlineData("phased(b) = phased(1)", "true")]
    [InlineData("phased(b + 2) = none", "true")]
    [InlineData("Ada = Ada", "true")]
    [InlineData("(if t then Ada else Ben) = Ben", "false")]
    public void Values_are_as_the_fine_print_says(string expression, string expected)
    {
        Value value = ValueEvaluator.Evaluate(Bind(expression), Slots, 3);
        Assert.Equal(expected, value.ToString());
    }

    [Fact]
    public void None_in_logic_counts_as_false()
    {
        Span here = new(0, 0);
        BoundLiteral none = new(here, Value.None), yes = new(here, Value.True);
        Assert.Equal(Value.False, ValueEvaluator.Evaluate(new BoundBinary(here, BinaryOperator.And, yes, none), [], 3));
        Assert.Equal(Value.True, ValueEvaluator.Evaluate(new BoundBinary(here, BinaryOperator.Or, none, yes), [], 3));
        Assert.Equal(Value.True, ValueEvaluator.Evaluate(new BoundUnary(here, UnaryOperator.Not, none), [], 3));
        Assert.Equal(Value.Of(1), ValueEvaluator.Evaluate(new BoundCall(here, ValueFunction.Count, [none, yes]), [], 3));
    }

    private static BoundExpression Bind(string expression)
    {
        Protocol protocol = Bound.Right(
            "parties Ada, Ben, Cyd\nresource antisymmetric on all\ninput a of Ada in {0, none}\ninput b of Ada in {1, none}\ninput c of Ada in {0, none}\n"
            + "input t of Ada in {true, false}\ninput f of Ada in {true, false}\ninput x of Ada in {level, fourier}\n"
            + $"round \"r\"\n  Ada set result to {expression}\nend\nsuccess when true\n");
        return Assert.IsType<SetStep>(Assert.Single(protocol.Steps)).Value;
    }
}
