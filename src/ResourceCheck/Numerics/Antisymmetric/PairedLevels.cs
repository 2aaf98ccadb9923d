using System.Numerics;
using System.Runtime.Intrinsics.X86;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// The sum of <see cref="IncoherentFidelity"/> when levels cannot be told by class. A state is (P, Q, Z): the levels used by the state, by its
/// conjugate, and by target and conjugate together. The target's levels are then Z with P∖Q, the conjugate target's Z with Q∖P, and Z
/// avoids the levels that only one of P and Q holds. After k parties that makes Σ_m N!/(m!²(k-m)!(N-k-m)!) C(N-2m, k-m) states, each summed over
/// at most k² ways to get there; threads share the sums by P.
/// </summary>
internal sealed class PairedLevels
{
    /// <summary>Beyond, the states take more than 2 GB.</summary>
    public const int MostParties = 12;

    private readonly int _n;
    private readonly Subsets _subsets;
    private double[] _weights = [1];
    private int[] _offsets = [0];

    private PairedLevels(int n)
    {
        _n = n;
        _subsets = Subsets.Of(n);
    }

    /// <summary>Most states held after any number of parties.</summary>
    public static double States(int n) => Enumerable.Range(0, n + 1).Max(k => States(n, k));

    /// <summary>Sum over all four permutations of the product of the channels' elements.</summary>
    public static double Sum(IReadOnlyList<IncoherentChannel> channels)
    {
        PairedLevels sum = new(channels.Count);
        for (int k = 0; k < channels.Count; k++)
            sum.Take(channels[k], k);
        return sum._weights[0];
    }

    private static double States(int n, int k) =>
        Enumerable.Range(0, Math.Min(k, n - k) + 1).Sum(m =>
            Subsets.ChooseReal(n, m) * Subsets.ChooseReal(n - m, m) * Subsets.ChooseReal(n - (2 * m), k - m) * Subsets.ChooseReal(n - (2 * m), k - m));

    private void Take(IncoherentChannel channel, int used)
    {
        int count = Subsets.Choose(_n, used + 1);
        int[] offsets = Offsets(used + 1, out int size);
        double[] weights = new double[size];
        (double[] before, int[] offsetsBefore) = (_weights, _offsets);
        Parallel.For(0, count, p =>
        {
            ReadOnlySpan<int> sets = _subsets.OfSize(used + 1);
            for (int q = 0; q < count; q++)
                Fill(channel, sets[p], sets[q], before, offsetsBefore, Subsets.Choose(_n, used), weights.AsSpan(offsets[(p * count) + q]));
        });
        (_weights, _offsets) = (weights, offsets);
    }

    /// <summary>Where the states of each pair (P, Q) begin.</summary>
    private int[] Offsets(int k, out int size)
    {
        ReadOnlySpan<int> sets = _subsets.OfSize(k);
        int[] offsets = new int[sets.Length * sets.Length];
        size = 0;
        for (int p = 0; p < sets.Length; p++)
        {
            for (int q = 0; q < sets.Length; q++)
            {
                int m = BitOperations.PopCount((uint)(sets[p] & ~sets[q]));
                offsets[(p * sets.Length) + q] = size;
                size = checked(size + Subsets.Choose(_n - (2 * m), k - m));
            }
        }

        return offsets;
    }

    /// <summary>All Z of one pair (P, Q), in the order of their number among the levels that both or none of P and Q hold.</summary>
    private void Fill(IncoherentChannel channel, int p, int q, double[] before, int[] offsets, int countBefore, Span<double> target)
    {
        int open = ((1 << _n) - 1) & ~(p ^ q), width = BitOperations.PopCount((uint)open), size = BitOperations.PopCount((uint)(p & q));
        ReadOnlySpan<int> compact = Subsets.Of(width).OfSize(size);
        for (int i = 0; i < compact.Length; i++)
        {
            int z = Spread(compact[i], open);
            target[i] = Jumps(channel, p, q, z, before, offsets, countBefore) + Kept(channel, p, q, z, before, offsets, countBefore);
        }
    }

    private double Jumps(IncoherentChannel channel, int p, int q, int z, double[] before, int[] offsets, int countBefore)
    {
        double sum = 0;
        int open = ((1 << _n) - 1) & ~(p ^ q);
        ReadOnlySpan<int> compact = Subsets.Of(BitOperations.PopCount((uint)open)).Ranks;
        for (int both = p & q; both != 0; both &= both - 1)
        {
            int from = BitOperations.TrailingZeroCount(both), bit = 1 << from;
            int offset = offsets[(_subsets.Rank(p & ~bit) * countBefore) + _subsets.Rank(q & ~bit)];
            for (int targets = z; targets != 0; targets &= targets - 1)
                sum += channel.Jump(BitOperations.TrailingZeroCount(targets), from) * before[offset + compact[Compress(z & ~(targets & -targets), open)]];
        }

        return sum;
    }

    private double Kept(IncoherentChannel channel, int p, int q, int z, double[] before, int[] offsets, int countBefore)
    {
        double sum = 0;
        int left = p & (z | ~q), right = q & (z | ~p); // used by state and target, by their conjugates
        for (int i = left; i != 0; i &= i - 1)
        {
            int a = i & -i;
            for (int j = right & ~a; j != 0; j &= j - 1)
            {
                int b = j & -j, pBefore = p & ~a, qBefore = q & ~b, open = ((1 << _n) - 1) & ~(pBefore ^ qBefore);
                int number = Subsets.Of(BitOperations.PopCount((uint)open)).Rank(Compress(z & ~(a | b), open));
                sum += channel.Keep(BitOperations.TrailingZeroCount(a), BitOperations.TrailingZeroCount(b))
                    * before[offsets[(_subsets.Rank(pBefore) * countBefore) + _subsets.Rank(qBefore)] + number];
            }
        }

        return sum;
    }

    /// <summary>The bits of a mask at the places of another, side by side.</summary>
    private static int Compress(int mask, int places) => Bmi2.IsSupported ? (int)Bmi2.ParallelBitExtract((uint)mask, (uint)places) : CompressSlowly(mask, places);

    /// <summary>The reverse of <see cref="Compress"/>.</summary>
    private static int Spread(int compact, int places) => Bmi2.IsSupported ? (int)Bmi2.ParallelBitDeposit((uint)compact, (uint)places) : SpreadSlowly(compact, places);

    private static int CompressSlowly(int mask, int places)
    {
        int result = 0;
        for (int at = 0; places != 0; places &= places - 1, at++)
            result |= (mask & places & -places) != 0 ? 1 << at : 0;
        return result;
    }

    private static int SpreadSlowly(int compact, int places)
    {
        int result = 0;
        for (; places != 0; places &= places - 1, compact >>= 1)
            result |= (compact & 1) != 0 ? places & -places : 0;
        return result;
    }
}
