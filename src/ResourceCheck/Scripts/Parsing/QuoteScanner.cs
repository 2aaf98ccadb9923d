namespace ResourceCheck.Scripts.Parsing;

/// <summary>Quotation marks: the straight ones of the language, and those that word processors put in their place.</summary>
internal static class QuoteScanner
{
    /// <summary>The mark that closes what this one opens; null when it opens nothing.</summary>
    public static char? ClosingOf(char opening) => opening switch
    {
        '"' or '\'' or '`' => opening,
        '“' or '”' => '”',
        '„' => '“',
        '‘' or '’' => '’',
        '‚' => '‘',
        '«' => '»',
        _ => null,
    };

    /// <summary>Position of the first control character, which would garble a terminal; null when there is none.</summary>
    public static int? FirstUnreadable(string content)
    {
        int at = content.AsSpan().IndexOfAnyInRange('\0', '\u001f');
        int high = content.AsSpan().IndexOfAnyInRange('\u007f', '\u009f');
        int first = at < 0 || (high >= 0 && high < at) ? high : at;
        return first < 0 ? null : first;
    }
}
