using System.Numerics;

namespace ResourceCheck.Numerics.States;

/// <summary>Matrices that act on one qudit of many. The first qudit is the most significant digit of an index.</summary>
internal static class LocalOperation
{
    /// <summary>A applied to one qudit of a vector of d^n amplitudes; the vector stays as it was.</summary>
    public static Complex[] Apply(Complex[] ket, int d, int n, int which, Complex[,] a)
    {
        int stride = AntisymmetricState.Power(d, n - 1 - which);
        Complex[] result = new Complex[ket.Length];
        for (int block = 0; block < ket.Length; block += stride * d)
        {
            for (int offset = block; offset < block + stride; offset++)
                Multiply(ket, result, offset, stride, a);
        }

        return result;
    }

    /// <summary>A applied to every qudit of a vector.</summary>
    public static Complex[] ApplyToAll(Complex[] ket, int d, int n, Complex[,] a)
    {
        for (int which = 0; which < n; which++)
            ket = Apply(ket, d, n, which, a);
        return ket;
    }

    /// <summary>(A⊗…⊗A) ρ (A⊗…⊗A)†; row and column of ρ are digits of one index of twice as many qudits.</summary>
    public static Complex[] ConjugateAll(Complex[] density, int d, int n, Complex[,] a)
    {
        Complex[,] conjugate = Conjugate(a);
        for (int which = 0; which < n; which++)
            density = Apply(Apply(density, d, 2 * n, which, a), d, 2 * n, n + which, conjugate);
        return density;
    }

    /// <summary>Rows are the conjugated Fourier basis vectors: ⟨k| = (1/√d) Σ_j exp(-2πi jk/d)⟨j|.</summary>
    public static Complex[,] ToFourier(int d)
    {
        Complex[,] a = new Complex[d, d];
        for (int k = 0; k < d; k++)
        {
            for (int j = 0; j < d; j++)
                a[k, j] = Complex.FromPolarCoordinates(1 / Math.Sqrt(d), -2 * Math.PI * (j * k % d) / d);
        }

        return a;
    }

    private static void Multiply(Complex[] ket, Complex[] result, int offset, int stride, Complex[,] a)
    {
        int d = a.GetLength(0);
        for (int row = 0; row < d; row++)
        {
            Complex sum = Complex.Zero;
            for (int column = 0; column < d; column++)
                sum += a[row, column] * ket[offset + column * stride];
            result[offset + row * stride] = sum;
        }
    }

    private static Complex[,] Conjugate(Complex[,] a)
    {
        Complex[,] conjugate = (Complex[,])a.Clone();
        for (int i = 0; i < a.GetLength(0); i++)
        {
            for (int k = 0; k < a.GetLength(1); k++)
                conjugate[i, k] = Complex.Conjugate(a[i, k]);
        }

        return conjugate;
    }
}
