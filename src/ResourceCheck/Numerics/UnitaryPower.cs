using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace ResourceCheck.Numerics;

/// <summary>
/// U^x by the principal logarithm; the eigenvalue -1 has phase +π. A unitary is normal, so its Hermitian and anti-Hermitian
/// parts share eigenvectors; a generic combination of both is diagonalised, which keeps degenerate eigenvectors orthonormal.
/// </summary>
internal static class UnitaryPower
{
    /// <summary>Phases this close to -π are the eigenvalue -1 with round-off.</summary>
    private const double PhaseRoundOff = 1e-9;

    /// <summary>Weights of the anti-Hermitian part; a second is tried where the first happens to merge two eigenvalues.</summary>
    private static readonly double[] Weights = [0.7390851332151607, 1.3247179572447460, 0.5671432904097838];

    /// <summary>Returns U^x.</summary>
    public static Complex[,] Of(Complex[,] unitary, double x)
    {
        Matrix<Complex> u = Matrix<Complex>.Build.DenseOfArray(unitary);
        Matrix<Complex> best = u;
        double bestError = double.PositiveInfinity;
        foreach (double weight in Weights)
        {
            Matrix<Complex> vectors = Eigenvectors(u, weight);
            Matrix<Complex> diagonal = vectors.ConjugateTranspose() * u * vectors;
            double error = OffDiagonal(diagonal);
            if (error >= bestError)
                continue;
            bestError = error;
            best = vectors * Matrix<Complex>.Build.DenseOfDiagonalVector(diagonal.Diagonal().Map(z => Power(z, x))) * vectors.ConjugateTranspose();
        }

        return best.ToArray();
    }

    private static Matrix<Complex> Eigenvectors(Matrix<Complex> u, double weight)
    {
        Matrix<Complex> adjoint = u.ConjugateTranspose();
        Matrix<Complex> mixed = ((u + adjoint) * 0.5) + ((u - adjoint) * new Complex(0, -0.5 * weight));
        return mixed.Evd(Symmetricity.Hermitian).EigenVectors;
    }

    private static double OffDiagonal(Matrix<Complex> m)
    {
        double worst = 0;
        foreach ((int i, int j, Complex value) in m.EnumerateIndexed())
            worst = i == j ? worst : Math.Max(worst, value.Magnitude);
        return worst;
    }

    private static Complex Power(Complex eigenvalue, double x)
    {
        double phase = eigenvalue.Phase;
        if (phase < PhaseRoundOff - Math.PI)
            phase += 2 * Math.PI;
        return Complex.FromPolarCoordinates(1, phase * x);
    }
}
