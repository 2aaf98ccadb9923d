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
    public static BoundExpression Map(BoundExpression expression, Func<int, int> slots) =>
        Leaves(expression, e => e is BoundSlot slot ? slot with { Slot = slots(slot.Slot) } : e);

    /// <summary>The expression with numbers in place of the cheat's choices.</summary>
    public static BoundExpression Put(BoundExpression expression, IReadOnlyList<Value> choices) =>
        Leaves(expression, e => e is BoundChoice choice ? new BoundLiteral(choice.Span, choices[choice.Choice]) : e);

    private static BoundExpression Leaves(BoundExpression expression, Func<BoundExpression, BoundExpression> change) => expression switch
    {
        BoundUnary e => e with { Operand = Leaves(e.Operand, change) },
        BoundBinary e => e with { Left = Leaves(e.Left, change), Right = Leaves(e.Right, change) },
        BoundIf e => e with { Condition = Leaves(e.Condition, change), Then = Leaves(e.Then, change), Else = Leaves(e.Else, change) },
        BoundCall e => e with { Arguments = [.. e.Arguments.Select(a => Leaves(a, change))] },
        BoundBasis { Argument: { } argument } e => e with { Argument = Leaves(argument, change) },
        BoundWhere e => e with { Predicate = Leaves(e.Predicate, change) },
        BoundSome e => e with { Count = Leaves(e.Count, change), Set = Leaves(e.Set, change) },
        BoundSize e => e with { Set = Leaves(e.Set, change) },
        BoundTally e => e with { Predicate = Leaves(e.Predicate, change), Set = Leaves(e.Set, change) },
        _ => change(expression),
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
