using System.Collections.Concurrent;
using System.Numerics;
using ResourceCheck.Numerics.Counting;

namespace ResourceCheck.Engines.Lists;

/// <summary>Part of a cell whose positions count alike.</summary>
/// <param name="Types">Its types.</param>
/// <param name="Sums">Sums that its number adds to.</param>
/// <param name="Target">Cell that it becomes part of; -1 when nothing looks at it later.</param>
/// <param name="Weight">Probability of its types.</param>
/// <param name="Rest">Probability of the types of the atoms after it.</param>
internal sealed record Atom(BigInteger Types, int[] Sums, int Target, double Weight, double Rest)
{
    private readonly ConcurrentDictionary<int, BinomialRow> _rows = [];

    /// <summary>Law of its number among positions that are in it or in the atoms after it.</summary>
    public BinomialRow Row(int positions)
    {
        if (!_rows.TryGetValue(positions, out BinomialRow? row))
            _rows[positions] = row = BinomialRow.Of(positions, Weight / (Weight + Rest), Rest / (Weight + Rest));
        return row;
    }
}
