using ResourceCheck.Diagnostics;

namespace ResourceCheck.Reports;

/// <summary>Cause and cure of every message, gathered from the steps that give them.</summary>
public static class Catalogue
{
    /// <summary>All explanations in order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } = [];
}
