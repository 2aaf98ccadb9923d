using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources.Formats;

/// <summary>Collects what is wrong in a file, up to a number that a person still reads.</summary>
internal sealed class Findings(string file)
{
    /// <summary>Beyond this many a file is of another kind altogether rather than mistyped.</summary>
    private const int Most = 20;

    private readonly List<Diagnostic> _list = [];

    /// <summary>Whether enough was found to stop reading.</summary>
    public bool Full => _list.Count > Most;

    /// <summary>Whether anything was found.</summary>
    public bool Any => _list.Count > 0;

    /// <summary>Everything found, in order.</summary>
    public IReadOnlyList<Diagnostic> All => _list;

    /// <summary>Adds a finding; the first one too many is replaced by the word that there are more.</summary>
    public void Add(Diagnostic finding)
    {
        if (!Full)
            _list.Add(_list.Count < Most ? finding : StateMessages.MoreFindings(file, Most));
    }
}
