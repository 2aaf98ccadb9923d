using System.Numerics;
using FsCheck.Xunit;
using ResourceCheck.Numerics.Counting;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>Counting laws against exact fractions.</summary>
public sealed class CountingLawsTests
{
    [Property(MaxTest = 300)]
    public void Binomial_probabilities_hold_twelve_digits_into_the_tails(int seed)
    {
        Random random = new(seed);
        int n = random.Next(1, 1500), x = random.Next(n + 1), parts = 1 << random.Next(1, 11), part = random.Next(1, parts);
        BigInteger numerator = Choose(n, x) * BigInteger.Pow(part, x) * BigInteger.Pow(parts - part, n - x);
        double expected = Ratio(numerator, BigInteger.Pow(parts, n));
        if (expected > 1e-60)
            Close(expected, BinomialLaw.Probability(x, n, (double)part / parts, (double)(parts - part) / parts), seed);
    }

    [Property(MaxTest = 300)]
    public void Hypergeometric_probabilities_hold_twelve_digits_into_the_tails(int seed)
    {
        Random random = new(seed);
        int whole = random.Next(1, 600), marked = random.Next(whole + 1), drawn = random.Next(whole + 1), found = random.Next(drawn + 1);
        double expected = found > marked || drawn - found > whole - marked ? 0 : Ratio(Choose(marked, found) * Choose(whole - marked, drawn - found), Choose(whole, drawn));
        if (expected is 0 or > 1e-60)
            Close(expected, HypergeometricLaw.Probability(found, drawn, marked, whole), seed);
    }

    [Fact]
    public void A_row_of_the_binomial_law_sums_to_one_and_leaves_out_only_what_is_negligible()
    {
        foreach (int n in (int[])[0, 1, 7, 300, 1200])
        {
            BinomialRow row = BinomialRow.Of(n, 0.3, 0.7);
            Assert.Equal(1, row.Probabilities.Sum(), 13);
            Assert.True(row.First == 0 || BinomialLaw.Probability(row.First - 1, n, 0.3, 0.7) <= BinomialRow.Negligible);
        }
    }

    // Zero successes: the upper end is 1 - (tail)^(1/n) in closed form, C. J. Clopper and E. S. Pearson, Biometrika 26, 404 (1934).
    [Fact]
    public void The_confidence_interval_has_its_closed_form_without_successes()
    {
        (double low, double high) = ClopperPearson.Interval(0, 1000, 0.999);
        Assert.Equal(0, low);
        Assert.Equal(1 - Math.Pow(0.0005, 1.0 / 1000), high, 14);
        (low, high) = ClopperPearson.Interval(1000, 1000, 0.999);
        Assert.Equal(1, high);
        Assert.Equal(Math.Pow(0.0005, 1.0 / 1000), low, 13);
    }

    [Theory]
    [InlineData(1, 10)]
    [InlineData(7, 20)]
    [InlineData(3, 100000)]
    [InlineData(50000, 100000)]
    public void At_the_ends_of_the_confidence_interval_the_tails_are_what_the_confidence_leaves(int successes, int trials)
    {
        (double low, double high) = ClopperPearson.Interval(successes, trials, 0.999);
        Assert.Equal(0.0005, ClopperPearson.UpperTail(successes, trials, low, 1 - low), 12);
        Assert.Equal(0.0005, ClopperPearson.UpperTail(trials - successes, trials, 1 - high, high), 12);
        Assert.InRange((double)successes / trials, low, high);
    }

    private static void Close(double expected, double actual, int seed) =>
        Assert.True(Math.Abs(actual - expected) <= 1e-12 * expected, $"seed {seed}: {actual:R} for {expected:R}");

    /// <summary>Quotient of large whole numbers to double precision.</summary>
    private static double Ratio(BigInteger numerator, BigInteger denominator)
    {
        if (numerator.IsZero)
            return 0;
        int shift = (int)(denominator.GetBitLength() - numerator.GetBitLength()) + 64;
        BigInteger scaled = shift >= 0 ? (numerator << shift) / denominator : numerator / (denominator << -shift);
        return Math.ScaleB((double)scaled, -shift);
    }

    private static BigInteger Choose(int n, int k)
    {
        BigInteger value = BigInteger.One;
        for (int i = 1; i <= k; i++)
            value = value * (n - k + i) / i;
        return value;
    }
}
