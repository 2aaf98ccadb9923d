using System.Numerics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>Splits a Hermitian operator on d^N levels into sectors that evolve alone, and puts them together again.</summary>
internal sealed class Sectors
{
    private readonly EmitterSpace _space;
    private readonly int _dimension;
    private readonly ulong[] _keys;
    private readonly Dictionary<ulong, int[]> _indices;

    public Sectors(EmitterSpace space)
    {
        _space = space;
        _dimension = States.AntisymmetricState.Power(space.Levels, space.Emitters);
        _keys = [.. Enumerable.Range(0, _dimension).Select(i => space.KeyOf(WordBlock.FromFullIndex(i, space.Levels, space.Emitters)))];
        _indices = _keys.Distinct().ToDictionary(key => key, FullIndices);
    }

    /// <summary>
    /// The sectors where the operator has entries, without those that are the adjoint of one listed. Sectors are told apart by the
    /// difference of the keys of row and column.
    /// </summary>
    public IEnumerable<IReadOnlyList<BlockPair>> Occupied(Complex[] rho, bool photons)
    {
        HashSet<(ulong Row, ulong Column)> occupied = [];
        for (int r = 0; r < _dimension; r++)
        {
            for (int c = 0; c < _dimension; c++)
            {
                if (rho[(r * _dimension) + c] != Complex.Zero && _keys[r] >= _keys[c])
                    occupied.Add((_keys[r], _keys[c]));
            }
        }

        return occupied.GroupBy(pair => pair.Row - pair.Column).Select(group => Reachable(group, photons));
    }

    /// <summary>Copies the entries of a sector out of the operator.</summary>
    public Complex[] Take(Complex[] rho, IReadOnlyList<BlockPair> pairs)
    {
        Complex[] entries = new Complex[pairs.Sum(pair => pair.Size)];
        foreach (BlockPair pair in pairs)
            ForEach(pair, (at, row, column) => entries[at] = rho[(row * _dimension) + column]);
        return entries;
    }

    /// <summary>Writes the entries of a sector and of its adjoint into the operator.</summary>
    public void Put(Complex[] entries, IReadOnlyList<BlockPair> pairs, Complex[] rho)
    {
        foreach (BlockPair pair in pairs)
        {
            ForEach(pair, (at, row, column) =>
            {
                rho[(row * _dimension) + column] = entries[at];
                if (pair.Row != pair.Column)
                    rho[(column * _dimension) + row] = Complex.Conjugate(entries[at]);
            });
        }
    }

    private void ForEach(BlockPair pair, Action<int, int, int> visit)
    {
        int at = pair.Start;
        foreach (int row in _indices[pair.Row])
        {
            foreach (int column in _indices[pair.Column])
                visit(at++, row, column);
        }
    }

    private int[] FullIndices(ulong key)
    {
        WordBlock block = _space.Block(key);
        return [.. block.Codes.Select(code => block.FullIndex(code, _space.Levels))];
    }

    private List<BlockPair> Reachable(IEnumerable<(ulong Row, ulong Column)> occupied, bool photons)
    {
        HashSet<(ulong Row, ulong Column)> seen = [.. occupied];
        Queue<(ulong Row, ulong Column)> open = new(seen);
        while (photons && open.TryDequeue(out (ulong Row, ulong Column) pair))
        {
            foreach ((ulong, ulong) next in AfterPhoton(pair).Where(seen.Add))
                open.Enqueue(next);
        }

        return Numbered(seen);
    }

    private IEnumerable<(ulong Row, ulong Column)> AfterPhoton((ulong Row, ulong Column) pair)
    {
        if (EmitterSpace.Count(pair.Row, 0) == 0 || EmitterSpace.Count(pair.Column, 0) == 0)
            yield break;
        for (int level = 1; level < _space.Levels; level++)
            yield return (EmitterSpace.After(pair.Row, level), EmitterSpace.After(pair.Column, level));
    }

    private List<BlockPair> Numbered(IEnumerable<(ulong Row, ulong Column)> keys)
    {
        List<BlockPair> pairs = [];
        int start = 0;
        foreach ((ulong row, ulong column) in keys.Order())
        {
            pairs.Add(new BlockPair(row, column, start, _space.Block(row).Size, _space.Block(column).Size));
            start = checked(start + pairs[^1].Size);
        }

        return pairs;
    }
}
