using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Lists;

/// <summary>Leaves out the parts of an expression that known values decide, and with them counts that nobody needs.</summary>
internal sealed class Simplification(HashSet<int> open, Func<int, bool> isKnown, Func<BoundExpression, Value> evaluate)
{
    /// <summary>The reading without what known single values decide.</summary>
    /// <param name="reading">The reading.</param>
    /// <param name="isKnown">Whether a slot's value is known.</param>
    /// <param name="evaluate">Value of an expression of known slots.</param>
    public static Reading Of(Reading reading, Func<int, bool> isKnown, Func<BoundExpression, Value> evaluate)
    {
        if (reading.Statistics.Count == 0)
            return reading;
        HashSet<int> temporaries = [.. reading.Statistics.Select(s => s.Temporary)];
        BoundExpression residual = new Simplification(temporaries, isKnown, evaluate).Simplify(reading.Residual);
        HashSet<int> read = [.. Reads.Slots(residual)];
        return new Reading([.. reading.Statistics.Where(s => read.Contains(s.Temporary))], residual);
    }

    private BoundExpression Simplify(BoundExpression expression)
    {
        if (expression is not BoundLiteral && Reads.Slots(expression).All(s => !open.Contains(s) && isKnown(s)))
            return new BoundLiteral(expression.Span, evaluate(expression));
        switch (expression)
        {
            case BoundIf choice:
                BoundExpression condition = Simplify(choice.Condition);
                return condition is BoundLiteral literal
                    ? Simplify(IsTrue(literal) ? choice.Then : choice.Else)
                    : new BoundIf(choice.Span, condition, Simplify(choice.Then), Simplify(choice.Else));
            case BoundBinary { Operator: BinaryOperator.And or BinaryOperator.Or } binary:
                return Logic(binary with { Left = Simplify(binary.Left), Right = Simplify(binary.Right) });
            case BoundBinary binary:
                return binary with { Left = Simplify(binary.Left), Right = Simplify(binary.Right) };
            case BoundUnary unary:
                return unary with { Operand = Simplify(unary.Operand) };
            case BoundCall call:
                return call with { Arguments = [.. call.Arguments.Select(Simplify)] };
            default:
                return expression;
        }
    }

    private static BoundExpression Logic(BoundBinary binary)
    {
        bool decides = binary.Operator == BinaryOperator.Or;
        bool decided = (binary.Left is BoundLiteral left && IsTrue(left) == decides) || (binary.Right is BoundLiteral right && IsTrue(right) == decides);
        return decided ? new BoundLiteral(binary.Span, Value.Of(decides)) : binary;
    }

    private static bool IsTrue(BoundLiteral literal) => literal.Value is TruthValue { Truth: true };
}
