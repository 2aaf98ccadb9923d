using ResourceCheck.Engines;

namespace ResourceCheck.Judgement;

/// <summary>
/// What becomes of attempts to prepare a copy, stage by stage, up to the verdict. Stages multiply: the rate behind the sifting is one over
/// <see cref="RunResult.SecondsPerKeptCopy"/>, and the probabilities of <c>no photon</c> to <c>sifting</c> make the yield.
/// </summary>
public sealed record RateChain
{
    /// <summary>The stages in order: attempts, preparation, parties free, no photon (where emission is heralded), interface, flight, herald, detection, sifting, list (of list protocols), verdict.</summary>
    public required IReadOnlyList<RateStage> Stages { get; init; }

    /// <summary>Mean time between two prepared copies, s; null when the conditions give no preparation rate.</summary>
    public required double? PreparationPeriod { get; init; }

    /// <summary>Time that one copy occupies the parties, s.</summary>
    public required double Occupied { get; init; }

    /// <summary>Which of the two is longer and so sets the pace, in a sentence; null when the conditions give no preparation rate.</summary>
    public required string? Pace { get; init; }

    /// <summary>Parameter and input values of the chain, those with the lowest rate; empty when there is but one assignment.</summary>
    public required string At { get; init; }
}

/// <summary>One stage of a rate chain.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Probability">Probability that a copy that comes to the stage passes it; null where nothing is left to chance.</param>
/// <param name="Rate">What passes, 1/s: copies, and from <c>list</c> on uses of the protocol; null when the conditions give no preparation rate.</param>
/// <param name="Note">What happens there.</param>
public sealed record RateStage(string Name, Estimate? Probability, double? Rate, string Note);
