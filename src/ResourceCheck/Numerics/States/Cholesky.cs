using System.Numerics;

namespace ResourceCheck.Numerics.States;

/// <summary>
/// Cholesky factorisation ρ + ε1 = LL† as a test of positivity for matrices too large for eigenvalues: it exists with positive pivots
/// exactly when every eigenvalue of ρ is above -ε (Golub and Van Loan, Matrix Computations, ch. 4.2), up to round-off of about
/// dimension · 1e-16 · ‖ρ‖, far below the ε in use.
/// </summary>
internal static class Cholesky
{
    /// <summary>Rows worked on together, so that each finished row is fetched from memory once for all of them.</summary>
    private const int BlockRows = 16;

    /// <summary>Whether every eigenvalue is above minus the shift. Takes as much memory as the matrix.</summary>
    /// <param name="rows">Hermitian matrix, row after row; its lower triangle is read.</param>
    /// <param name="size">Dimension.</param>
    /// <param name="shift">ε.</param>
    public static bool IsAbove(Complex[] rows, int size, double shift)
    {
        double[] re = new double[rows.Length];
        double[] im = new double[rows.Length];
        for (int first = 0; first < size; first += BlockRows)
        {
            int end = Math.Min(first + BlockRows, size);
            for (int j = 0; j < end; j++)
            {
                for (int i = Math.Max(j, first); i < end; i++)
                {
                    if (!Step(rows, re, im, size, i, j, shift))
                        return false;
                }
            }
        }

        return true;
    }

    /// <summary>L_ij = (ρ_ij + ε δ_ij - Σ_{k&lt;j} L_ik L*_jk)/L_jj; false when a pivot is not positive.</summary>
    private static bool Step(Complex[] rows, double[] re, double[] im, int size, int i, int j, double shift)
    {
        (double sumRe, double sumIm) = Dot(re, im, i * size, j * size, j);
        Complex rest = rows[i * size + j] - new Complex(sumRe, sumIm);
        if (i != j)
        {
            double pivot = re[j * size + j];
            (re[i * size + j], im[i * size + j]) = (rest.Real / pivot, rest.Imaginary / pivot);
            return true;
        }

        double square = rest.Real + shift;
        re[j * size + j] = Math.Sqrt(square);
        return square > 0;
    }

    private static (double Re, double Im) Dot(double[] re, double[] im, int a, int b, int length)
    {
        Vector<double> sumRe = Vector<double>.Zero;
        Vector<double> sumIm = Vector<double>.Zero;
        int k = 0;
        for (; k <= length - Vector<double>.Count; k += Vector<double>.Count)
        {
            Vector<double> aRe = new(re, a + k), aIm = new(im, a + k), bRe = new(re, b + k), bIm = new(im, b + k);
            sumRe += aRe * bRe + aIm * bIm;
            sumIm += aIm * bRe - aRe * bIm;
        }

        (double lastRe, double lastIm) = (Vector.Sum(sumRe), Vector.Sum(sumIm));
        for (; k < length; k++)
        {
            lastRe += re[a + k] * re[b + k] + im[a + k] * im[b + k];
            lastIm += im[a + k] * re[b + k] - re[a + k] * im[b + k];
        }

        return (lastRe, lastIm);
    }
}
