namespace ResourceCheck.Numerics.Collective;

/// <summary>One run of the stochastic evolution.</summary>
/// <param name="Index">Its number; with the seed it fixes everything.</param>
/// <param name="State">Normalised state at the end.</param>
/// <param name="Photons">Photons in the order of time.</param>
/// <param name="Work">Work done.</param>
internal sealed record Trajectory(long Index, EmitterState State, IReadOnlyList<Photon> Photons, EvolutionWork Work);
