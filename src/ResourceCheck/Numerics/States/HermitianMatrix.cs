using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace ResourceCheck.Numerics.States;

/// <summary>Eigenvalues, sums of singular values and products of matrices that are stored row after row.</summary>
internal static class HermitianMatrix
{
    /// <summary>Dimension up to which all eigenvalues are computed: 256 takes a tenth of a second, 512 about one, 3125 would take many minutes.</summary>
    public const int LargestDecomposed = 512;

    /// <summary>
    /// Denormal parts, from about 2e-308 downwards, let the library's decompositions divide 0 by 0. Parts this small change no figure.
    /// </summary>
    private const double Negligible = 1e-200;

    /// <summary>Eigenvalues in ascending order. The entries must be finite, else the decomposition fails.</summary>
    public static double[] Eigenvalues(Complex[] rows, int size)
    {
        double[] values = [.. Decompose(rows, size).EigenValues.Select(value => value.Real)];
        Array.Sort(values);
        return values;
    }

    /// <summary>The matrix with the same eigenvectors and with eigenvalues that a function makes of the old ones.</summary>
    public static Complex[] WithEigenvalues(Complex[] rows, int size, Func<double[], double[]> change)
    {
        Evd<Complex> modes = Decompose(rows, size);
        double[] values = change([.. modes.EigenValues.Select(value => value.Real)]);
        Matrix<Complex> v = modes.EigenVectors;
        Matrix<Complex> scaled = v.MapIndexed((_, column, entry) => entry * values[column]);
        return scaled.ConjugateTransposeAndMultiply(v).ToRowMajorArray();
    }

    /// <summary>Trace norm: the sum of the singular values, of any square matrix. Those of a Hermitian one come several times faster.</summary>
    public static double TraceNorm(Complex[] rows, int size) => LargestAsymmetry(rows, size).Deviation == 0
        ? Eigenvalues(rows, size).Sum(Math.Abs)
        : Matrix<Complex>.Build.Dense(size, size, [.. rows.Select(WithoutDenormals)]).Svd(false).S.Sum(value => value.Real);

    /// <summary>(ρ + ρ†)/2, the Hermitian matrix nearest to any square one.</summary>
    public static Complex[] HermitianPart(Complex[] rows, int size)
    {
        Complex[] part = new Complex[rows.Length];
        for (int r = 0; r < size; r++)
        {
            for (int c = 0; c < size; c++)
                part[r * size + c] = (rows[r * size + c] + Complex.Conjugate(rows[c * size + r])) / 2;
        }

        return part;
    }

    /// <summary>Largest |ρ_rc - ρ*_cr|, 0 for a Hermitian matrix, and where it is.</summary>
    public static (double Deviation, int Row, int Column) LargestAsymmetry(Complex[] rows, int size)
    {
        (double Deviation, int Row, int Column) largest = (0, 0, 0);
        for (int r = 0; r < size; r++)
        {
            for (int c = 0; c <= r; c++)
            {
                double deviation = Complex.Abs(rows[r * size + c] - Complex.Conjugate(rows[c * size + r]));
                if (deviation > largest.Deviation)
                    largest = (deviation, r, c);
            }
        }

        return largest;
    }

    /// <summary>Sum of the diagonal.</summary>
    public static Complex Trace(Complex[] rows, int size)
    {
        Complex trace = Complex.Zero;
        for (int r = 0; r < size; r++)
            trace += rows[r * size + r];
        return trace;
    }

    /// <summary>The number with negligible parts set to 0, as decompositions need it.</summary>
    public static Complex WithoutDenormals(Complex z) =>
        new(Math.Abs(z.Real) < Negligible ? 0 : z.Real, Math.Abs(z.Imaginary) < Negligible ? 0 : z.Imaginary);

    private static Evd<Complex> Decompose(Complex[] rows, int size)
    {
        Complex[] columns = new Complex[rows.Length];
        for (int r = 0; r < size; r++)
        {
            for (int c = 0; c < size; c++)
                columns[c * size + r] = WithoutDenormals(rows[r * size + c]);
        }

        return Matrix<Complex>.Build.Dense(size, size, columns).Evd(Symmetricity.Hermitian);
    }
}
