namespace ResourceCheck.Scripts.Binding;

/// <summary>Ways through resolved expressions.</summary>
internal static class BoundWalk
{
    /// <summary>All slots that an expression reads.</summary>
    public static IEnumerable<int> Slots(BoundExpression expression) => expression switch
    {
        BoundSlot slot => [slot.Slot],
        _ => Children(expression).SelectMany(Slots),
    };

    /// <summary>The expression with other slots.</summary>
    public static BoundExpression Map(BoundExpression expression, Func<int, int> slots) => expression switch
    {
        BoundSlot e => e with { Slot = slots(e.Slot) },
        BoundUnary e => e with { Operand = Map(e.Operand, slots) },
        BoundBinary e => e with { Left = Map(e.Left, slots), Right = Map(e.Right, slots) },
        BoundIf e => e with { Condition = Map(e.Condition, slots), Then = Map(e.Then, slots), Else = Map(e.Else, slots) },
        BoundCall e => e with { Arguments = [.. e.Arguments.Select(a => Map(a, slots))] },
        BoundBasis { Argument: { } argument } e => e with { Argument = Map(argument, slots) },
        _ => expression,
    };

    /// <summary>Whether two expressions are the same apart from their places.</summary>
    public static bool Same(BoundExpression first, BoundExpression second)
    {
        if (!Alike(first, second))
            return false;
        BoundExpression[] a = [.. Children(first)], b = [.. Children(second)];
        return a.Length == b.Length && a.Zip(b).All(pair => Same(pair.First, pair.Second));
    }

    private static bool Alike(BoundExpression first, BoundExpression second) => (first, second) switch
    {
        (BoundLiteral a, BoundLiteral b) => a.Value.Equals(b.Value),
        (BoundSlot a, BoundSlot b) => a.Slot == b.Slot,
        (BoundUnary a, BoundUnary b) => a.Operator == b.Operator,
        (BoundBinary a, BoundBinary b) => a.Operator == b.Operator,
        (BoundCall a, BoundCall b) => a.Function == b.Function,
        (BoundBasis a, BoundBasis b) => a.Kind == b.Kind && a.File == b.File,
        _ => first.GetType() == second.GetType(),
    };

    private static IEnumerable<BoundExpression> Children(BoundExpression expression) => expression switch
    {
        BoundUnary e => [e.Operand],
        BoundBinary e => [e.Left, e.Right],
        BoundIf e => [e.Condition, e.Then, e.Else],
        BoundCall e => e.Arguments,
        BoundBasis { Argument: { } argument } => [argument],
        _ => [],
    };
}
