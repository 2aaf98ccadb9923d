namespace ResourceCheck.Scripts.Binding;

/// <summary>Puts the slots of the rounds, which hold one value per copy, before those of the discussions and inputs, which hold one per run.</summary>
internal static class SlotOrder
{
    /// <summary>The protocol with its slots in that order.</summary>
    /// <param name="protocol">A protocol on lists.</param>
    /// <param name="isPerCopy">Whether a slot holds one value per copy.</param>
    public static Protocol Arrange(Protocol protocol, Func<int, bool> isPerCopy)
    {
        int[] order = [.. Enumerable.Range(0, protocol.Slots.Count).OrderBy(s => isPerCopy(s) ? 0 : 1)];
        int[] place = new int[order.Length];
        for (int i = 0; i < order.Length; i++)
            place[order[i]] = i;
        StepMap map = new(slot => place[slot]);
        ListProtocol lists = protocol.Lists!;
        return protocol with
        {
            Slots = [.. order.Select(s => protocol.Slots[s])],
            Inputs = [.. protocol.Inputs.Select(i => i with { Slot = place[i.Slot] })],
            Steps = map.Steps(protocol.Steps),
            Success = map.Value(protocol.Success),
            Reports = [.. protocol.Reports.Select(r => r with { Figure = map.Figure(r.Figure) })],
            Claims = [.. protocol.Claims.Select(c => c with { Left = map.Figure(c.Left), Right = map.Figure(c.Right) })],
            Lists = lists with { CopySlots = Enumerable.Range(0, order.Length).Count(isPerCopy), Steps = map.Steps(lists.Steps) },
            Dishonest = [.. protocol.Dishonest.Select(map.Case)],
        };
    }
}
