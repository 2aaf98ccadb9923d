namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>Runs <see cref="SignedDeterminants"/> on all cores. Parts are cut and added in one order, so that the result does not depend on the number of threads.</summary>
internal static class SignSums
{
    /// <summary>Parts that a large sum is cut into.</summary>
    private const int Parts = 64;

    /// <summary>Below this many multiplications starting threads costs more than they save.</summary>
    private const double WorthThreads = 2e6;

    /// <summary>The whole sum over signs of <paramref name="terms"/> matrices of order <paramref name="order"/>.</summary>
    public static RoundedSum Of(int terms, int order, double[] re, double[] im)
    {
        SignedDeterminants first = new(terms, order);
        if (SignedDeterminants.Work(terms, order) < WorthThreads || first.Leaves < Parts)
            return first.Sum(re, im);
        long leaves = first.Leaves / Parts;
        RoundedSum[] sums = new RoundedSum[Parts];
        Parallel.For(0, Parts, () => new SignedDeterminants(terms, order), (part, _, worker) =>
        {
            sums[part] = worker.Sum(re, im, part * leaves, (part + 1) * leaves);
            return worker;
        }, _ => { });
        return sums.Aggregate((a, b) => a + b);
    }
}
