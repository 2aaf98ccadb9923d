using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Slots and choices that an expression reads.</summary>
internal static class Reads
{
    public static IEnumerable<int> Slots(BoundExpression expression) => Parts(expression).OfType<BoundSlot>().Select(s => s.Slot);

    public static IEnumerable<int> Slots(Reading reading) =>
        reading.Statistics.SelectMany(s => Slots(s.Set).Concat(s.Other is null ? [] : Slots(s.Other))).Concat(Slots(reading.Residual));

    public static IEnumerable<int> Slots(ListOperation operation) => operation switch
    {
        AssignOperation assign => Slots(assign.Value),
        AssignSetOperation assign => Slots(assign.Set),
        DrawOperation draw => Slots(draw.Count).Concat(Slots(draw.Set)),
        AbortOperation abort => Slots(abort.Condition),
        BranchOperation branch => Slots(branch.Condition),
        _ => [],
    };

    public static bool HasChoice(BoundExpression expression) => Parts(expression).Any(p => p is BoundChoice);

    /// <summary>An expression and everything in it.</summary>
    public static IEnumerable<BoundExpression> Parts(BoundExpression expression) => Children(expression).SelectMany(Parts).Prepend(expression);

    private static IEnumerable<BoundExpression> Children(BoundExpression expression) => expression switch
    {
        BoundUnary unary => [unary.Operand],
        BoundBinary binary => [binary.Left, binary.Right],
        BoundIf choice => [choice.Condition, choice.Then, choice.Else],
        BoundCall call => call.Arguments,
        BoundBasis { Argument: { } argument } => [argument],
        BoundWhere where => [where.Predicate],
        BoundSome some => [some.Count, some.Set],
        BoundSize size => [size.Set],
        BoundTally tally => [tally.Predicate, tally.Set],
        _ => [],
    };
}
