using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>What one cheating strategy does at one setting and assignment of the private inputs.</summary>
/// <param name="Case">The strategy.</param>
/// <param name="At">Parameter and input values in words; empty when there are none.</param>
/// <param name="Harm">Harm at the worst numbers found.</param>
/// <param name="Average">Average harm of a cheat that picks its numbers after it has seen its own list; null where it has no list or no choice.</param>
/// <param name="Copies">The evaluation of single copies at these numbers; null for lists.</param>
/// <param name="Choices">Numbers that the harm is at, by name.</param>
/// <param name="Method">How they and the harm were found.</param>
internal sealed record CheatEvaluation(
    DishonestCase Case, string At, Estimate Harm, Estimate? Average, Evaluation? Copies, IReadOnlyList<KeyValuePair<string, string>> Choices, string Method);
