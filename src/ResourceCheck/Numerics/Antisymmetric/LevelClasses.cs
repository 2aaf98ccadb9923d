using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// The sum of <see cref="IncoherentFidelity"/> over numbers of levels per class: for depolarising and dephasing all levels are one class and N may be
/// anything; decay of one level adds a class or two.
/// </summary>
internal sealed class LevelClasses
{
    private readonly int[][] _classes;
    private Dictionary<UInt128, double> _weights = [];

    private LevelClasses(int[][] classes)
    {
        _classes = classes;
        _weights[0] = 1;
    }

    /// <summary>How a level is used: by state and its conjugate, by target and its conjugate, by state and target, by their conjugates, by all.</summary>
    private enum Use
    {
        Source,
        Target,
        Left,
        Right,
        All,
    }

    private const int Uses = 5;

    /// <summary>Sum over all four permutations of the product of the channels' elements.</summary>
    public static double Sum(IReadOnlyList<IncoherentChannel> channels, int[][] classes)
    {
        LevelClasses sum = new(classes);
        foreach (IncoherentChannel channel in channels)
            sum.Take(channel);
        return sum._weights.Values.Sum(); // every level has been used by all four: one state is left
    }

    private void Take(IncoherentChannel channel)
    {
        Dictionary<UInt128, double> next = [];
        foreach ((UInt128 key, double weight) in _weights)
        {
            int[] counts = Counts(key);
            for (int c = 0; c < _classes.Length; c++)
            {
                int level = _classes[c][0];
                Add(next, counts, [(c, null, Use.All)], weight * Free(counts, c) * channel.Jump(level, level));
                for (int other = 0; other < _classes.Length; other++)
                    TakeTwo(channel, next, counts, weight, c, other);
            }
        }

        _weights = next;
    }

    /// <summary>Two different levels, of class c and of class other: a jump from the first to the second, or the coherence between them.</summary>
    private void TakeTwo(IncoherentChannel channel, Dictionary<UInt128, double> next, int[] counts, double weight, int c, int other)
    {
        if (c == other && _classes[c].Length < 2)
            return;
        (int p, int q) = (_classes[c][0], _classes[other][c == other ? 1 : 0]);
        Two(next, counts, c, other, Use.Source, Use.Target, weight * channel.Jump(q, p));
        Two(next, counts, c, other, Use.Left, Use.Right, weight * channel.Keep(p, q));
    }

    /// <summary>The first level gains one use, the second the opposite one; either may have had the other's already.</summary>
    private void Two(Dictionary<UInt128, double> next, int[] counts, int c, int other, Use first, Use second, double weight)
    {
        if (weight == 0)
            return;
        int free = Free(counts, c), freeOther = Free(counts, other) - (c == other ? 1 : 0);
        double a = Count(counts, c, second), b = Count(counts, other, first);
        Add(next, counts, [(c, null, first), (other, null, second)], weight * free * freeOther);
        Add(next, counts, [(c, second, Use.All), (other, null, second)], weight * a * Free(counts, other));
        Add(next, counts, [(c, null, first), (other, first, Use.All)], weight * free * b);
        Add(next, counts, [(c, second, Use.All), (other, first, Use.All)], weight * a * b);
    }

    private void Add(Dictionary<UInt128, double> next, int[] counts, (int Class, Use? From, Use To)[] moves, double weight)
    {
        if (weight == 0)
            return;
        int[] then = [.. counts];
        foreach ((int c, Use? from, Use to) in moves)
        {
            if (from is { } use)
                then[(c * Uses) + (int)use]--;
            then[(c * Uses) + (int)to]++;
        }

        UInt128 key = Key(then);
        next[key] = next.GetValueOrDefault(key) + weight;
    }

    private static int Count(int[] counts, int c, Use use) => counts[(c * Uses) + (int)use];

    private int Free(int[] counts, int c) => _classes[c].Length - counts.AsSpan(c * Uses, Uses).ToArray().Sum();

    private UInt128 Key(int[] counts)
    {
        UInt128 key = 0;
        for (int i = 0; i < counts.Length; i++)
            key = (key * (uint)(_classes[i / Uses].Length + 1)) + (uint)counts[i];
        return key;
    }

    private int[] Counts(UInt128 key)
    {
        int[] counts = new int[_classes.Length * Uses];
        for (int i = counts.Length - 1; i >= 0; i--)
        {
            uint radix = (uint)(_classes[i / Uses].Length + 1);
            counts[i] = (int)(key % radix);
            key /= radix;
        }

        return counts;
    }
}
