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

    /// <summary>An expression and all within it.</summary>
    public static IEnumerable<BoundExpression> Within(BoundExpression expression) => Children(expression).SelectMany(Within).Prepend(expression);

    /// <summary>Slots that an expression reads outside of the predicates in it: those must hold one value per run where lists are worked on.</summary>
    public static IEnumerable<int> SingleSlots(BoundExpression expression) => expression switch
    {
        BoundSlot slot => [slot.Slot],
        BoundWhere => [],
        BoundTally tally => SingleSlots(tally.Set),
        _ => Children(expression).SelectMany(SingleSlots),
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
        BoundWhere e => e with { Predicate = Map(e.Predicate, slots) },
        BoundSome e => e with { Count = Map(e.Count, slots), Set = Map(e.Set, slots) },
        BoundSize e => e with { Set = Map(e.Set, slots) },
        BoundTally e => e with { Predicate = Map(e.Predicate, slots), Set = Map(e.Set, slots) },
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
        (BoundTally a, BoundTally b) => a.IsShare == b.IsShare,
        (BoundChoice a, BoundChoice b) => a.Choice == b.Choice,
        _ => first.GetType() == second.GetType(),
    };

    private static IEnumerable<BoundExpression> Children(BoundExpression expression) => expression switch
    {
        BoundUnary e => [e.Operand],
        BoundBinary e => [e.Left, e.Right],
        BoundIf e => [e.Condition, e.Then, e.Else],
        BoundCall e => e.Arguments,
        BoundBasis { Argument: { } argument } => [argument],
        BoundWhere e => [e.Predicate],
        BoundSome e => [e.Count, e.Set],
        BoundSize e => [e.Set],
        BoundTally e => [e.Predicate, e.Set],
        _ => [],
    };
}
