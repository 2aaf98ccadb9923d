using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Slots and choices that an expression reads.</summary>
internal static class Reads
{
    public static IEnumerable<int> Slots(BoundExpression expression) => BoundWalk.Within(expression).OfType<BoundSlot>().Select(s => s.Slot);

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

    public static bool HasChoice(BoundExpression expression) => BoundWalk.Within(expression).Any(p => p is BoundChoice);
}
