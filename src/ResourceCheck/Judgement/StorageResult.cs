using ResourceCheck.Diagnostics;

namespace ResourceCheck.Judgement;

/// <summary>What <c>storage</c> tells: how long emitters side by side keep the antisymmetric state.</summary>
public sealed record StorageResult
{
    /// <summary>Program version.</summary>
    public required string Version { get; init; }

    /// <summary>The conditions.</summary>
    public required InputFile Conditions { get; init; }

    /// <summary>Overrides in the order given.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>Number of emitters and of levels of each.</summary>
    public required int Emitters { get; init; }

    /// <summary>Whether the conditions drop copies that emitted a photon.</summary>
    public required bool Heralded { get; init; }

    /// <summary>Whether exchange shifts are left out, as in the limit of one point.</summary>
    public required bool WithoutShifts { get; init; }

    /// <summary>Decay rates at the start, 1/s: of the antisymmetric state, of its counterpart with all signs +, of emitters that decay each alone.</summary>
    public required (double Antisymmetric, double Symmetric, double Independent) InitialRates { get; init; }

    /// <summary>Figures against storage time.</summary>
    public required IReadOnlyList<StoragePoint> Points { get; init; }

    /// <summary>Estimated error of the probabilities, from the integration.</summary>
    public required double ErrorEstimate { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>Figures at one storage time; fidelities are of all copies, those with a photon adding nothing.</summary>
/// <param name="Time">Storage time, s.</param>
/// <param name="NoPhoton">Probability that the antisymmetric state has emitted no photon.</param>
/// <param name="Fidelity">Its fidelity.</param>
/// <param name="SymmetricNoPhoton">Probability that the counterpart with all signs + has emitted no photon.</param>
/// <param name="SymmetricFidelity">Its fidelity with itself at the start.</param>
/// <param name="Independent">Both probabilities when the emitters decay each alone.</param>
public sealed record StoragePoint(double Time, double NoPhoton, double Fidelity, double SymmetricNoPhoton, double SymmetricFidelity, double Independent)
{
    /// <summary>Fidelity of the copies that emitted no photon; 0 where none are left.</summary>
    public double PhotonFreeFidelity => NoPhoton > 0 ? Math.Min(1, Fidelity / NoPhoton) : 0;
}

/// <summary>What <c>storage</c> is asked.</summary>
/// <param name="Conditions">Conditions with a <c>storage</c> section.</param>
/// <param name="Overrides">Overrides, path and value.</param>
/// <param name="Emitters">Number of emitters.</param>
/// <param name="Until">Last storage time, s; null for the duration in the conditions.</param>
/// <param name="Points">Number of times from 0 on, at least 2.</param>
public sealed record StorageRequest(InputText Conditions, IReadOnlyList<KeyValuePair<string, string>> Overrides, int Emitters, double? Until, int Points);
