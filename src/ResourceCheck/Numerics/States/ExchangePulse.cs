using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace ResourceCheck.Numerics.States;

/// <summary>
/// One step of preparation by exchange, from m-1 to m qudits: evolution under H = Σ_{i&lt;k} J_ik P_ik (P_ik swaps two qudits, ħ = 1) for
/// τ_m + δτ, then the phase arg b - arg a + δφ on level m-1 of the last qudit, with τ_m = (2/m) arcsin(√m/2),
/// a = (e^{imτ_m} + m - 1)/m and b = (e^{imτ_m} - 1)/m. For J = 1 and no errors |S_{m-1}⟩⊗|m-1⟩ becomes |S_m⟩:
/// it lies in two eigenspaces of H that are m apart, so that after τ_m all m places of the new level have equal weight. Needs m ≤ 4.
/// </summary>
/// <remarks>
/// Swaps only permute the levels, so everything happens in the span of the m! permutations. A state is the list of its amplitudes in the
/// order of <see cref="Permutations.Of"/>.
/// </remarks>
internal static class ExchangePulse
{
    /// <summary>τ_m is real only up to four qudits.</summary>
    public const int MostParties = 4;

    /// <summary>Amplitudes on the permutations of m levels after the step.</summary>
    /// <param name="start">Amplitudes on the permutations of m-1 levels.</param>
    /// <param name="m">Number of qudits after the step.</param>
    /// <param name="couplings">J, m×m, symmetric.</param>
    /// <param name="timeError">δτ.</param>
    /// <param name="phaseError">δφ, rad.</param>
    public static Complex[] Apply(Complex[] start, int m, double[,] couplings, double timeError, double phaseError)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(m, MostParties);
        int[][] basis = [.. Permutations.Of(m).Select(p => p.Levels)];
        double tau = 2.0 / m * Math.Asin(Math.Sqrt(m) / 2);
        Complex[] state = Evolve(Hamiltonian(basis, couplings), Extend(start, basis), tau + timeError);
        Complex turned = Complex.FromPolarCoordinates(1, Phase(m, tau) + phaseError);
        for (int i = 0; i < state.Length; i++)
        {
            if (basis[i][^1] == m - 1)
                state[i] *= turned;
        }

        return state;
    }

    private static double Phase(int m, double tau)
    {
        Complex turn = Complex.FromPolarCoordinates(1, m * tau);
        return ((turn - 1) / m).Phase - ((turn + (m - 1)) / m).Phase;
    }

    /// <summary>The state with the new qudit in the new level; dropping that level keeps the lexicographic order.</summary>
    private static Complex[] Extend(Complex[] start, int[][] basis)
    {
        Complex[] state = new Complex[basis.Length];
        int next = 0;
        for (int i = 0; i < basis.Length; i++)
        {
            if (basis[i][^1] == basis[i].Length - 1)
                state[i] = start[next++];
        }

        return state;
    }

    private static Matrix<double> Hamiltonian(int[][] basis, double[,] couplings)
    {
        int m = basis[0].Length;
        Dictionary<int, int> place = basis.Select((levels, i) => (levels, i)).ToDictionary(p => Permutations.IndexOf(p.levels, m), p => p.i);
        Matrix<double> h = Matrix<double>.Build.Dense(basis.Length, basis.Length);
        for (int column = 0; column < basis.Length; column++)
        {
            foreach ((int i, int k) in Pairs(m))
            {
                int[] swapped = [.. basis[column]];
                (swapped[i], swapped[k]) = (swapped[k], swapped[i]);
                h[place[Permutations.IndexOf(swapped, m)], column] += couplings[i, k];
            }
        }

        return h;
    }

    private static IEnumerable<(int First, int Second)> Pairs(int m)
    {
        for (int i = 0; i < m; i++)
        {
            for (int k = i + 1; k < m; k++)
                yield return (i, k);
        }
    }

    private static Complex[] Evolve(Matrix<double> h, Complex[] state, double time)
    {
        Evd<double> modes = h.Evd(Symmetricity.Symmetric);
        Matrix<Complex> v = modes.EigenVectors.ToComplex();
        Matrix<Complex> weights = v.ConjugateTransposeThisAndMultiply(Matrix<Complex>.Build.Dense(state.Length, 1, state));
        Matrix<Complex> turned = weights.MapIndexed((i, _, w) => w * Complex.FromPolarCoordinates(1, -modes.EigenValues[i].Real * time));
        return (v * turned).ToColumnMajorArray();
    }
}
