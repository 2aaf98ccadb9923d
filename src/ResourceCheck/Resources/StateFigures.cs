using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>
/// Figures of a prepared state. Fidelity is ⟨S|ρ|S⟩, not its root; purity Tr ρ²; entropy -Tr ρ log2 ρ over positive eigenvalues.
/// States as read may fall short of being one: their figures are the same formulas.
/// </summary>
internal static class StateFigures
{
    /// <summary>d^N.</summary>
    public static int Dimension(PreparedState state) => AntisymmetricState.Power(state.Levels, state.Parties);

    /// <summary>⟨S|ρ|S⟩; needs as many levels as parties.</summary>
    public static double Fidelity(PreparedState state)
    {
        Complex[] s = AntisymmetricState.Ket(state.Parties);
        return Inner(s, Apply(state, s)).Real;
    }

    /// <summary>A lower bound of the largest fidelity over local unitaries, at least <see cref="Fidelity"/>.</summary>
    public static double FidelityInBestFrames(PreparedState state) =>
        Math.Max(
            Fidelity(state),
            LocalFrames.Best(v => Apply(state, v), state.Parties, state.Density is not null && Dimension(state) > HermitianMatrix.LargestDecomposed));

    /// <summary>Tr ρ².</summary>
    public static double Purity(PreparedState state) =>
        state.Ket is { } ket ? Math.Pow(ket.Sum(Square), 2) : state.Density!.Sum(Square);

    /// <summary>-Tr ρ log2 ρ.</summary>
    public static double Entropy(PreparedState state) => state.Ket is not null
        ? 0
        : HermitianMatrix.Eigenvalues(state.Density!, Dimension(state)).Where(x => x > 0).Sum(x => -x * Math.Log2(x));

    /// <summary>Largest trace distance of a party's reduced state from 1/d.</summary>
    public static double LargestSingleDeviation(PreparedState state) =>
        Enumerable.Range(0, state.Parties).Max(which => HermitianMatrix.Eigenvalues(Reduced(state, which), state.Levels).Sum(x => Math.Abs(x - 1.0 / state.Levels)) / 2);

    /// <summary>Probability that all outcomes differ when everybody measures in the same basis.</summary>
    public static double AllDistinct(PreparedState state, bool inFourierBasis)
    {
        double[] populations = Populations(inFourierBasis ? ToFourier(state) : state);
        return Enumerable.Range(0, populations.Length).Where(index => LevelsOf(index, state).Distinct().Count() == state.Parties).Sum(index => populations[index]);
    }

    /// <summary>Negativity across a cut.</summary>
    public static double Negativity(PreparedState state, Bipartition cut) =>
        state.Ket is { } ket ? cut.NegativityOfKet(ket, state.Levels) : cut.NegativityOfDensity(state.Density!, state.Levels);

    /// <summary>Probability of every basis state.</summary>
    public static double[] Populations(PreparedState state)
    {
        int size = Dimension(state);
        return state.Ket is { } ket ? [.. ket.Select(Square)] : [.. Enumerable.Range(0, size).Select(r => state.Density![r * size + r].Real)];
    }

    /// <summary>Levels of a basis state, first party first.</summary>
    public static int[] LevelsOf(int index, PreparedState state)
    {
        int[] levels = new int[state.Parties];
        for (int which = state.Parties - 1; which >= 0; which--, index /= state.Levels)
            levels[which] = index % state.Levels;
        return levels;
    }

    private static PreparedState ToFourier(PreparedState state)
    {
        Complex[,] basis = LocalOperation.ToFourier(state.Levels);
        return state.Ket is { } ket
            ? state with { Ket = LocalOperation.ApplyToAll(ket, state.Levels, state.Parties, basis) }
            : state with { Density = LocalOperation.ConjugateAll(state.Density!, state.Levels, state.Parties, basis) };
    }

    private static Complex[] Reduced(PreparedState state, int which) => state.Ket is { } ket
        ? ReducedState.OfKet(ket, state.Levels, state.Parties, which)
        : ReducedState.OfDensity(state.Density!, state.Levels, state.Parties, which);

    private static Complex[] Apply(PreparedState state, Complex[] vector)
    {
        if (state.Ket is { } ket)
        {
            Complex overlap = Inner(ket, vector);
            return [.. ket.Select(amplitude => amplitude * overlap)];
        }

        Complex[] result = new Complex[vector.Length];
        for (int r = 0; r < vector.Length; r++)
        {
            Complex sum = Complex.Zero;
            for (int c = 0; c < vector.Length; c++)
                sum += state.Density![r * vector.Length + c] * vector[c];
            result[r] = sum;
        }

        return result;
    }

    private static Complex Inner(Complex[] left, Complex[] right)
    {
        Complex sum = Complex.Zero;
        for (int i = 0; i < left.Length; i++)
            sum += Complex.Conjugate(left[i]) * right[i];
        return sum;
    }

    private static double Square(Complex z) => z.Real * z.Real + z.Imaginary * z.Imaginary;
}
