namespace ResourceCheck.Engines.Lists;

/// <summary>Verdicts of a list protocol.</summary>
public sealed record ListEvaluation
{
    /// <summary>Probability of success.</summary>
    public required Estimate Success { get; init; }

    /// <summary>Probability of failure, summed by itself and not as 1 - success.</summary>
    public required Estimate Failure { get; init; }

    /// <summary>Probability that a party gave up.</summary>
    public required Estimate Abort { get; init; }

    /// <summary>Probability of harm; 0 in the honest case.</summary>
    public required Estimate Harm { get; init; }

    /// <summary>One sentence on how the numbers were found.</summary>
    public required string Method { get; init; }

    /// <summary>Transitions between states of counts, or positions handled by a simulation.</summary>
    public required double Work { get; init; }
}

/// <summary>An evaluation, or the reason why there is none.</summary>
/// <param name="Evaluation">The evaluation; null when refused.</param>
/// <param name="Refusal">What stood against it, with its figures; null when evaluated.</param>
/// <param name="TooMuchWork">Whether a coarser evaluation might still be possible.</param>
public sealed record ListOutcome(ListEvaluation? Evaluation, string? Refusal, bool TooMuchWork = false);
