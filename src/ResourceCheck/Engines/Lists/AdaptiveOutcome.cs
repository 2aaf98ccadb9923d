namespace ResourceCheck.Engines.Lists;

/// <summary>Average harm of an adaptive cheat.</summary>
/// <param name="Harm">Lower bound on what the best adaptive cheat does; null when refused.</param>
/// <param name="Fixed">Average harm of each listed choice alone, less what was neglected.</param>
/// <param name="Work">Transitions between states of counts.</param>
/// <param name="Refusal">What stood against an evaluation; null when evaluated.</param>
public sealed record AdaptiveOutcome(Estimate? Harm, IReadOnlyList<Estimate> Fixed, double Work, string? Refusal);
