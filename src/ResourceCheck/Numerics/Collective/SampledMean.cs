namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Mean of independent values in [0, 1] with an interval that holds with at least the stated confidence whatever the distribution:
/// the empirical Bernstein bound of A. Maurer and M. Pontil, Proc. 22nd Conf. on Learning Theory (2009), theorem 4, used on both sides
/// with half of the risk each: |mean - true| ≤ √(2 V L/n) + 7L/(3(n-1)), L = ln(4/risk), V the sample variance.
/// </summary>
/// <param name="Mean">Sample mean.</param>
/// <param name="Low">Lower end.</param>
/// <param name="High">Upper end.</param>
/// <param name="StandardError">√(V/n), for comparisons.</param>
/// <param name="Confidence">Confidence of the interval.</param>
/// <param name="Count">n.</param>
internal sealed record SampledMean(double Mean, double Low, double High, double StandardError, double Confidence, int Count)
{
    /// <summary>From the values themselves; their order does not matter beyond rounding. One value alone says nothing: [0, 1].</summary>
    public static SampledMean From(IReadOnlyList<double> values, double confidence)
    {
        int n = values.Count;
        double mean = values.Average();
        if (n < 2)
            return new SampledMean(mean, 0, 1, double.PositiveInfinity, confidence, n);
        double variance = values.Sum(x => (x - mean) * (x - mean)) / (n - 1), l = Math.Log(4 / (1 - confidence));
        double half = Math.Sqrt(2 * variance * l / n) + (7 * l / (3 * (n - 1)));
        return new SampledMean(mean, Math.Max(0, mean - half), Math.Min(1, mean + half), Math.Sqrt(variance / n), confidence, n);
    }
}
