using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>Emitters side by side whose decay is collective, for a time. Emitter i holds the qudit of holder i; levels are physical ones, level 0 the excited one.</summary>
public sealed record CollectiveModel
{
    /// <summary>Place of each emitter, three coordinates in wavelengths of the first transition.</summary>
    public required double[][] Positions { get; init; }

    /// <summary>Whether all stand at one point, the limit of no distance without exchange shifts.</summary>
    public required bool IsPoint { get; init; }

    /// <summary>Decay of level 0 into level 1, 2, …</summary>
    public required IReadOnlyList<TransitionModel> Transitions { get; init; }

    /// <summary>How long.</summary>
    public required Duration Time { get; init; }

    /// <summary>Whether copies that emitted a photon are dropped.</summary>
    public required bool Heralded { get; init; }

    /// <summary>Truncation error allowed per step of the integration.</summary>
    public required double Tolerance { get; init; }
}

/// <summary>One transition, the same at every emitter.</summary>
/// <param name="Rate">Γ = 2π times the linewidth.</param>
/// <param name="Wavelength">In wavelengths of the first transition.</param>
/// <param name="Dipole">Three components; only the direction matters.</param>
public sealed record TransitionModel(Rate Rate, double Wavelength, double[] Dipole);
