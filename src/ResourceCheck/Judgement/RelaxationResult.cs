using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement;

/// <summary>What <c>relaxation</c> tells: what shared decay makes of a start.</summary>
public sealed record RelaxationResult
{
    /// <summary>Program version.</summary>
    public required string Version { get; init; }

    /// <summary>The conditions.</summary>
    public required InputFile Conditions { get; init; }

    /// <summary>Overrides in the order given.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>Number of emitters and of levels of each.</summary>
    public required int Emitters { get; init; }

    /// <summary>The start in words.</summary>
    public required string Start { get; init; }

    /// <summary>Whether the conditions drop copies that emitted a photon.</summary>
    public required bool Heralded { get; init; }

    /// <summary>Whether exchange shifts are left out, as in the limit of one point.</summary>
    public required bool WithoutShifts { get; init; }

    /// <summary>How the figures were found, in a sentence.</summary>
    public required string Method { get; init; }

    /// <summary>Seed of sampled figures; null when nothing was sampled.</summary>
    public required long? Seed { get; init; }

    /// <summary>Trajectories of sampled figures; null when nothing was sampled.</summary>
    public required int? Samples { get; init; }

    /// <summary>Figures against time.</summary>
    public required IReadOnlyList<RelaxationPoint> Points { get; init; }

    /// <summary>Estimated error of the probabilities, from the integration.</summary>
    public required double ErrorEstimate { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>Figures at one time. An interval holds by itself, not together with those of other times.</summary>
/// <param name="Time">Time of decay, s.</param>
/// <param name="Antisymmetric">Population of the antisymmetric state, all copies: the fidelity at yield 1.</param>
/// <param name="Symmetric">Population of its counterpart with all signs +.</param>
/// <param name="Independent">Population of the antisymmetric state when the emitters decay each alone.</param>
/// <param name="NoPhoton">Probability that no photon was emitted: the yield of heralding on that. Exact.</param>
/// <param name="PhotonFreeFidelity">Fidelity of the copies that emitted none; 0 where none are left. Exact.</param>
/// <param name="Excited">Mean number of excited emitters, all copies.</param>
public sealed record RelaxationPoint(
    double Time, Estimate Antisymmetric, Estimate Symmetric, Estimate Independent, double NoPhoton, double PhotonFreeFidelity, Estimate Excited);

/// <summary>What <c>relaxation</c> is asked.</summary>
/// <param name="Conditions">Conditions with a <c>resource.relaxed</c> section.</param>
/// <param name="Overrides">Overrides, path and value.</param>
/// <param name="Emitters">Number of emitters.</param>
/// <param name="Until">Last time, s; null for the time in the conditions.</param>
/// <param name="Points">Number of times from 0 on, at least 2.</param>
/// <param name="Samples">Trajectories where figures must be sampled, at least 2.</param>
/// <param name="Seed">Their seed.</param>
/// <param name="Cancellation">Stops the evaluation.</param>
public sealed record RelaxationRequest(
    InputText Conditions, IReadOnlyList<KeyValuePair<string, string>> Overrides, int Emitters, double? Until, int Points, int Samples, long Seed, CancellationToken Cancellation);
