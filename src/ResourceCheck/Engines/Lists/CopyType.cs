using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>One possible outcome of the rounds on a single kept copy.</summary>
/// <param name="Slots">Contents of the protocol's slots, at least of those that belong to the rounds.</param>
/// <param name="Probability">Its probability among kept copies.</param>
public sealed record CopyType(IReadOnlyList<Value> Slots, double Probability);
