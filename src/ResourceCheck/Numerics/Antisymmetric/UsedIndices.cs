namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// The running sum of <see cref="DiagonalDistinct"/>. A state says for each class of indices how many are still free, used as an outcome alone, as a
/// level alone, and as both; its weight is the sum over all ways to get there.
/// </summary>
internal sealed class UsedIndices
{
    private readonly int[][] _classes;
    private Dictionary<long, double> _weights = [];

    public UsedIndices(int[][] classes)
    {
        _classes = classes;
        _weights[Key([.. classes.Select(_ => default(Use))])] = 1;
    }

    /// <summary>Indices of a class used as outcome alone, as level alone, as both.</summary>
    private record struct Use(int Outcome, int Level, int Both);

    /// <summary>One party takes an outcome and a level.</summary>
    /// <param name="weights">Its operators' diagonals: outcome first, then level.</param>
    public void Take(double[][] weights)
    {
        Dictionary<long, double> next = [];
        foreach ((long key, double weight) in _weights)
        {
            Use[] uses = Uses(key);
            for (int c = 0; c < uses.Length; c++)
            {
                foreach ((int ways, Use then) in AsOutcome(c, uses[c]))
                    TakeLevel(weights, c, then.Both > uses[c].Both, With(uses, c, then), uses, weight * ways, next);
                Add(next, With(uses, c, uses[c] with { Both = uses[c].Both + 1 }), weight * Free(c, uses[c]) * weights[_classes[c][0]][_classes[c][0]]);
            }
        }

        _weights = next;
    }

    /// <summary>One party takes a level only.</summary>
    public void TakeLevel(double[] weights)
    {
        Dictionary<long, double> next = [];
        foreach ((long key, double weight) in _weights)
        {
            Use[] uses = Uses(key);
            for (int c = 0; c < uses.Length; c++)
            {
                foreach ((int ways, Use then) in AsLevel(c, uses[c]))
                    Add(next, With(uses, c, then), weight * ways * weights[_classes[c][0]]);
            }
        }

        _weights = next;
    }

    /// <summary>Sum over all states: how many outcomes stayed unused does not matter.</summary>
    public double Total() => _weights.Values.Sum();

    /// <summary>After an outcome of class c was taken, a level other than that index.</summary>
    private void TakeLevel(double[][] weights, int c, bool wasLevel, Use[] now, Use[] before, double weight, Dictionary<long, double> next)
    {
        for (int l = 0; l < now.Length; l++)
        {
            bool same = l == c;
            if (same && _classes[c].Length < 2)
                continue;
            double each = weight * weights[_classes[c][0]][_classes[l][same ? 1 : 0]];
            foreach ((int ways, Use then) in AsLevel(l, now[l]))
            {
                // the index just taken as an outcome is the same one only when it was free before: that case is added apart
                bool alone = then.Both > now[l].Both;
                int others = same && alone && !wasLevel ? ways - 1 : ways;
                Add(next, With(now, l, then), each * others);
            }
        }
    }

    private IEnumerable<(int Ways, Use Then)> AsOutcome(int c, Use use)
    {
        yield return (Free(c, use), use with { Outcome = use.Outcome + 1 });
        yield return (use.Level, new Use(use.Outcome, use.Level - 1, use.Both + 1));
    }

    private IEnumerable<(int Ways, Use Then)> AsLevel(int c, Use use)
    {
        yield return (Free(c, use), use with { Level = use.Level + 1 });
        yield return (use.Outcome, new Use(use.Outcome - 1, use.Level, use.Both + 1));
    }

    private int Free(int c, Use use) => _classes[c].Length - use.Outcome - use.Level - use.Both;

    private static Use[] With(Use[] uses, int c, Use then)
    {
        Use[] result = [.. uses];
        result[c] = then;
        return result;
    }

    private void Add(Dictionary<long, double> next, Use[] uses, double weight)
    {
        if (weight == 0)
            return;
        long key = Key(uses);
        next[key] = next.GetValueOrDefault(key) + weight;
    }

    private long Key(Use[] uses)
    {
        long key = 0;
        for (int c = 0; c < uses.Length; c++)
        {
            int radix = _classes[c].Length + 1;
            key = (((((key * radix) + uses[c].Outcome) * radix) + uses[c].Level) * radix) + uses[c].Both;
        }

        return key;
    }

    private Use[] Uses(long key)
    {
        Use[] uses = new Use[_classes.Length];
        for (int c = uses.Length - 1; c >= 0; c--)
        {
            int radix = _classes[c].Length + 1;
            int both = (int)(key % radix), level = (int)(key / radix % radix), outcome = (int)(key / radix / radix % radix);
            uses[c] = new Use(outcome, level, both);
            key /= (long)radix * radix * radix;
        }

        return uses;
    }
}
