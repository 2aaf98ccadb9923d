using System.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts;

/// <summary>Reads the parameters off a tree. One whose default or domain is no fixed number is left out: binding tells why.</summary>
internal static class ParameterReader
{
    public static IReadOnlyList<ParameterInfo> Read(ScriptTree tree) =>
        [.. tree.Statements.OfType<ParameterStatement>().Select(Read).OfType<ParameterInfo>()];

    private static ParameterInfo? Read(ParameterStatement parameter)
    {
        Domain domain = parameter.Domain;
        if (Fixed(parameter.Default) is not { } value)
            return null;
        if (domain.Values is { } listed)
            return Listed(parameter.Name.Text, value, [.. listed.Select(Fixed)]);
        if (domain.From is null || domain.To is null || Fixed(domain.From) is not { } from || Fixed(domain.To) is not { } to)
            return null;
        return domain.Whole ? Whole(parameter.Name.Text, value, from, to) : new ParameterInfo(parameter.Name.Text, value, null, from, to);
    }

    private static ParameterInfo? Listed(string name, Rational value, Rational?[] listed)
    {
        Rational[] values = [.. listed.OfType<Rational>()];
        return values.Length == 0 || values.Length < listed.Length ? null : new ParameterInfo(name, value, values, values.Min(), values.Max());
    }

    private static ParameterInfo Whole(string name, Rational value, Rational from, Rational to)
    {
        BigInteger first = from.Ceiling(), last = to.Floor();
        return new ParameterInfo(name, value, new WholeRange(first, last), Rational.From(first), Rational.From(last));
    }

    /// <summary>The value of an expression of numbers and the four rules of arithmetic; null for anything else.</summary>
    private static Rational? Fixed(Expression expression) => expression switch
    {
        NumberExpression number => number.Value,
        UnaryExpression { Operator: UnaryOperator.Minus } negation => -Fixed(negation.Operand),
        BinaryExpression binary => Combine(binary.Operator, Fixed(binary.Left), Fixed(binary.Right)),
        _ => null,
    };

    private static Rational? Combine(BinaryOperator binary, Rational? left, Rational? right) => binary switch
    {
        BinaryOperator.Plus => left + right,
        BinaryOperator.Minus => left - right,
        BinaryOperator.Times => left * right,
        BinaryOperator.Divide when right?.Sign != 0 => left / right,
        BinaryOperator.Modulo when right?.Sign != 0 => left % right,
        _ => null,
    };
}
