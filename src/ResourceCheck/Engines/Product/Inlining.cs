using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Product;

/// <summary>Expressions in terms of open outcomes: everything that is settled becomes a literal.</summary>
internal sealed class Inlining(int levels)
{
    private readonly Value[] _none = [];

    /// <summary>An expression of a branch in terms of its open slots.</summary>
    public BoundExpression In(BoundExpression expression, ProductBranch branch) =>
        Fold(expression, slot => branch.Symbols[slot.Slot] ?? new BoundLiteral(slot.Span, branch.Slots[slot.Slot]));

    /// <summary>An expression with one open slot settled.</summary>
    public BoundExpression Settle(BoundExpression expression, int slot, Value value) =>
        Fold(expression, s => s.Slot == slot ? new BoundLiteral(s.Span, value) : s);

    /// <summary>The value of an expression without slots.</summary>
    public Value Evaluate(BoundExpression expression) => ValueEvaluator.Evaluate(expression, _none, levels);

    private BoundExpression Fold(BoundExpression expression, Func<BoundSlot, BoundExpression> slots)
    {
        BoundExpression folded = expression switch
        {
            BoundSlot slot => slots(slot),
            BoundUnary e => e with { Operand = Fold(e.Operand, slots) },
            BoundBinary e => Short(e with { Left = Fold(e.Left, slots), Right = Fold(e.Right, slots) }),
            BoundIf e => Chosen(e with { Condition = Fold(e.Condition, slots), Then = Fold(e.Then, slots), Else = Fold(e.Else, slots) }),
            BoundCall e => e with { Arguments = [.. e.Arguments.Select(a => Fold(a, slots))] },
            BoundBasis { Argument: { } argument } e => e with { Argument = Fold(argument, slots) },
            _ => expression,
        };
        return folded is BoundLiteral || BoundWalk.Slots(folded).Any() ? folded : new BoundLiteral(folded.Span, Evaluate(folded));
    }

    /// <summary>A settled side of <c>and</c> and <c>or</c> decides, or goes.</summary>
    private static BoundExpression Short(BoundBinary e) => (e.Operator, Settled(e.Left), Settled(e.Right)) switch
    {
        (BinaryOperator.And, false, _) or (BinaryOperator.Or, true, _) => e.Left,
        (BinaryOperator.And, _, false) or (BinaryOperator.Or, _, true) => e.Right,
        (BinaryOperator.And, true, _) or (BinaryOperator.Or, false, _) => e.Right,
        (BinaryOperator.And, _, true) or (BinaryOperator.Or, _, false) => e.Left,
        _ => e,
    };

    private static BoundExpression Chosen(BoundIf e) => Settled(e.Condition) is { } truth ? (truth ? e.Then : e.Else) : e;

    /// <summary>Truth of a literal; what is no truth value counts as false, as everywhere.</summary>
    private static bool? Settled(BoundExpression e) => e is BoundLiteral literal ? literal.Value is TruthValue { Truth: true } : null;
}
