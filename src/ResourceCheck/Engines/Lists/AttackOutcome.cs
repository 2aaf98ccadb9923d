using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>The worst of the choices of one strategy that a search found, or what given choices do.</summary>
/// <param name="Choices">The numbers chosen; null when refused.</param>
/// <param name="Evaluation">The verdicts at these numbers; null when refused.</param>
/// <param name="Search">How they were found; null when refused or given.</param>
/// <param name="Refusal">What stood against an evaluation; null when evaluated.</param>
public sealed record AttackOutcome(IReadOnlyList<Value>? Choices, ListEvaluation? Evaluation, SearchResult? Search, string? Refusal)
{
    /// <summary>What a cheat does on average over its own lists: a lower bound of what the best one does; null when refused.</summary>
    public AverageHarm? Average { get; init; }
}

/// <summary>Harm on average over a cheat's own lists.</summary>
/// <param name="Harm">Lower bound of what the best cheat does.</param>
/// <param name="Strategy">What the cheat that was evaluated does, in words.</param>
public sealed record AverageHarm(Estimate Harm, string Strategy);
