namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Spontaneous rate of one transition in vacuum: Γ = ω³ d²/(3π ε_0 ħ c³) with ω = 2πc/λ, that is 8π² d²/(3 ε_0 ħ λ³).
/// V. Weisskopf and E. Wigner, Z. Phys. 63, 54 (1930). d is the length of the vector ⟨0|e r|j⟩ of this branch.
/// </summary>
internal static class SpontaneousRate
{
    /// <summary>ħ in J s: h/2π with the exact h = 6.62607015e-34 J s (CODATA 2018 and 2022, fixed by the SI).</summary>
    public const double ReducedPlanck = 6.62607015e-34 / (2 * Math.PI);

    /// <summary>ε_0 in F/m (CODATA 2022; the adjustment of 2018 has 8.8541878128e-12).</summary>
    public const double VacuumPermittivity = 8.8541878188e-12;

    /// <summary>Γ in 1/s from the vacuum wavelength in m and the dipole moment in C m.</summary>
    public static double From(double wavelength, double dipoleMoment) =>
        8 * Math.PI * Math.PI * dipoleMoment * dipoleMoment
        / (3 * VacuumPermittivity * ReducedPlanck * wavelength * wavelength * wavelength);
}
