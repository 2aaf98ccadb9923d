namespace ResourceCheck.Engines.Lists;

/// <summary>
/// A sum of probabilities for every vector of counts that occurs: a hash table with open addressing, whose sums carry their
/// rounding errors along (A. Neumaier, Z. Angew. Math. Mech. 54, 39 (1974)).
/// </summary>
internal sealed class CountTable(int width)
{
    /// <summary>A count of positions is one field of 16 bits.</summary>
    public const int LargestCount = ushort.MaxValue;

    private ushort[] _keys = new ushort[Math.Max(1, width) * 16];
    private double[] _sums = new double[16];
    private double[] _carries = new double[16];
    private int[] _buckets = new int[32];

    public int Width => width;

    public int Count { get; private set; }

    public ReadOnlySpan<ushort> Key(int entry) => _keys.AsSpan(entry * width, width);

    public double Weight(int entry) => _sums[entry] + _carries[entry];

    /// <summary>Adds to the sum of a key and tells its entry.</summary>
    public int Add(ReadOnlySpan<ushort> key, double weight)
    {
        int bucket = (int)(Hash(key) & (uint)(_buckets.Length - 1));
        while (_buckets[bucket] is int entry and not 0)
        {
            if (key.SequenceEqual(Key(entry - 1)))
            {
                Accumulate(entry - 1, weight);
                return entry - 1;
            }

            bucket = (bucket + 1) & (_buckets.Length - 1);
        }

        Insert(bucket, key, weight);
        return Count - 1;
    }

    private void Accumulate(int entry, double weight)
    {
        double sum = _sums[entry], next = sum + weight;
        _carries[entry] += sum >= weight ? sum - next + weight : weight - next + sum;
        _sums[entry] = next;
    }

    private void Insert(int bucket, ReadOnlySpan<ushort> key, double weight)
    {
        if (Count == _sums.Length)
        {
            Grow();
            bucket = FreeBucket(key);
        }

        key.CopyTo(_keys.AsSpan(Count * width));
        _sums[Count] = weight;
        _buckets[bucket] = ++Count;
    }

    private void Grow()
    {
        int size = Count * 2;
        Array.Resize(ref _keys, Math.Max(1, width) * size);
        Array.Resize(ref _sums, size);
        Array.Resize(ref _carries, size);
        _buckets = new int[size * 2];
        for (int entry = 0; entry < Count; entry++)
            _buckets[FreeBucket(Key(entry))] = entry + 1;
    }

    private int FreeBucket(ReadOnlySpan<ushort> key)
    {
        int bucket = (int)(Hash(key) & (uint)(_buckets.Length - 1));
        while (_buckets[bucket] != 0)
            bucket = (bucket + 1) & (_buckets.Length - 1);
        return bucket;
    }

    private static uint Hash(ReadOnlySpan<ushort> key)
    {
        ulong hash = 0;
        foreach (ushort field in key)
            hash = (hash + field + 1) * 0x9E3779B97F4A7C15;
        return (uint)(hash >> 32);
    }
}
