namespace ResourceCheck.Numerics.Collective;

/// <summary>What collective decay has made of a start.</summary>
/// <param name="Time">Time of decay.</param>
/// <param name="Population">⟨S|ρ|S⟩ of all copies; of those without a photon when that was asked for, unnormalised.</param>
/// <param name="Symmetric">The same of the counterpart with all signs +.</param>
/// <param name="Kept">Trace: 1, or the probability that no photon was emitted.</param>
/// <param name="Excitations">Mean number of excited emitters, as part of the trace.</param>
/// <param name="ErrorEstimate">Estimated error of the populations.</param>
internal readonly record struct RelaxationFigures(double Time, double Population, double Symmetric, double Kept, double Excitations, double ErrorEstimate)
{
    /// <summary>Fidelity of the copies kept; 0 where none are left.</summary>
    public double Fidelity => Kept > 0 ? Math.Min(1, Population / Kept) : 0;
}
