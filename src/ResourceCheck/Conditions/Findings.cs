using ResourceCheck.Diagnostics;

namespace ResourceCheck.Conditions;

/// <summary>Collects findings; the same finding at the same place, as it arises for every party that shares a default, is kept once.</summary>
internal sealed class Findings
{
    /// <summary>Beyond this many the user is better served by mending the first ones.</summary>
    private const int Most = 200;

    private readonly List<Diagnostic> _all = [];
    private readonly HashSet<(string, Place?)> _seen = [];

    /// <summary>Whether any finding is an error.</summary>
    public bool HasErrors => _all.Any(d => d.Severity == Severity.Error);

    /// <summary>Takes a finding.</summary>
    public void Add(Diagnostic finding)
    {
        if (_all.Count < Most && _seen.Add((finding.Code, finding.Place)))
            _all.Add(finding);
        else if (_all.Count == Most)
            _all.Add(ConditionsMessages.TooMany(finding.Place?.File ?? "", Most));
    }

    /// <summary>All findings: by input, then line, then column.</summary>
    public IReadOnlyList<Diagnostic> InOrder(string firstFile) =>
        [.. _all.OrderBy(d => d.Place?.File != firstFile).ThenBy(d => d.Place?.Line ?? 0).ThenBy(d => d.Place?.Column ?? 0)];
}
