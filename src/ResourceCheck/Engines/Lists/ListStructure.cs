using System.Globalization;
using System.Numerics;
using System.Text;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>What the states of a table have in common: single values, cells, and which positions of each cell belong to each set.</summary>
internal sealed class ListStructure(Value[] single, BigInteger[]?[] sets, Cell[] cells, ulong aborted)
{
    private string? _key;

    /// <summary>Single values by slot; none for sets.</summary>
    public Value[] Single => single;

    /// <summary>For each slot that holds a set: the member types of each cell; null for none.</summary>
    public BigInteger[]?[] Sets => sets;

    public Cell[] Cells => cells;

    /// <summary>Parties that gave up, as bits.</summary>
    public ulong Aborted => aborted;

    /// <summary>Equal for structures that behave alike.</summary>
    public string Key => _key ??= Text();

    public ListStructure With(int slot, Value value)
    {
        Value[] changed = [.. single];
        changed[slot] = value;
        return new ListStructure(changed, sets, cells, aborted);
    }

    public ListStructure With(int slot, BigInteger[]? set)
    {
        BigInteger[]?[] changed = [.. sets];
        changed[slot] = set;
        return new ListStructure(single, changed, cells, aborted);
    }

    public ListStructure WithAborted(int party) => new(single, sets, cells, aborted | (1UL << party));

    public bool HasAborted(int party) => party >= 0 && (aborted & (1UL << party)) != 0;

    private string Text()
    {
        StringBuilder text = new();
        text.Append(aborted).Append(';');
        for (int slot = 0; slot < single.Length; slot++)
        {
            if (single[slot] is not NoneValue)
                text.Append(CultureInfo.InvariantCulture, $"{slot}={single[slot].GetType().Name[0]}{single[slot]},");
        }

        foreach (Cell cell in cells)
            text.Append(CultureInfo.InvariantCulture, $"/{cell.Types}{(cell.IsPool ? "p" : "")}{cell.Drained}");
        for (int slot = 0; slot < sets.Length; slot++)
        {
            if (sets[slot] is { } masks)
                text.Append(CultureInfo.InvariantCulture, $";{slot}:{string.Join(',', masks)}");
        }

        return text.ToString();
    }
}
