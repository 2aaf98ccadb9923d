namespace ResourceCheck.Numerics.Counting;

/// <summary>
/// Exact confidence interval of a probability from counts: C. J. Clopper and E. S. Pearson, Biometrika 26, 404 (1934). The ends
/// are where a binomial tail equals half of what the confidence leaves; they are bisected.
/// </summary>
internal static class ClopperPearson
{
    private const int Bisections = 200;

    /// <summary>The interval.</summary>
    /// <param name="successes">Successes seen.</param>
    /// <param name="trials">Trials made, at least 1.</param>
    /// <param name="confidence">Confidence, below 1.</param>
    public static (double Low, double High) Interval(int successes, int trials, double confidence)
    {
        double tail = (1 - confidence) / 2;
        double low = successes == 0 ? 0 : Solve(p => UpperTail(successes, trials, p, 1 - p) < tail);
        double high = successes == trials ? 1 : 1 - Solve(q => UpperTail(trials - successes, trials, q, 1 - q) < tail);
        return (low, high);
    }

    /// <summary>Probability of at least <paramref name="least"/> successes, summed from the far end of what matters.</summary>
    public static double UpperTail(int least, int trials, double p, double q)
    {
        if (least > (trials + 1) * p)
            return Sum(least, trials, 1, trials, p, q);
        return 1 - (least == 0 ? 0 : Sum(least - 1, 0, -1, trials, p, q));
    }

    private static double Sum(int from, int to, int step, int trials, double p, double q)
    {
        CompensatedSum sum = default;
        for (int k = from; ; k += step)
        {
            double term = BinomialLaw.Probability(k, trials, p, q);
            sum.Add(term);
            if (k == to || term < 1e-18 * sum.Value)
                return sum.Value;
        }
    }

    private static double Solve(Func<double, bool> below)
    {
        double low = 0, high = 1;
        for (int i = 0; i < Bisections && high - low > 1e-15 * high; i++)
        {
            double middle = (low + high) / 2;
            if (below(middle))
                low = middle;
            else
                high = middle;
        }

        return (low + high) / 2;
    }
}
