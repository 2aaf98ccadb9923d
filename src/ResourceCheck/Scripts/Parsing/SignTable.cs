namespace ResourceCheck.Scripts.Parsing;

/// <summary>A sign as it may be typed: the language's own, or one from elsewhere with what is written for it here.</summary>
/// <param name="Text">As typed.</param>
/// <param name="Replacement">The language's own word or sign; null when there is none.</param>
internal sealed record SignEntry(string Text, string? Replacement)
{
    public bool IsForeign => Text != Replacement;
}

/// <summary>All signs, the language's own and those habit brings along; longer ones come first so that the first match is right.</summary>
internal static class SignTable
{
    private static readonly string[] Own = ["..", "<=", ">=", "!=", "+", "-", "*", "/", "=", "<", ">", "(", ")", "[", "]", "{", "}", ",", ";", ":", "."];

    private static readonly SignEntry[] Foreign =
    [
        new("...", ".."), new("==", "="), new(":=", "="), new("=<", "<="), new("=>", ">="), new("<>", "!="), new("**", null),
        new("&&", "and"), new("||", "or"), new("&", "and"), new("|", "or"), new("!", "not"), new("%", "mod"), new("^", null),
        new("≤", "<="), new("≥", ">="), new("≠", "!="), new("×", "*"), new("·", "*"), new("÷", "/"), new("−", "-"), new("–", "-"),
        new("…", ".."), new("∧", "and"), new("∨", "or"), new("¬", "not"),
    ];

    private static readonly SignEntry[] All = [.. Own.Select(s => new SignEntry(s, s)).Concat(Foreign).OrderByDescending(s => s.Text.Length)];

    /// <summary>The sign that starts the text, or null.</summary>
    public static SignEntry? Find(ReadOnlySpan<char> text)
    {
        foreach (SignEntry entry in All)
        {
            if (text.StartsWith(entry.Text, StringComparison.Ordinal))
                return entry;
        }

        return null;
    }
}
