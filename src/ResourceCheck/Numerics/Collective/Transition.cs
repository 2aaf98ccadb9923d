namespace ResourceCheck.Numerics.Collective;

/// <summary>Decay of level 0 to one lower level, the same at every emitter. Transition j (counted from 1) leads to level j.</summary>
/// <param name="Rate">Γ_j: spontaneous rate of this branch, 1 over the unit of time.</param>
/// <param name="Wavelength">λ_j, in the unit of the positions.</param>
/// <param name="Dipole">Three components of the dipole; only its direction matters here, its size is in the rate.</param>
internal sealed record Transition(double Rate, double Wavelength, double[] Dipole);
