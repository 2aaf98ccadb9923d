namespace ResourceCheck.Scripts.Parsing;

/// <summary>
/// Finds which <c>end</c> is missing or too many. Only when openings and ends do not balance over the whole script does
/// indentation count: then a line that stands further out than the block's header shows where an end was forgotten, and an
/// end that stands further in than its header is the one too many. Balanced scripts may be indented at will.
/// </summary>
internal sealed class EndBalance
{
    private int _missing;

    public EndBalance(IReadOnlyList<TokenLine> lines)
    {
        _missing = lines.Count(Opens) - lines.Count(l => l.Tokens[0].Is("end"));
    }

    /// <summary>Whether a line opens a block, misspelt openings included.</summary>
    public static bool Opens(TokenLine line) => StatementParser.WordOf(line)?.Opens is not null;

    /// <summary>Whether the innermost open block must have ended before this line.</summary>
    public bool IsLeftOpen(IReadOnlyList<TokenLine> open, TokenLine line)
    {
        if (_missing <= 0)
            return false;
        TokenLine header = open[^1];
        if (line.Tokens[0].Is("end") || line.Tokens[0].Is("otherwise"))
            return line.Indent < header.Indent && open.Any(o => o.Indent == line.Indent);
        return line.Indent <= header.Indent && StatementParser.WordOf(line) is { } word
            && word.Places.HasFlag(Places.Script) && !IsLoopBody(header, word);
    }

    /// <summary>One of the missing ends has been told.</summary>
    public void TellLeftOpen() => _missing--;

    /// <summary>Whether this end is one too many rather than the block's own.</summary>
    public bool IsSurplus(TokenLine header, TokenLine end)
    {
        if (_missing >= 0 || end.Indent <= header.Indent)
            return false;
        _missing++;
        return true;
    }

    // A loop may hold rounds that are not indented; only what cannot stand in a loop shows that its end is missing.
    private static bool IsLoopBody(TokenLine header, StatementWord word) => header.Tokens[0].Is("for") && (word.Places & Places.Loop) != 0;
}
