namespace ResourceCheck.Numerics.Counting;

/// <summary>
/// Probabilities of the hypergeometric law as a quotient of three binomial ones (C. Loader, 2000): drawing k of n is binomial
/// sampling at rate k/n conditioned on k draws.
/// </summary>
internal static class HypergeometricLaw
{
    /// <summary>Probability that a random subset has a number of marked members.</summary>
    /// <param name="found">Marked members among the drawn.</param>
    /// <param name="drawn">Size of the subset.</param>
    /// <param name="marked">Marked members of the whole.</param>
    /// <param name="whole">Size of the whole.</param>
    public static double Probability(int found, int drawn, int marked, int whole)
    {
        if (found < Least(drawn, marked, whole) || found > Math.Min(drawn, marked))
            return 0;
        if (drawn == 0 || drawn == whole)
            return 1;
        double p = (double)drawn / whole, q = (double)(whole - drawn) / whole;
        return BinomialLaw.Probability(found, marked, p, q) * BinomialLaw.Probability(drawn - found, whole - marked, p, q) / BinomialLaw.Probability(drawn, whole, p, q);
    }

    /// <summary>Fewest marked members that a subset of this size can have.</summary>
    public static int Least(int drawn, int marked, int whole) => Math.Max(0, drawn - (whole - marked));
}
