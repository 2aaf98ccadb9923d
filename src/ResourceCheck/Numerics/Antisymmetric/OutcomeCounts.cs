using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Law of counts: how many parties' outcomes lie in each of several sets. Σ_i z_s^{[outcome in set s]} A_i in place of the operators makes the
/// probability a polynomial in z, whose coefficients are read off at roots of unity; no string is ever listed.
/// </summary>
internal static class OutcomeCounts
{
    /// <summary>
    /// The law: (N+1)^r numbers, the first set's count most significant.
    /// </summary>
    /// <param name="parties">For each party, which sets an outcome lies in (as bits) and the operator of all outcomes that lie in just these.</param>
    /// <param name="sets">r.</param>
    /// <param name="probability">Probability of one operator per party.</param>
    public static RoundedSum[] Of(IReadOnlyList<IReadOnlyList<(int Sets, LocalOperator Operator)>> parties, int sets, Func<IReadOnlyList<LocalOperator>, RoundedSum> probability)
    {
        int points = parties.Count + 1, size = (int)Math.Pow(points, sets);
        RoundedSum[] values = new RoundedSum[size];
        for (int point = 0; point < size; point++)
        {
            int[] digits = Digits(point, points, sets);
            values[point] = probability([.. parties.Select(p => At(p, digits, points))]);
        }

        return [.. Enumerable.Range(0, size).Select(c => Coefficient(values, Digits(c, points, sets), points))];
    }

    private static LocalOperator At(IReadOnlyList<(int Sets, LocalOperator Operator)> outcomes, int[] digits, int points) =>
        LocalOperator.Combination([.. outcomes.Select(o => o.Operator)], [.. outcomes.Select(o => BasisVectors.RootOfUnity(Inside(o.Sets, digits), points))]);

    private static long Inside(int sets, int[] digits)
    {
        long exponent = 0;
        for (int s = 0; s < digits.Length; s++)
            exponent += (sets >> s & 1) * digits[s];
        return exponent;
    }

    private static RoundedSum Coefficient(RoundedSum[] values, int[] counts, int points)
    {
        Complex sum = Complex.Zero;
        double error = 0;
        for (int point = 0; point < values.Length; point++)
        {
            int[] digits = Digits(point, points, counts.Length);
            long exponent = 0;
            for (int s = 0; s < counts.Length; s++)
                exponent += (long)digits[s] * counts[s];
            sum += values[point].Value * BasisVectors.RootOfUnity(-exponent, points);
            error += values[point].Error;
        }

        return new RoundedSum(sum.Real / values.Length, (error / values.Length) + 1e-16);
    }

    private static int[] Digits(int number, int radix, int count)
    {
        int[] digits = new int[count];
        for (int i = count - 1; i >= 0; i--)
        {
            digits[i] = number % radix;
            number /= radix;
        }

        return digits;
    }
}
