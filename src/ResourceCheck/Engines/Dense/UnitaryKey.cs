using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Dense;

/// <summary>A local unitary with its arguments evaluated.</summary>
internal sealed record UnitaryKey(UnitaryKind Kind, BasisValue? Basis, int First, int Second, string? File)
{
    /// <summary>Stands for "all levels" where the number of levels is left out.</summary>
    private const int AllLevels = -1;

    /// <summary>Evaluates the arguments; null when one of them is none or does not fit, which makes the unitary the identity.</summary>
    public static UnitaryKey? From(BoundUnitary unitary, Value[] slots, int levels)
    {
        BasisValue? basis = unitary.Basis is null ? null : ValueEvaluator.Evaluate(unitary.Basis, slots, levels) as BasisValue;
        int? first = Whole(unitary.First, slots, levels), second = Whole(unitary.Second, slots, levels);
        bool missing = (unitary.Basis is not null && basis is null) || first is null || second is null;
        return missing ? null : new UnitaryKey(unitary.Kind, basis, first!.Value, second!.Value, unitary.File);
    }

    private static int? Whole(BoundExpression? expression, Value[] slots, int levels)
    {
        if (expression is null)
            return AllLevels;
        return ValueEvaluator.Evaluate(expression, slots, levels) is NumberValue { Number: { IsWhole: true } number } && number.Numerator < int.MaxValue && number.Numerator > int.MinValue
            ? (int)number.Numerator
            : null;
    }
}
