using System.Numerics;
using ResourceCheck.Numerics.Counting;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Draws positions at random from a set that is a union of cells. A random subset of positions keeps each cell's law of types; how many come
/// from each cell follows the multivariate hypergeometric law.
/// </summary>
internal sealed class Drawing
{
    private readonly ListStructure _structure;
    private readonly Meter _meter;
    private readonly int[] _sources;
    private readonly int _cells;
    private readonly CountTable _target;
    private readonly ushort[] _key;

    private Drawing(ListStructure structure, BigInteger[] set, Meter meter)
    {
        _structure = structure;
        _meter = meter;
        _cells = structure.Cells.Length;
        _sources = [.. Enumerable.Range(0, _cells).Where(c => !set[c].IsZero)];
        _target = new CountTable(_cells + _sources.Length);
        _key = new ushort[_target.Width];
    }

    /// <summary>Draws, and puts the drawn set into a slot. Drawn positions become cells of their own behind the others.</summary>
    public static (ListStructure Structure, CountTable Table) Draw(
        ListStructure structure, CountTable table, BigInteger[] set, int slot, int positions, bool pooled, Meter meter)
    {
        Drawing drawing = new(structure, set, meter);
        for (int entry = 0; entry < table.Count; entry++)
            drawing.Draw(table.Key(entry), table.Weight(entry), positions, pooled);
        return (drawing.After(set, slot, pooled), drawing._target);
    }

    private void Draw(ReadOnlySpan<ushort> key, double weight, int positions, bool pooled)
    {
        key.CopyTo(_key);
        _key.AsSpan(_cells, _sources.Length).Clear();
        if (pooled)
        {
            RequireOnePool();
            _key[_cells] = (ushort)positions;
            _target.Add(_key, weight);
            return;
        }

        int whole = 0;
        foreach (int source in _sources)
            whole += key[source];
        Draw(0, whole, Math.Min(positions, whole), weight);
    }

    private void Draw(int index, int whole, int drawn, double weight)
    {
        if (index == _sources.Length)
        {
            _target.Add(_key, weight);
            _meter.Count(1, _target);
            return;
        }

        int source = _sources[index], marked = _key[source];
        for (int found = HypergeometricLaw.Least(drawn, marked, whole); found <= Math.Min(drawn, marked); found++)
        {
            double next = weight * HypergeometricLaw.Probability(found, drawn, marked, whole);
            if (next < _meter.Negligible)
                continue;
            Move(source, index, found);
            Draw(index + 1, whole - marked, drawn - found, next);
            Move(source, index, -found);
        }
    }

    private void Move(int source, int index, int positions)
    {
        _key[source] -= (ushort)positions;
        _key[_cells + index] += (ushort)positions;
    }

    private void RequireOnePool()
    {
        if (_sources.Length != 1 || !_structure.Cells[_sources[0]].IsPool)
            throw new ListRefusalException("The cheat draws from positions of which it holds enough and from others at once: the conditional value is not defined here.");
    }

    private ListStructure After(BigInteger[] set, int slot, bool pooled)
    {
        Cell[] cells =
        [
            .. _structure.Cells.Select((c, i) => pooled ? c with { Drained = c.Drained | set[i] } : c),
            .. _sources.Select(s => pooled ? new Cell(set[s], false, BigInteger.Zero) : _structure.Cells[s] with { IsPool = false, Drained = BigInteger.Zero }),
        ];
        BigInteger[]?[] sets = [.. _structure.Sets.Select(s => s is null ? null : (BigInteger[])[.. s, .. _sources.Select(c => s[c] & set[c])])];
        sets[slot] = [.. _structure.Cells.Select(_ => BigInteger.Zero), .. _sources.Select(s => set[s])];
        return new ListStructure(_structure.Single, sets, cells, _structure.Aborted);
    }
}
