using ResourceCheck.Numerics.Counting;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Carries a table of counts through a refinement. Cells are split one after the other and their contributions to the sums added up
/// at once, which convolves them: the table never holds all cells' splits jointly.
/// </summary>
internal sealed class Splitter
{
    private readonly Refinement _refinement;
    private readonly Meter _meter;
    private readonly int[] _waiting;
    private readonly int _sums;
    private readonly int _cells;
    private CountTable _target = new(0);
    private ushort[] _key = [];

    private Splitter(Refinement refinement, Meter meter)
    {
        _refinement = refinement;
        _meter = meter;
        _sums = refinement.Sums;
        _cells = refinement.After.Cells.Length;
        _waiting = [.. Enumerable.Range(0, refinement.Atoms.Count).Where(c => refinement.Atoms[c].Length > 1)];
    }

    /// <summary>The table over sums and new cells.</summary>
    public static CountTable Split(Refinement refinement, CountTable table, Meter meter)
    {
        Splitter splitter = new(refinement, meter);
        CountTable current = splitter.Load(table);
        for (int stage = 0; stage < splitter._waiting.Length; stage++)
            current = splitter.Stage(current, stage);
        return current;
    }

    /// <summary>Moves whole cells to where they go; cells to be split wait behind them.</summary>
    private CountTable Load(CountTable table)
    {
        CountTable loaded = new(_sums + _cells + _waiting.Length);
        ushort[] key = new ushort[loaded.Width];
        for (int entry = 0; entry < table.Count; entry++)
        {
            ReadOnlySpan<ushort> from = table.Key(entry);
            Array.Clear(key);
            int waiting = 0;
            for (int cell = 0; cell < _refinement.Atoms.Count; cell++)
            {
                Atom[] atoms = _refinement.Atoms[cell];
                if (atoms.Length > 1)
                    key[_sums + _cells + waiting++] = from[cell];
                else
                    Move(key, atoms[0], from[cell]);
            }

            loaded.Add(key, table.Weight(entry));
            _meter.Count(1, loaded);
        }

        return loaded;
    }

    /// <summary>Splits the cell that waits last.</summary>
    private CountTable Stage(CountTable table, int stage)
    {
        Atom[] atoms = _refinement.Atoms[_waiting[^(stage + 1)]];
        _target = new CountTable(table.Width - 1);
        _key = new ushort[_target.Width];
        for (int entry = 0; entry < table.Count; entry++)
        {
            ReadOnlySpan<ushort> from = table.Key(entry);
            from[..^1].CopyTo(_key);
            Split(atoms, 0, from[^1], table.Weight(entry));
        }

        return _target;
    }

    private void Split(Atom[] atoms, int index, int positions, double weight)
    {
        Atom atom = atoms[index];
        if (index == atoms.Length - 1 || positions == 0)
        {
            Move(_key, atom, positions);
            _target.Add(_key, weight);
            Move(_key, atom, -positions);
            _meter.Count(1, _target);
            return;
        }

        BinomialRow row = atom.Row(positions);
        for (int i = 0; i < row.Probabilities.Length; i++)
        {
            double next = weight * row.Probabilities[i];
            if (next < _meter.Negligible)
                continue;
            Move(_key, atom, row.First + i);
            Split(atoms, index + 1, positions - row.First - i, next);
            Move(_key, atom, -row.First - i);
        }
    }

    private void Move(ushort[] key, Atom atom, int positions)
    {
        foreach (int sum in atom.Sums)
            key[sum] += (ushort)positions;
        if (atom.Target >= 0)
            key[_sums + atom.Target] += (ushort)positions;
    }
}
