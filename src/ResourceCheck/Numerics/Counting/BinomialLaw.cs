namespace ResourceCheck.Numerics.Counting;

/// <summary>
/// Probabilities of the binomial law by the saddle-point expansion of C. Loader, "Fast and accurate computation of binomial
/// probabilities" (2000): the large logarithms of factorials cancel analytically, so that the relative error stays near
/// rounding times the logarithm of the result, far into the tails.
/// </summary>
internal static class BinomialLaw
{
    /// <summary>Up to here the Stirling error is taken from the factorial itself; 15! is exact in double precision and the series is good to rounding beyond.</summary>
    private const int ExactFactorials = 15;

    private static readonly double[] SmallErrors = [.. Enumerable.Range(0, ExactFactorials + 1).Select(SmallError)];

    /// <summary>Probability of a number of successes. Both probabilities are given, because the smaller one is not known well from the other.</summary>
    /// <param name="successes">Number of successes, 0 to <paramref name="trials"/>.</param>
    /// <param name="trials">Number of trials.</param>
    /// <param name="p">Probability of success.</param>
    /// <param name="q">Probability of failure, 1 - p.</param>
    public static double Probability(int successes, int trials, double p, double q)
    {
        if (p == 0)
            return successes == 0 ? 1 : 0;
        if (q == 0)
            return successes == trials ? 1 : 0;
        if (successes == 0)
            return Math.Pow(q, trials);
        if (successes == trials)
            return Math.Pow(p, trials);
        double x = successes, rest = trials - successes, n = trials;
        double exponent = StirlingError(trials) - StirlingError(successes) - StirlingError(trials - successes) - Deviance(x, n * p) - Deviance(rest, n * q);
        return Math.Exp(exponent) * Math.Sqrt(n / (2 * Math.PI * x * rest));
    }

    /// <summary>ln n! less Stirling's approximation (n + 1/2) ln n - n + ln(2π)/2.</summary>
    public static double StirlingError(int n)
    {
        if (n <= ExactFactorials)
            return SmallErrors[n];
        double square = (double)n * n;
        return ((1.0 / 12) - (((1.0 / 360) - (((1.0 / 1260) - (((1.0 / 1680) - (1.0 / 1188 / square)) / square)) / square)) / square)) / n;
    }

    private static double SmallError(int n)
    {
        if (n == 0)
            return 0;
        double factorial = 1;
        for (int k = 2; k <= n; k++)
            factorial *= k;
        return Math.Log(factorial) - ((n + 0.5) * Math.Log(n)) + n - (0.5 * Math.Log(2 * Math.PI));
    }

    /// <summary>x ln(x/m) + m - x without cancellation near x = m (Loader's bd0).</summary>
    private static double Deviance(double x, double m)
    {
        double difference = x - m;
        if (Math.Abs(difference) >= 0.1 * (x + m))
            return (x * Math.Log(x / m)) - difference;
        double v = difference / (x + m), sum = difference * v, term = 2 * x * v;
        for (int j = 1; ; j++)
        {
            term *= v * v;
            double next = sum + (term / ((2 * j) + 1));
            if (next == sum)
                return sum;
            sum = next;
        }
    }
}
