using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Overlap of m parties with |S_m⟩ on the lowest m levels after any channels, the other N-m parties having been read out:
/// (1/(N! m!)) Σ over levels used by the state (P), its conjugate (Q), the target (A) and its conjugate (B) of the signed products of elements
/// [a,b;p,q], closed with the others' mixed minors on the complements of P and Q. After k parties there are C(N,k)² C(m,k)² states.
/// </summary>
internal static class FourSubsets
{
    /// <summary>The overlap, an unnormalised probability.</summary>
    /// <param name="channels">m channels.</param>
    /// <param name="others">Minors of the N-m operators that were read out.</param>
    public static RoundedSum Overlap(IReadOnlyList<LocalChannel> channels, MixedMinors others)
    {
        int n = others.Levels, m = channels.Count;
        Complex[] weights = [Complex.One];
        for (int k = 0; k < m; k++)
            weights = Take(channels[k], weights, n, m, k);
        RoundedSum sum = Close(weights, others, n, m);
        return sum.Times(1 / (AntisymmetricState.Factorial(n) * AntisymmetricState.Factorial(m)));
    }

    /// <summary>Complex multiplications.</summary>
    public static double Work(int n, int m) =>
        Enumerable.Range(1, m).Sum(k => Math.Pow(Subsets.ChooseReal(n, k) * Subsets.ChooseReal(m, k) * k * k, 2));

    /// <summary>Bytes of the two levels of states held at once.</summary>
    public static double Bytes(int n, int m)
    {
        double[] sizes = [.. Enumerable.Range(0, m + 1).Select(k => 16 * Math.Pow(Subsets.ChooseReal(n, k) * Subsets.ChooseReal(m, k), 2))];
        return Enumerable.Range(0, m).Max(k => sizes[k] + sizes[k + 1]);
    }

    private static Complex[] Take(LocalChannel channel, Complex[] before, int n, int m, int k)
    {
        int sources = Subsets.Choose(n, k + 1), targets = Subsets.Choose(m, k + 1);
        Complex[] after = new Complex[checked(sources * sources * targets * targets)];
        Parallel.For(0, sources * sources, pair => Fill(channel, before, after.AsSpan(pair * targets * targets, targets * targets), n, m, k, pair / sources, pair % sources));
        return after;
    }

    private static void Fill(LocalChannel channel, Complex[] before, Span<Complex> after, int n, int m, int k, int rankP, int rankQ)
    {
        Subsets levels = Subsets.Of(n), target = Subsets.Of(m);
        int p = levels.OfSize(k + 1)[rankP], q = levels.OfSize(k + 1)[rankQ], targetsBefore = Subsets.Choose(m, k), sourcesBefore = Subsets.Choose(n, k);
        ReadOnlySpan<int> sets = target.OfSize(k + 1);
        for (int i = p; i != 0; i &= i - 1)
        {
            int fromP = BitOperations.TrailingZeroCount(i), rowP = levels.Rank(p & ~(1 << fromP)) * sourcesBefore, signP = Subsets.SignOfRemoval(p, fromP);
            for (int j = q; j != 0; j &= j - 1)
            {
                int fromQ = BitOperations.TrailingZeroCount(j), sign = signP * Subsets.SignOfRemoval(q, fromQ);
                ReadOnlySpan<Complex> block = before.AsSpan((rowP + levels.Rank(q & ~(1 << fromQ))) * targetsBefore * targetsBefore, targetsBefore * targetsBefore);
                for (int rankA = 0; rankA < sets.Length; rankA++)
                    AddRow(channel, block, after.Slice(rankA * sets.Length, sets.Length), target, sets[rankA], sets, targetsBefore, fromP, fromQ, sign);
            }
        }
    }

    private static void AddRow(
        LocalChannel channel, ReadOnlySpan<Complex> block, Span<Complex> row, Subsets target, int a, ReadOnlySpan<int> sets, int before, int p, int q, int sign)
    {
        for (int i = a; i != 0; i &= i - 1)
        {
            int toA = BitOperations.TrailingZeroCount(i), signA = sign * Subsets.SignOfRemoval(a, toA);
            ReadOnlySpan<Complex> source = block.Slice(target.Rank(a & ~(1 << toA)) * before, before);
            for (int rankB = 0; rankB < sets.Length; rankB++)
            {
                Complex sum = Complex.Zero;
                for (int j = sets[rankB]; j != 0; j &= j - 1)
                {
                    int toB = BitOperations.TrailingZeroCount(j);
                    sum += signA * Subsets.SignOfRemoval(sets[rankB], toB) * channel[toA, toB, p, q] * source[target.Rank(sets[rankB] & ~(1 << toB))];
                }

                row[rankB] += sum;
            }
        }
    }

    private static RoundedSum Close(Complex[] weights, MixedMinors others, int n, int m)
    {
        Subsets levels = Subsets.Of(n);
        ReadOnlySpan<int> sets = levels.OfSize(m);
        int full = (1 << n) - 1, count = sets.Length;
        Complex sum = Complex.Zero;
        double size = 0;
        for (int p = 0; p < count; p++)
        {
            for (int q = 0; q < count; q++)
            {
                int sign = Subsets.SignOfShuffle(sets[p], n) * Subsets.SignOfShuffle(sets[q], n);
                Complex term = sign * weights[(p * count) + q] * others.Entries[(levels.Rank(full & ~sets[p]) * count) + levels.Rank(full & ~sets[q])];
                sum += term;
                size += term.Magnitude;
            }
        }

        return new RoundedSum(sum, size * n * 1e-15);
    }
}
