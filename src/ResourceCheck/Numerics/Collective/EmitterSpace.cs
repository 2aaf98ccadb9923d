namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// The d^N levels of N emitters, split by how many emitters are in each level. Evolution without a photon stays within such a block, a
/// photon of transition j leads to the block with one more emitter in level j and one fewer in level 0. Blocks are made when asked for.
/// </summary>
internal sealed class EmitterSpace(Couplings couplings)
{
    private readonly Dictionary<ulong, WordBlock> _blocks = [];
    private readonly Dictionary<ulong, SwapTable> _tables = [];
    private readonly Dictionary<(ulong Key, int Level), Lift> _lifts = [];
    private readonly Lock _guard = new();

    /// <summary>γ and Ω.</summary>
    public Couplings Couplings => couplings;

    /// <summary>N.</summary>
    public int Emitters => couplings.Emitters;

    /// <summary>d.</summary>
    public int Levels => couplings.Levels;

    /// <summary>The key of given numbers of emitters in each level.</summary>
    public static ulong Key(ReadOnlySpan<int> counts)
    {
        ulong key = 0;
        for (int level = counts.Length - 1; level >= 0; level--)
            key = (key << 4) | (uint)counts[level];
        return key;
    }

    /// <summary>Number of emitters in a level.</summary>
    public static int Count(ulong key, int level) => (int)(key >> (4 * level)) & 15;

    /// <summary>The block of a word.</summary>
    public ulong KeyOf(ulong code)
    {
        ulong key = 0;
        for (int i = 0; i < Emitters; i++)
            key += 1UL << (4 * WordBlock.Letter(code, i));
        return key;
    }

    /// <summary>The block after a photon of transition j.</summary>
    public static ulong After(ulong key, int level) => key - 1 + (1UL << (4 * level));

    /// <summary>The block before it.</summary>
    public static ulong Before(ulong key, int level) => key + 1 - (1UL << (4 * level));

    /// <summary>Words of a block.</summary>
    public WordBlock Block(ulong key) => Made(_blocks, key, () => WordBlock.Of([.. Enumerable.Range(0, Levels).Select(l => Count(key, l))]));

    /// <summary>The no-photon generator of a block.</summary>
    public SwapTable Table(ulong key)
    {
        WordBlock block = Block(key);
        return Made(_tables, key, () => SwapTable.From(block, couplings, [.. Enumerable.Range(1, Levels - 1)], ExchangeSign.Even));
    }

    /// <summary>Parents of a block's words by a photon of transition j; the block must hold level j.</summary>
    public Lift Lift(ulong key, int level)
    {
        WordBlock block = Block(key), parent = Block(Before(key, level));
        return Made(_lifts, (key, level), () => Collective.Lift.From(block, parent, level));
    }

    private T Made<TKey, T>(Dictionary<TKey, T> store, TKey key, Func<T> make)
        where TKey : notnull
    {
        lock (_guard)
        {
            if (!store.TryGetValue(key, out T? found))
                store.Add(key, found = make());
            return found;
        }
    }
}
