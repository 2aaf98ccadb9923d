using System.Numerics;

namespace ResourceCheck.Numerics.Randomness;

/// <summary>
/// The generator xoshiro256**: D. Blackman and S. Vigna, ACM Trans. Math. Softw. 47, 36 (2021). Period 2^256 - 1.
/// Every trajectory has a stream of its own, fixed by the seed and the trajectory's index, so that results do not depend on threads.
/// </summary>
internal sealed class Xoshiro256
{
    /// <summary>2^-53: the top 53 bits become a double in [0, 1) without rounding.</summary>
    private const double Ulp = 1.0 / (1UL << 53);

    private ulong _s0, _s1, _s2, _s3;

    /// <summary>A generator in the given state, which must not be all zero.</summary>
    public Xoshiro256(ulong s0, ulong s1, ulong s2, ulong s3) => (_s0, _s1, _s2, _s3) = (s0, s1, s2, s3);

    /// <summary>The stream of one index. Different pairs of seed and index start at unrelated places of the period.</summary>
    public static Xoshiro256 Stream(ulong seed, ulong index)
    {
        SplitMix64 outer = new(seed);
        SplitMix64 inner = new(outer.Next() ^ SplitMix64.Mix(index + outer.Next()));
        return new Xoshiro256(inner.Next(), inner.Next(), inner.Next(), inner.Next());
    }

    /// <summary>The next 64 bits.</summary>
    public ulong Next()
    {
        ulong result = BitOperations.RotateLeft(_s1 * 5, 7) * 9;
        ulong shifted = _s1 << 17;
        _s2 ^= _s0;
        _s3 ^= _s1;
        _s1 ^= _s2;
        _s0 ^= _s3;
        _s2 ^= shifted;
        _s3 = BitOperations.RotateLeft(_s3, 45);
        return result;
    }

    /// <summary>Uniform in [0, 1), a multiple of 2^-53.</summary>
    public double NextUnit() => (Next() >> 11) * Ulp;
}
