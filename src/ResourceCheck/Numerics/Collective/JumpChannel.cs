using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// One collective way to emit a photon: J = Σ_i a_i σ^j_i with a = √λ u for an eigenvector u of γ^j with eigenvalue λ, so that
/// Σ_ik γ^j_ik σ_i ρ σ†_k = Σ J ρ J† over the channels of the transition.
/// </summary>
/// <param name="Transition">j, from 1.</param>
/// <param name="Rate">λ.</param>
/// <param name="Amplitudes">a_i.</param>
internal sealed record JumpChannel(int Transition, double Rate, double[] Amplitudes)
{
    /// <summary>Channels slower than this part of the fastest are round-off of the diagonalisation.</summary>
    private const double Negligible = 1e-14;

    /// <summary>All channels of all transitions.</summary>
    public static IReadOnlyList<JumpChannel> Of(Couplings couplings) =>
        [.. couplings.Decay.SelectMany((gamma, j) => Of(gamma, j + 1))];

    private static IEnumerable<JumpChannel> Of(double[,] gamma, int transition)
    {
        Evd<double> modes = Matrix<double>.Build.DenseOfArray(gamma).Evd(Symmetricity.Symmetric);
        double largest = modes.EigenValues.Max(value => value.Real);
        for (int mode = 0; mode < modes.EigenValues.Count; mode++)
        {
            double rate = modes.EigenValues[mode].Real;
            if (rate > Negligible * largest)
                yield return new JumpChannel(transition, rate, [.. modes.EigenVectors.Column(mode).Select(u => Math.Sqrt(rate) * u)]);
        }
    }
}
