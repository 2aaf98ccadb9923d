namespace ResourceCheck.Numerics.Counting;

/// <summary>All probabilities of one binomial law that matter, from <see cref="First"/> on.</summary>
/// <param name="First">Number of successes of the first entry.</param>
/// <param name="Probabilities">Probabilities of consecutive numbers of successes.</param>
internal sealed record BinomialRow(int First, double[] Probabilities)
{
    /// <summary>Probabilities below this are left out: a sum over any number of states that fits in memory does not see them at 1e-27, which is 1e-12 of 1e-15.</summary>
    public const double Negligible = 1e-36;

    /// <summary>The row of a law, found outwards from its peak.</summary>
    public static BinomialRow Of(int trials, double p, double q)
    {
        int peak = Math.Clamp((int)((trials + 1) * p), 0, trials);
        int first = peak, last = peak;
        List<double> up = [BinomialLaw.Probability(peak, trials, p, q)], down = [];
        while (last < trials && BinomialLaw.Probability(last + 1, trials, p, q) is var above && above > Negligible)
        {
            up.Add(above);
            last++;
        }

        while (first > 0 && BinomialLaw.Probability(first - 1, trials, p, q) is var below && below > Negligible)
        {
            down.Add(below);
            first--;
        }

        down.Reverse();
        return new BinomialRow(first, [.. down, .. up]);
    }
}
