namespace ResourceCheck.Conditions;

/// <summary>
/// Time-independent Markovian noise of one qudit. Rates are per second; arrays are indexed by level of the script (value),
/// row first. The default of every entry is 0.
/// </summary>
/// <param name="Jumps">d×d: rate of the jump from level a (row) to level b (column); the diagonal is 0. Decay and thermal exchange add up here.</param>
/// <param name="Dephasing">d×d, symmetric, diagonal 0: pure dephasing φ_ab of the coherence between a and b.</param>
/// <param name="Leakage">d: rate at which level a leaks into the sink that no detector sees.</param>
/// <param name="DepolarisingRate">Rate r of depolarising: after t, p = 1 - exp(-r t).</param>
public sealed record LocalDynamics(double[,] Jumps, double[,] Dephasing, double[] Leakage, double DepolarisingRate)
{
    /// <summary>Dynamics that do nothing.</summary>
    public static LocalDynamics Still(int levels) => new(new double[levels, levels], new double[levels, levels], new double[levels], 0);

    /// <summary>Whether nothing happens.</summary>
    public bool IsStill => DepolarisingRate == 0 && Leakage.All(r => r == 0) && Jumps.Cast<double>().All(r => r == 0) && Dephasing.Cast<double>().All(r => r == 0);

    /// <summary>Whether qudits can end in the sink.</summary>
    public bool Leaks => Leakage.Any(r => r > 0);
}
