namespace ResourceCheck.Engines.Figures;

/// <summary>
/// Largest |⟨AB⟩ + ⟨AB'⟩ + ⟨A'B⟩ - ⟨A'B'⟩| over projective settings on two levels, any other outcome counted as +1:
/// A = n·σ + R with R the projector on everything else. With E(n,m) = n·Tm + n·a + b·m + c the sum is
/// n·(T(m+m')+2a) + n'·T(m-m') + 2b·m + 2c, so that each pair of settings has a closed best answer to the other pair.
/// Without population elsewhere the optimum is 2√(t1²+t2²), t the singular values of T
/// (Horodecki, Horodecki and Horodecki, Phys. Lett. A 200, 340 (1995)); with it, alternating maximisation from many starts
/// gives a value that is attained, hence a lower bound of the largest.
/// </summary>
internal static class ChshOptimum
{
    /// <summary>Correlations with other levels below this are round-off.</summary>
    private const double Elsewhere = 1e-13;

    /// <summary>Rounds of alternating maximisation; convergence is linear and fast, this is far beyond need.</summary>
    private const int Rounds = 200;

    /// <summary>Observables per party: σx, σy, σz, anything else, identity.</summary>
    private const int Observables = 5;

    private static readonly double[][] Directions = [.. StartDirections()];

    /// <summary>The optimum from the 5×5 expectation values of the products of observables.</summary>
    public static Estimate Of(double[] correlations)
    {
        double[,] t = new double[3, 3];
        double[] a = new double[3], b = new double[3];
        for (int i = 0; i < 3; i++)
        {
            for (int j = 0; j < 3; j++)
                t[i, j] = correlations[(i * Observables) + j];
            a[i] = correlations[(i * Observables) + 3];
            b[i] = correlations[(3 * Observables) + i];
        }

        double c = correlations[(3 * Observables) + 3];
        if (a.Concat(b).All(x => Math.Abs(x) < Elsewhere))
            return Estimate.Exact((2 * Math.Sqrt(TwoLargestSquares(t))) + (2 * c));
        double best = Math.Max(Search(t, a, b) + (2 * c), Search(Negated(t), [.. a.Select(x => -x)], [.. b.Select(x => -x)]) - (2 * c));
        return Estimate.AtLeast(best);
    }

    /// <summary>Sum of the two larger squared singular values: trace of TᵀT less its smallest eigenvalue, by the trigonometric formula for 3×3.</summary>
    private static double TwoLargestSquares(double[,] t)
    {
        double[,] g = new double[3, 3];
        for (int i = 0; i < 3; i++)
        {
            for (int j = 0; j < 3; j++)
                g[i, j] = (t[0, i] * t[0, j]) + (t[1, i] * t[1, j]) + (t[2, i] * t[2, j]);
        }

        double trace = g[0, 0] + g[1, 1] + g[2, 2];
        return trace - SmallestEigenvalue(g, trace / 3);
    }

    /// <summary>Smallest eigenvalue of a symmetric 3×3 matrix with mean diagonal q (O. K. Smith, Commun. ACM 4, 168 (1961)).</summary>
    private static double SmallestEigenvalue(double[,] g, double q)
    {
        double off = (g[0, 1] * g[0, 1]) + (g[0, 2] * g[0, 2]) + (g[1, 2] * g[1, 2]);
        double[] e = [g[0, 0] - q, g[1, 1] - q, g[2, 2] - q];
        double p = Math.Sqrt(((e[0] * e[0]) + (e[1] * e[1]) + (e[2] * e[2]) + (2 * off)) / 6);
        if (p == 0)
            return q;
        double det = (e[0] * ((e[1] * e[2]) - (g[1, 2] * g[1, 2]))) - (g[0, 1] * ((g[0, 1] * e[2]) - (g[1, 2] * g[0, 2])))
            + (g[0, 2] * ((g[0, 1] * g[1, 2]) - (e[1] * g[0, 2])));
        double phi = Math.Acos(Math.Clamp(det / (2 * p * p * p), -1, 1)) / 3;
        return q + (2 * p * Math.Cos(phi + (2 * Math.PI / 3)));
    }

    private static double Search(double[,] t, double[] a, double[] b)
    {
        double best = double.NegativeInfinity;
        foreach (double[] m in Directions)
        {
            foreach (double[] other in Directions)
                best = Math.Max(best, Climb(t, a, b, m, other));
        }

        return best;
    }

    private static double Climb(double[,] t, double[] a, double[] b, double[] m, double[] m2)
    {
        double value = double.NegativeInfinity;
        for (int round = 0; round < Rounds; round++)
        {
            double[] n = Direction(Sum(Times(t, Sum(m, m2, 1), false), a, 2), out _);
            double[] n2 = Direction(Times(t, Sum(m, m2, -1), false), out _);
            m = Direction(Sum(Times(t, Sum(n, n2, 1), true), b, 2), out double first);
            m2 = Direction(Times(t, Sum(n, n2, -1), true), out double second);
            double next = first + second + (2 * ((n[0] * a[0]) + (n[1] * a[1]) + (n[2] * a[2])));
            if (next - value < 1e-15)
                return next;
            value = next;
        }

        return value;
    }

    private static double[] Sum(double[] x, double[] y, double factor) => [x[0] + (factor * y[0]), x[1] + (factor * y[1]), x[2] + (factor * y[2])];

    private static double[] Times(double[,] t, double[] v, bool transposed) =>
        [.. Enumerable.Range(0, 3).Select(i => Enumerable.Range(0, 3).Sum(j => (transposed ? t[j, i] : t[i, j]) * v[j]))];

    private static double[] Direction(double[] v, out double length)
    {
        length = Math.Sqrt((v[0] * v[0]) + (v[1] * v[1]) + (v[2] * v[2]));
        double scale = length;
        return scale > 0 ? [v[0] / scale, v[1] / scale, v[2] / scale] : [0, 0, 1];
    }

    private static double[,] Negated(double[,] t)
    {
        double[,] result = new double[3, 3];
        for (int i = 0; i < 9; i++)
            result[i / 3, i % 3] = -t[i / 3, i % 3];
        return result;
    }

    /// <summary>Directions to the corners, edges and faces of a cube, one of each opposite pair left in: 26 in all.</summary>
    private static IEnumerable<double[]> StartDirections()
    {
        for (int k = 0; k < 27; k++)
        {
            double[] v = [(k % 3) - 1, (k / 3 % 3) - 1, (k / 9) - 1];
            if (k != 13)
                yield return Direction(v, out _);
        }
    }
}
