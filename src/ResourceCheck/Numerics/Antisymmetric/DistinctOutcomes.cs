using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Probability that the outcomes of m parties all differ, while the other parties' outcomes are given. Equal noise: m! times one
/// mixed discriminant. Operators that share one eigenbasis: sums without negative terms (<see cref="DiagonalDistinct"/>). In general the sum over
/// assignments of outcomes is a permanent over the mixed discriminant, and Glynn's sign form serves twice: 2^{d-1} 2^{N-1} determinants.
/// </summary>
internal static class DistinctOutcomes
{
    /// <summary>Parts that the outer sum is cut into, whatever the number of threads.</summary>
    private const int Parts = 64;

    /// <param name="effects">For each of the m parties the operators of outcomes 0 … d-1.</param>
    /// <param name="others">Operators of the N-m other parties.</param>
    public static RoundedSum Of(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        int m = effects.Count, d = effects[0].Count;
        if (m > d)
            return default;
        if (m == d && AreEqual(effects))
            return MixedDiscriminant.Of([.. effects[0], .. others]).Times(AntisymmetricState.Factorial(m));
        return DiagonalDistinct.Find(effects, others)?.Probability() ?? General(effects, others);
    }

    /// <summary>The double sign form, whatever the operators.</summary>
    public static RoundedSum General(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        int m = effects.Count, d = effects[0].Count, n = m + others.Count, parts = Math.Min(Parts, 1 << (d - 1));
        RoundedSum[] sums = new RoundedSum[parts];
        int each = (1 << (d - 1)) / parts;
        Parallel.For(0, parts, part => sums[part] = new DistinctSum(effects, others).Part(part * each, (part + 1) * each));
        return sums.Aggregate((a, b) => a + b).Times(MixedDiscriminant.Normalisation(n) / (Math.Pow(2, d - 1) * AntisymmetricState.Factorial(d - m)));
    }

    /// <summary>Complex multiplications of <see cref="Of"/>.</summary>
    public static double Work(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        int m = effects.Count, d = effects[0].Count, n = m + others.Count;
        if (m > d)
            return 0;
        if (m == d && AreEqual(effects))
            return MixedDiscriminant.Work(n, n);
        return DiagonalDistinct.Find(effects, others)?.Work ?? Math.Pow(2, d - 1) * SignedDeterminants.Work(n, n);
    }

    /// <summary>The same for a product state, of which party i finds k with the probability of row i, column k: a permanent.</summary>
    public static double OfProduct(double[][] probabilities)
    {
        int m = probabilities.Length, d = probabilities[0].Length;
        if (m > d)
            return 0;
        double sum = 0;
        for (int signs = 0; signs < 1 << (d - 1); signs++)
        {
            double term = Math.Pow(d - (2 * BitOperations.PopCount((uint)signs)), d - m) * (int.IsEvenInteger(BitOperations.PopCount((uint)signs)) ? 1 : -1);
            foreach (double[] row in probabilities)
            {
                double factor = 0;
                for (int k = 0; k < d; k++)
                    factor += k > 0 && (signs >> (k - 1) & 1) != 0 ? -row[k] : row[k];
                term *= factor;
            }

            sum += term;
        }

        return sum / (Math.Pow(2, d - 1) * AntisymmetricState.Factorial(d - m));
    }

    private static bool AreEqual(IReadOnlyList<IReadOnlyList<LocalOperator>> effects) =>
        effects.All(list => list.Zip(effects[0], (a, b) => a.IsNear(b)).All(same => same));
}
