using System.Numerics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Brings a structure into the one form of all that behave alike from an operation on: what nothing reads any more is forgotten.</summary>
internal static class Reduction
{
    /// <summary>The structure without slots that are not read any more.</summary>
    public static ListStructure Forget(ListContext context, ListStructure structure, int from)
    {
        bool[] live = context.Code.Live[from];
        Value[] single = [.. structure.Single.Select((v, slot) => live[slot] ? v : Value.None)];
        BigInteger[]?[] sets = [.. structure.Sets.Select((s, slot) => live[slot] ? s : null)];
        return new ListStructure(single, sets, structure.Cells, structure.Aborted);
    }

    /// <summary>Columns of a structure's cells in an order that does not depend on how they arose.</summary>
    public static int[] Order(ListStructure structure) =>
        [.. Enumerable.Range(0, structure.Cells.Length).OrderBy(c => structure.Cells[c].Types).ThenBy(c => Text(structure, c), StringComparer.Ordinal)];

    /// <summary>The structure with its cells in another order.</summary>
    public static ListStructure Ordered(ListStructure structure, int[] order) => new(
        structure.Single,
        [.. structure.Sets.Select(s => s is null ? null : order.Select(c => s[c]).ToArray())],
        [.. order.Select(c => structure.Cells[c])],
        structure.Aborted);

    private static string Text(ListStructure structure, int cell) => string.Join(';', structure.Sets.Select(s => s?[cell].ToString())) + structure.Cells[cell].Drained;
}
