using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Fixed local unitaries exp(-iθG).</summary>
internal static class Rotations
{
    /// <summary>Deviation from U†U = 1 above which the exponential is not trusted.</summary>
    private const double UnitaryTolerance = 1e-9;

    /// <summary>G = diag(0 … d-1).</summary>
    public static Complex[,] Clock(int levels, double angle)
    {
        Complex[,] unitary = new Complex[levels, levels];
        for (int a = 0; a < levels; a++)
            unitary[a, a] = Complex.FromPolarCoordinates(1, -angle * a);
        return unitary;
    }

    /// <summary>G = i(|i⟩⟨k| - |k⟩⟨i|): the real rotation that takes |i⟩ to cos θ |i⟩ + sin θ |k⟩.</summary>
    public static Complex[,] InPlane(int levels, int i, int k, double angle)
    {
        Complex[,] unitary = new Complex[levels, levels];
        for (int a = 0; a < levels; a++)
            unitary[a, a] = 1;
        unitary[i, i] = unitary[k, k] = Math.Cos(angle);
        unitary[k, i] = Math.Sin(angle);
        unitary[i, k] = -Math.Sin(angle);
        return unitary;
    }

    /// <summary>Exponential of a given Hermitian matrix by its eigenvectors; null when the numbers are too large for that.</summary>
    public static Complex[,]? Generated(Complex[,] generator, double angle)
    {
        Matrix<Complex> g = Matrix<Complex>.Build.DenseOfArray(generator);
        double largest = g.Enumerate().Max(Complex.Abs);
        if (largest == 0)
            return Clock(generator.GetLength(0), 0);
        if (!double.IsFinite(largest * angle))
            return null;
        Evd<Complex> evd = (g / largest).Evd(Symmetricity.Hermitian);
        MathNet.Numerics.LinearAlgebra.Vector<Complex> phases = evd.EigenValues.Map(e => Complex.FromPolarCoordinates(1, -angle * largest * e.Real));
        Matrix<Complex> unitary = evd.EigenVectors * Matrix<Complex>.Build.DenseOfDiagonalVector(phases) * evd.EigenVectors.ConjugateTranspose();
        double defect = (unitary.ConjugateTranspose() * unitary - Matrix<Complex>.Build.DenseIdentity(g.RowCount)).Enumerate().Max(Complex.Abs);
        return defect <= UnitaryTolerance ? unitary.ToArray() : null;
    }
}
