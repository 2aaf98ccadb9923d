namespace ResourceCheck.Numerics.Collective;

/// <summary>A state after storage, as far as no photon was emitted.</summary>
/// <param name="Time">Storage time.</param>
/// <param name="NoPhoton">Probability that no photon was emitted.</param>
/// <param name="Fidelity">⟨ψ_0|ρ|ψ_0⟩ of all copies with the state that was stored: copies with a photon add nothing.</param>
/// <param name="ErrorEstimate">Estimated error of both probabilities.</param>
internal readonly record struct StorageFigures(double Time, double NoPhoton, double Fidelity, double ErrorEstimate)
{
    /// <summary>Fidelity of the copies that emitted no photon; 0 where none are left.</summary>
    public double ConditionalFidelity => NoPhoton > 0 ? Math.Min(1, Fidelity / NoPhoton) : 0;
}
