using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>The worst of the choices of one strategy that a search found.</summary>
/// <param name="Choices">The numbers chosen; null when refused.</param>
/// <param name="Evaluation">The verdicts at these numbers; null when refused.</param>
/// <param name="Search">How they were found; null when refused.</param>
/// <param name="Refusal">What stood against an evaluation; null when evaluated.</param>
public sealed record AttackOutcome(IReadOnlyList<Value>? Choices, ListEvaluation? Evaluation, SearchResult? Search, string? Refusal);
