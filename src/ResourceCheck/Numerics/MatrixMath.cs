using System.Numerics;

namespace ResourceCheck.Numerics;

/// <summary>Small complex matrices as rectangular arrays, row first.</summary>
internal static class MatrixMath
{
    public static Complex[,] Identity(int n)
    {
        Complex[,] result = new Complex[n, n];
        for (int i = 0; i < n; i++)
            result[i, i] = Complex.One;
        return result;
    }

    public static Complex Trace(Complex[,] a)
    {
        Complex sum = Complex.Zero;
        for (int i = 0; i < a.GetLength(0); i++)
            sum += a[i, i];
        return sum;
    }

    public static Complex[,] Adjoint(Complex[,] a)
    {
        int rows = a.GetLength(0), columns = a.GetLength(1);
        Complex[,] result = new Complex[columns, rows];
        for (int i = 0; i < rows; i++)
        {
            for (int j = 0; j < columns; j++)
                result[j, i] = Complex.Conjugate(a[i, j]);
        }

        return result;
    }

    public static Complex[,] Multiply(Complex[,] a, Complex[,] b)
    {
        int rows = a.GetLength(0), inner = a.GetLength(1), columns = b.GetLength(1);
        Complex[,] result = new Complex[rows, columns];
        for (int i = 0; i < rows; i++)
        {
            for (int k = 0; k < inner; k++)
            {
                for (int j = 0; j < columns; j++)
                    result[i, j] += a[i, k] * b[k, j];
            }
        }

        return result;
    }

    /// <summary>Largest |(A†A - 1)_ij|: 0 for a unitary.</summary>
    public static double DeviationFromUnitary(Complex[,] a)
    {
        Complex[,] gram = Multiply(Adjoint(a), a);
        double worst = 0;
        for (int i = 0; i < gram.GetLength(0); i++)
        {
            for (int j = 0; j < gram.GetLength(1); j++)
                worst = Math.Max(worst, (gram[i, j] - (i == j ? 1 : 0)).Magnitude);
        }

        return worst;
    }
}
