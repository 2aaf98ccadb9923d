using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.Optimization;

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

    /// <summary>Rounds of alternating maximisation from every start: enough to tell the hills apart.</summary>
    private const int FirstRounds = 40;

    /// <summary>Simplex searches in a row from the best climb: alternation crawls along ridges where settings nearly coincide, a fresh simplex does not.</summary>
    private const int Polishes = 4;

    private const int PolishSteps = 4000;
    private const double PolishTolerance = 1e-13;

    /// <summary>Hills polished: the highest after the first climbs need not be the highest in the end.</summary>
    private const int Polished = 6;

    private const int Starts = 26;

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

    /// <summary>t1² + t2² of the two larger singular values. Eigenvalues of TᵀT would lose half the digits where two of them coincide.</summary>
    private static double TwoLargestSquares(double[,] t)
    {
        Vector<double> values = Matrix<double>.Build.DenseOfArray(t).Svd(computeVectors: false).S;
        return (values[0] * values[0]) + (values[1] * values[1]);
    }

    private static double Search(double[,] t, double[] a, double[] b) =>
        Directions.SelectMany(m => Directions.Select(other => Climb(t, a, b, m, other, FirstRounds)))
            .OrderByDescending(c => c.Value).DistinctBy(c => Math.Round(c.Value, 6)).Take(Polished)
            .Max(c => Polish(t, a, b, c.Value, c.M, c.Other));

    private static (double Value, double[] M, double[] Other) Climb(double[,] t, double[] a, double[] b, double[] m, double[] m2, int rounds)
    {
        double value = double.NegativeInfinity;
        for (int round = 0; round < rounds; round++)
        {
            double[] n = Direction(Sum(Times(t, Sum(m, m2, 1), false), a, 2), out _);
            double[] n2 = Direction(Times(t, Sum(m, m2, -1), false), out _);
            m = Direction(Sum(Times(t, Sum(n, n2, 1), true), b, 2), out double first);
            m2 = Direction(Times(t, Sum(n, n2, -1), true), out double second);
            double next = first + second + (2 * Dot(n, a));
            value = next;
        }

        return (value, m, m2);
    }

    /// <summary>Nelder–Mead over the four angles of one party's settings, the other party's being closed forms.</summary>
    private static double Polish(double[,] t, double[] a, double[] b, double value, double[] m, double[] m2)
    {
        Vector<double> angles = Vector<double>.Build.Dense([.. Angles(m), .. Angles(m2)]);
        IObjectiveFunction less = ObjectiveFunction.Value(x => -Value(t, a, b, Unit(x[0], x[1]), Unit(x[2], x[3])));
        for (int i = 0; i < Polishes; i++)
        {
            Vector<double> steps = Vector<double>.Build.Dense(4, Math.Pow(10, -1 - i));
            MinimizationResult found = Minimise(less, angles, steps);
            angles = found.MinimizingPoint;
            value = Math.Max(value, -found.FunctionInfoAtMinimum.Value);
        }

        return value;
    }

    /// <summary>An exhausted search is no failure: what it has found is attained all the same.</summary>
    private static MinimizationResult Minimise(IObjectiveFunction less, Vector<double> start, Vector<double> steps)
    {
        try
        {
            return NelderMeadSimplex.Minimum(less, start, steps, PolishTolerance, PolishSteps);
        }
        catch (MaximumIterationsException)
        {
            less.EvaluateAt(start);
            return new MinimizationResult(less, PolishSteps, ExitCondition.None);
        }
    }

    private static double Value(double[,] t, double[] a, double[] b, double[] m, double[] m2) =>
        Length(Sum(Times(t, Sum(m, m2, 1), false), a, 2)) + Length(Times(t, Sum(m, m2, -1), false)) + (2 * Dot(b, m));

    private static double Length(double[] v) => Math.Sqrt(Dot(v, v));

    private static double[] Angles(double[] v) => [Math.Acos(Math.Clamp(v[2], -1, 1)), Math.Atan2(v[1], v[0])];

    private static double[] Unit(double theta, double phi) => [Math.Sin(theta) * Math.Cos(phi), Math.Sin(theta) * Math.Sin(phi), Math.Cos(theta)];

    private static double Dot(double[] x, double[] y) => (x[0] * y[0]) + (x[1] * y[1]) + (x[2] * y[2]);

    private static double[] Sum(double[] x, double[] y, double factor) => [x[0] + (factor * y[0]), x[1] + (factor * y[1]), x[2] + (factor * y[2])];

    private static double[] Times(double[,] t, double[] v, bool transposed) => transposed
        ? [(t[0, 0] * v[0]) + (t[1, 0] * v[1]) + (t[2, 0] * v[2]), (t[0, 1] * v[0]) + (t[1, 1] * v[1]) + (t[2, 1] * v[2]), (t[0, 2] * v[0]) + (t[1, 2] * v[1]) + (t[2, 2] * v[2])]
        : [(t[0, 0] * v[0]) + (t[0, 1] * v[1]) + (t[0, 2] * v[2]), (t[1, 0] * v[0]) + (t[1, 1] * v[1]) + (t[1, 2] * v[2]), (t[2, 0] * v[0]) + (t[2, 1] * v[1]) + (t[2, 2] * v[2])];

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

    /// <summary>
    /// Evenly spread directions on a golden spiral, tilted so that none lies in a plane of symmetry of a typical state:
    /// alternation never leaves such a plane, even where the optimum lies outside.
    /// </summary>
    private static IEnumerable<double[]> StartDirections()
    {
        for (int k = 0; k < Starts; k++)
        {
            double z = 1 - (((2 * k) + 1.0) / Starts), angle = (Math.PI * (3 - Math.Sqrt(5)) * k) + 0.3, r = Math.Sqrt(1 - (z * z));
            yield return Direction([r * Math.Cos(angle), (r * Math.Sin(angle) * 0.8) + (z * 0.6), (z * 0.8) - (r * Math.Sin(angle) * 0.6)], out _);
        }
    }
}
