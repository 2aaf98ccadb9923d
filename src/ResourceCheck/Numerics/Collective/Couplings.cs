namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Shared decay γ^j_ik and exchange shifts Ω^j_ik of N equal emitters, one symmetric matrix of each for every transition j = 1 … d-1
/// from level 0 to level j. γ^j_ii = Γ_j and Ω^j_ii = 0. Each transition talks to the same transition of the other emitters only.
/// </summary>
internal sealed class Couplings
{
    private Couplings(int emitters, double[][,] decay, double[][,] shift)
    {
        Emitters = emitters;
        Decay = decay;
        Shift = shift;
    }

    /// <summary>N.</summary>
    public int Emitters { get; }

    /// <summary>d: one more than the transitions.</summary>
    public int Levels => Decay.Length + 1;

    /// <summary>γ^j; entry j-1 of the list is transition j. Not to be changed.</summary>
    public double[][,] Decay { get; }

    /// <summary>Ω^j; entry j-1 of the list is transition j. Not to be changed.</summary>
    public double[][,] Shift { get; }

    /// <summary>Σ_j Γ_j: the rate at which one excited emitter alone decays.</summary>
    public double TotalRate => Decay.Sum(gamma => gamma[0, 0]);

    /// <summary>Couplings of a geometry that <see cref="GeometryCheck.Of"/> finds fit.</summary>
    public static Couplings From(EmitterShape shape, IReadOnlyList<Transition> transitions) => new(
        shape.Count,
        [.. transitions.Select(t => Fill(shape.Count, (i, k) => i == k ? t.Rate : t.Rate * Decaying(shape, t, i, k)))],
        [.. transitions.Select(t => Fill(shape.Count, (i, k) => i == k || shape.IsPoint ? 0 : t.Rate * Shifting(shape, t, i, k)))]);

    /// <summary>Couplings given as matrices; all symmetric, of one size, with one rate along the diagonal of each γ.</summary>
    public static Couplings FromMatrices(double[][,] decay, double[][,] shift) => new(decay[0].GetLength(0), decay, shift);

    /// <summary>Emitters so far apart that each decays alone.</summary>
    public static Couplings Independent(int emitters, IReadOnlyList<double> rates) => new(
        emitters,
        [.. rates.Select(rate => Fill(emitters, (i, k) => i == k ? rate : 0))],
        [.. rates.Select(_ => new double[emitters, emitters])]);

    /// <summary>The same couplings with other exchange shifts: the function gets transition (from 1), emitters and the old shift.</summary>
    public Couplings WithShifts(Func<int, int, int, double, double> change) => new(
        Emitters,
        Decay,
        [.. Shift.Select((omega, j) => Fill(Emitters, (i, k) => i == k ? 0 : change(j + 1, i, k, omega[i, k])))]);

    private static double Decaying(EmitterShape shape, Transition t, int i, int k) =>
        shape.IsPoint ? 1 : DipoleCoupling.SharedDecay(Xi(shape, t, i, k), Cosine(shape, t, i, k));

    private static double Shifting(EmitterShape shape, Transition t, int i, int k) =>
        DipoleCoupling.ExchangeShift(Xi(shape, t, i, k), Cosine(shape, t, i, k));

    private static double Xi(EmitterShape shape, Transition t, int i, int k) => 2 * Math.PI * shape.Distance(i, k) / t.Wavelength;

    private static double Cosine(EmitterShape shape, Transition t, int i, int k) => Lengths.Cosine(t.Dipole, shape.Separation(i, k));

    /// <summary>Both halves from one evaluation, so that the matrix is symmetric to the last bit.</summary>
    private static double[,] Fill(int size, Func<int, int, double> entry)
    {
        double[,] matrix = new double[size, size];
        for (int i = 0; i < size; i++)
        {
            for (int k = i; k < size; k++)
                matrix[i, k] = matrix[k, i] = entry(i, k);
        }

        return matrix;
    }
}
