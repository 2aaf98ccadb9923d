using ResourceCheck.Diagnostics;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A finding's code and words, before it has a place.</summary>
/// <param name="Code">Stable code.</param>
/// <param name="Text">One sentence.</param>
/// <param name="Cure">What to do; null when the sentence says it.</param>
internal sealed record Message(string Code, string Text, string? Cure = null);

/// <summary>Gathers the findings of a script, each once although loops and actors repeat a line, and keeps names whose making failed.</summary>
/// <param name="source">The script's text.</param>
internal sealed class BindingFindings(SourceText source)
{
    private readonly HashSet<(string Code, Span Span, string? Missing)> _seen = [];
    private readonly List<(int Offset, Diagnostic Finding)> _found = [];
    private readonly HashSet<string> _suspects = [];
    private int _muted;
    private HashSet<string> _suspectsBefore = [];
    private (Span Header, int End)? _case;

    /// <summary>All findings in order of place; those without a line come first.</summary>
    public IReadOnlyList<Diagnostic> All => [.. _found.OrderBy(f => f.Offset).Select(f => f.Finding)];

    /// <summary>Whether nothing was found so far.</summary>
    public bool IsEmpty => _found.Count == 0;

    /// <summary>Adds a finding about a place of the script.</summary>
    public void Report(Span span, Message message)
    {
        // What stands in a part that these parameter values switch off may be impossible only because of them.
        if (IsMuted && BindingMessages.DependsOnParameters(message.Code))
            return;
        if (_case is { } open && (span.Start < open.Header.Start || span.Start >= open.End))
        {
            ReportForCase(open.Header, span, message);
            return;
        }

        // Several lines may be missing from one script; all of these findings stand at its beginning.
        if (_seen.Add((message.Code, span, span.Length == 0 ? message.Text : null)))
            _found.Add((span.Start, From(message, source.PlaceOf(span))));
    }

    /// <summary>Adds a finding about a value given from outside the script.</summary>
    public void Report(string input, Message message) => _found.Add((-1, From(message, Place.Of(input))));

    /// <summary>
    /// Enters a cheating strategy: what goes wrong outside of its own lines goes wrong because of them, and is told of the strategy.
    /// </summary>
    /// <param name="header">The line that opens it.</param>
    /// <param name="end">Offset behind its last line.</param>
    public void EnterCase(Span header, int end)
    {
        _suspectsBefore = [.. _suspects];
        _case = (header, end);
    }

    /// <summary>Leaves a cheating strategy; names that are missing because of it are missing in it only.</summary>
    public void LeaveCase()
    {
        _suspects.Clear();
        _suspects.UnionWith(_suspectsBefore);
        _case = null;
    }

    private void ReportForCase(Span header, Span span, Message message)
    {
        // A line that is wrong in the honest case as well was told already.
        if (_seen.Any(s => s.Span == span) || !_seen.Add((BindingMessages.CaseCode, header, source.LineOf(span.Start).ToString(System.Globalization.CultureInfo.InvariantCulture))))
            return;
        _found.Add((header.Start, From(BindingMessages.WrongInCase(source.LineOf(span.Start), message), source.PlaceOf(header))));
    }

    /// <summary>Tries something whose failure is no mistake of the script; null when it failed, and nothing is told.</summary>
    public T? Try<T>(Func<T?> bind)
        where T : class
    {
        (int count, HashSet<string> suspects) = (_found.Count, [.. _suspects]);
        (string, Span, string?)[] seen = [.. _seen];
        T? result = bind();
        bool failed = _found.Count > count;
        _found.RemoveRange(count, _found.Count - count);
        _seen.IntersectWith(seen);
        _suspects.IntersectWith(suspects);
        return failed ? null : result;
    }

    /// <summary>Whether the current part is switched off by the parameter values.</summary>
    public bool IsMuted => _muted > 0;

    /// <summary>Keeps a name from causing further findings.</summary>
    public void Suspect(string name) => _suspects.Add(name);

    /// <summary>Whether a name is known to be broken already; asking marks nothing.</summary>
    public bool IsSuspect(string name) => _suspects.Contains(name);

    /// <summary>Reports a finding about a name unless the name is broken already, and marks it as broken.</summary>
    public void ReportName(string name, Span span, Message message)
    {
        if (_suspects.Add(name))
            Report(span, message);
    }

    /// <summary>Silences findings that parameter values may cause, until the matching call with false.</summary>
    public void Mute(bool on) => _muted += on ? 1 : -1;

    private static Diagnostic From(Message message, Place place) => new(message.Code, Severity.Error, message.Text, message.Cure, place);
}
