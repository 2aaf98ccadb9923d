using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Which slots are still read: states that differ in other slots only are the same state.</summary>
internal static class Liveness
{
    /// <summary>Live slots before each operation, and after the last.</summary>
    public static IReadOnlyList<bool[]> Of(IReadOnlyList<ListOperation> operations, int slots, int success, int harm)
    {
        bool[][] live = new bool[operations.Count + 1][];
        live[^1] = new bool[slots];
        live[^1][success] = live[^1][harm] = true;
        for (int at = operations.Count - 1; at >= 0; at--)
            live[at] = Before(operations[at], at, live, slots);
        return live;
    }

    private static bool[] Before(ListOperation operation, int at, bool[][] live, int slots)
    {
        bool[] before = [.. live[operation is JumpOperation jump ? jump.Target : at + 1]];
        if (operation is BranchOperation branch)
        {
            for (int slot = 0; slot < slots; slot++)
                before[slot] |= live[branch.Otherwise][slot];
        }

        if (Written(operation) is int written)
            before[written] = false;
        foreach (int slot in Reads.Slots(operation))
            before[slot] = true;
        return before;
    }

    private static int? Written(ListOperation operation) => operation switch
    {
        AssignOperation assign => assign.Slot,
        AssignSetOperation assign => assign.Slot,
        DrawOperation draw => draw.Slot,
        _ => null,
    };
}
