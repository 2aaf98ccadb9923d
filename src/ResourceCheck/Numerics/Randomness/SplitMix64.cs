namespace ResourceCheck.Numerics.Randomness;

/// <summary>
/// A 64-bit counter with a mixing function: G. L. Steele, D. Lea and C. H. Flood, ACM SIGPLAN Notices 49, 453 (2014).
/// Used here only to seed <see cref="Xoshiro256"/>, as its authors advise.
/// </summary>
internal struct SplitMix64(ulong seed)
{
    private const ulong GoldenGamma = 0x9E3779B97F4A7C15;

    private ulong _state = seed;

    /// <summary>The next 64 bits.</summary>
    public ulong Next()
    {
        _state += GoldenGamma;
        return Mix(_state);
    }

    /// <summary>A bijection of 64-bit words in which every input bit moves about half of the output bits.</summary>
    public static ulong Mix(ulong z)
    {
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return z ^ (z >> 31);
    }
}
