namespace ResourceCheck.Numerics;

/// <summary>
/// exp(A) of a small real matrix by scaling and squaring with the [13/13] Padé approximant:
/// N. J. Higham, SIAM J. Matrix Anal. Appl. 26, 1179 (2005), Algorithm 2.3 with m = 13 throughout
/// (the cheaper degrees are left out: matrices here have at most a few dozen rows).
/// </summary>
internal static class MatrixExponential
{
    /// <summary>θ_13 of table 2.3: largest 1-norm at which the approximant is accurate to double precision.</summary>
    private const double Theta13 = 5.371920351148152;

    /// <summary>Coefficients b_0 … b_13 of equation (2.16).</summary>
    private static readonly double[] B =
    [
        64764752532480000, 32382376266240000, 7771770303897600, 1187353796428800, 129060195264000, 10559470521600,
        670442572800, 33522128640, 1323241920, 40840800, 960960, 16380, 182, 1,
    ];

    /// <summary>Returns exp(A) for a square matrix with finite entries.</summary>
    public static double[,] Of(double[,] a)
    {
        double norm = OneNorm(a);
        int squarings = norm > Theta13 ? (int)Math.Ceiling(Math.Log2(norm / Theta13)) : 0;
        double[,] result = Pade13(Scale(a, Math.Pow(2, -squarings)));
        for (int i = 0; i < squarings; i++)
            result = Multiply(result, result);
        return result;
    }

    private static double[,] Pade13(double[,] a)
    {
        double[,] a2 = Multiply(a, a), a4 = Multiply(a2, a2), a6 = Multiply(a4, a2);
        double[,] inner = Sum((B[13], a6), (B[11], a4), (B[9], a2));
        double[,] u = Multiply(a, AddIdentity(Sum((1, Multiply(a6, inner)), (B[7], a6), (B[5], a4), (B[3], a2)), B[1]));
        double[,] even = Sum((B[12], a6), (B[10], a4), (B[8], a2));
        double[,] v = AddIdentity(Sum((1, Multiply(a6, even)), (B[6], a6), (B[4], a4), (B[2], a2)), B[0]);
        return Solve(Sum((1, v), (-1, u)), Sum((1, v), (1, u)));
    }

    private static double OneNorm(double[,] a)
    {
        double worst = 0;
        for (int j = 0; j < a.GetLength(1); j++)
        {
            double column = 0;
            for (int i = 0; i < a.GetLength(0); i++)
                column += Math.Abs(a[i, j]);
            worst = Math.Max(worst, column);
        }

        return worst;
    }

    private static double[,] Scale(double[,] a, double factor) => Sum((factor, a));

    private static double[,] Sum(params ReadOnlySpan<(double Factor, double[,] Matrix)> terms)
    {
        int n = terms[0].Matrix.GetLength(0);
        double[,] result = new double[n, n];
        foreach ((double factor, double[,] matrix) in terms)
        {
            for (int i = 0; i < n; i++)
            {
                for (int j = 0; j < n; j++)
                    result[i, j] += factor * matrix[i, j];
            }
        }

        return result;
    }

    private static double[,] AddIdentity(double[,] a, double factor)
    {
        for (int i = 0; i < a.GetLength(0); i++)
            a[i, i] += factor;
        return a;
    }

    private static double[,] Multiply(double[,] a, double[,] b)
    {
        int n = a.GetLength(0);
        double[,] result = new double[n, n];
        for (int i = 0; i < n; i++)
        {
            for (int k = 0; k < n; k++)
            {
                for (int j = 0; j < n; j++)
                    result[i, j] += a[i, k] * b[k, j];
            }
        }

        return result;
    }

    /// <summary>Solves A X = B by Gaussian elimination with partial pivoting; A is well conditioned by the choice of θ_13.</summary>
    private static double[,] Solve(double[,] a, double[,] b)
    {
        int n = a.GetLength(0);
        for (int column = 0; column < n; column++)
        {
            SwapRows(a, b, column, Pivot(a, column));
            for (int row = 0; row < n; row++)
            {
                if (row != column)
                    Eliminate(a, b, row, column);
            }
        }

        for (int i = 0; i < n; i++)
        {
            for (int j = 0; j < n; j++)
                b[i, j] /= a[i, i];
        }

        return b;
    }

    private static int Pivot(double[,] a, int column)
    {
        int best = column;
        for (int row = column + 1; row < a.GetLength(0); row++)
        {
            if (Math.Abs(a[row, column]) > Math.Abs(a[best, column]))
                best = row;
        }

        return best;
    }

    private static void SwapRows(double[,] a, double[,] b, int i, int k)
    {
        for (int j = 0; i != k && j < a.GetLength(0); j++)
        {
            (a[i, j], a[k, j]) = (a[k, j], a[i, j]);
            (b[i, j], b[k, j]) = (b[k, j], b[i, j]);
        }
    }

    private static void Eliminate(double[,] a, double[,] b, int row, int column)
    {
        double factor = a[row, column] / a[column, column];
        for (int j = 0; factor != 0 && j < a.GetLength(0); j++)
        {
            a[row, j] -= factor * a[column, j];
            b[row, j] -= factor * b[column, j];
        }
    }
}
