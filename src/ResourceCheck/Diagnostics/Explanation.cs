namespace ResourceCheck.Diagnostics;

/// <summary>What <c>explain</c> and the docs say about a code.</summary>
/// <param name="Code">The stable code.</param>
/// <param name="Title">A short name of the finding.</param>
/// <param name="Cause">What brings it about.</param>
/// <param name="Cure">What to do.</param>
/// <param name="Example">A small wrong input that shows it, or null.</param>
public sealed record Explanation(string Code, string Title, string Cause, string Cure, string? Example = null);
