using System.Text;
using ResourceCheck.Scripts.Parsing;

namespace ResourceCheck.Scripts;

/// <summary>Every text the script front end can say: what was found and what would fit.</summary>
internal static class SyntaxMessages
{
    // Longer pieces are garbage; their beginning is enough to find them.
    private const int LongestQuote = 40;

    public static SyntaxMessage StrayCharacter(Rune rune) =>
        new("S001", $"The character {rune} (U+{rune.Value:X4}) has no meaning here: names, numbers, quoted texts and the signs of arithmetic and comparison fit.", "take it out, or put it between quotes or behind #");

    public static SyntaxMessage NameStart(string found) =>
        new("S001", $"{Show(found)} is no name: a name starts with a letter, then letters, digits and _ fit.", "begin the name with a letter");

    public static SyntaxMessage UnclosedQuote(char opening) =>
        new("S002", $"The text that {opening} opens is not closed: a second quotation mark on the same line fits.", "close the text with \"");

    public static SyntaxMessage NoNumber(string found) =>
        new("S003", $"{Show(found)} is no number: digits with at most one point inside and an exponent fit, as in 0.25 or 1e-6.", NumberCure(found));

    public static SyntaxMessage ForeignDigit(Rune rune) =>
        new("S003", $"The digit {rune} (U+{rune.Value:X4}) is none of the language's: the digits 0 to 9 fit.", "write it with the digits 0 to 9");

    public static SyntaxMessage DecimalComma(string before, string after) =>
        new("S003", $"`{Cut(before)},{Cut(after)}` is no number: a point parts the decimals.", $"write {Cut(before)}.{Cut(after)}");

    public static SyntaxMessage NumberTooLong(string found) =>
        new("S004", $"{Show(found)} is out of reach: at most 400 digits and exponents from -400 to 400 fit.", "write a number nearer to one");

    public static SyntaxMessage ControlCharacter(char found) =>
        new("S005", $"The unreadable character U+{(int)found:X4} stands here: a script is plain text in UTF-8.", "take it out, or save the file as UTF-8 text");

    public static SyntaxMessage UnknownStatement(string found, string fitting, string? near) =>
        new("S006", $"{Show(found)} begins no statement: {fitting} fit here.", near is null ? null : DidYouMean(near));

    public static SyntaxMessage NoActor(string verb) =>
        new("S006", $"`{verb}` begins no statement: the parties that act fit before a verb.", "name who acts, as in Ada measures level as k");

    public static SyntaxMessage UnknownVerb(Token found, string? near) =>
        new("S007", found.Kind == TokenKind.LineEnd
            ? $"The line ends before its verb: {Words(VerbTable.BaseForms)} fit after the actors."
            : $"{Show(found)} is no verb: {Words(VerbTable.BaseForms)} fit after the actors.", near is null ? null : DidYouMean(near));

    public static SyntaxMessage Misplaced(string found, string where, string home) =>
        new("S008", $"`{found}` does not fit {where}: it belongs {home}.", "move the line, or look for an end that is missing or stands too early");

    public static SyntaxMessage Unclosed(string block) =>
        new("S009", $"The `{block}` opened here is never closed: a line with `end` fits after its last line.", "add the missing end");

    public static SyntaxMessage StrayEnd() =>
        new("S010", "This `end` closes nothing: every block above it is closed already.", "take the line out, or open the block it should close");

    public static SyntaxMessage StrayOtherwise(bool second) =>
        new("S011", second ? "This `when` has an `otherwise` already: one fits." : "This `otherwise` belongs to no `when`: it fits between a `when` and its `end`.",
            second ? "put a second when inside the first otherwise" : "open a when above it");

    public static SyntaxMessage Misfit(Token found, string fitting, string? cure) =>
        new("S012", found.Kind == TokenKind.LineEnd ? $"The line ends where {fitting} should follow." : $"{Show(found)} stands where {fitting} should.", cure);

    public static SyntaxMessage RestOfLine(Token found, string complete) =>
        new("S013", $"{Show(found)} stands behind a complete statement: {complete}, and the line ends there.", "start a new line, or take the rest out");

    public static SyntaxMessage AnnounceTo() =>
        new("S013", "`to` does not fit behind announce, which tells everybody: the line ends after the values.", "write send in place of announce to tell some only");

    public static SyntaxMessage UnknownBasis(string found, string? near) =>
        new("S014", $"{Show(found)} is no basis: level, fourier, phased(j), matrix \"file\" or a variable that holds a basis fit here.", near is null ? null : DidYouMean(near));

    public static SyntaxMessage UnknownFunction(string found, string? near) =>
        new("S015", $"{Show(found)} is no function: {Words(Vocabulary.Functions.Keys)} fit before a bracket.", near is null ? null : DidYouMean(near));

    public static SyntaxMessage UnitaryAsValue(string found) =>
        new("S015", $"`{found}` is an operation, not a function: it fits behind apply.", null);

    public static SyntaxMessage WrongSeparator(string function, string found)
    {
        IReadOnlyList<string> fitting = Vocabulary.Functions[function];
        string fits = fitting.Count == 0 ? "only commas fit" : $"commas and `{string.Join("` or `", fitting)}` fit";
        return new("S016", $"`{found}` does not part the arguments of {function}: {fits}.", null);
    }

    public static SyntaxMessage ReservedWord(string found, string fitting) =>
        new("S017", $"`{found}` is a word of the language: {fitting} would fit here.", "choose another name");

    public static SyntaxMessage TooDeep(string what) =>
        new("S018", $"{what}: less would fit.", "name parts of it with set, or write it in smaller steps");

    public static SyntaxMessage ChainedComparison(string found) =>
        new("S019", $"`{found}` compares the outcome of another comparison: one comparison at a time fits.", "join two comparisons with and, or use brackets");

    public static SyntaxMessage UnknownUnitary(Token found, string? near) =>
        new("S020", found.Kind == TokenKind.LineEnd
            ? $"The line ends before its operation: {Words(Vocabulary.Unitaries.Values)} fit behind apply."
            : $"{Show(found)} is no operation: {Words(Vocabulary.Unitaries.Values)} fit behind apply.", near is null ? null : DidYouMean(near));

    public static SyntaxMessage UnnamedValue() =>
        new("S021", "This value has no name to travel under: a single variable, or a value with `as` and a name, fits.", "add as and a name");

    public static SyntaxMessage UnclosedBracket(string opening, string closing, Token found) =>
        new("S022", $"The `{opening}` opened here is not closed: `{closing}` fits before {(found.Kind == TokenKind.LineEnd ? "the end of the line" : Show(found))}.", null);

    public static SyntaxMessage ForeignSign(SignEntry sign) =>
        new("S023", sign.Replacement is null
            ? $"`{sign.Text}` is no sign of the language: powers are written as products."
            : $"`{sign.Text}` is no sign of the language: `{sign.Replacement}` fits here.",
            sign.Replacement is null ? "multiply the factors" : $"write {sign.Replacement}");

    public static SyntaxMessage EmptyScript() =>
        new("S024", "The script holds no statement: protocol \"…\" fits as its first line.", "write the protocol's name, its parties, a resource and a round");

    public static SyntaxMessage RangeAsValue() =>
        new("S025", "A range of parties is no single value: one party, or `v of` the range, fits here.", "write v of P[1..n] for the values of several parties");

    public static SyntaxMessage NoComparison(string statement, string signs) =>
        new("S026", $"A {statement} is one comparison of a figure with a number: {signs} fit between them.", statement == "goal" ? "write for example goal success >= 0.9" : "write for example claim success = 1");

    public static SyntaxMessage EmptyDomain() =>
        new("S027", "These braces hold no value: one value or more, parted by commas, fit.", "list the values, as in {0, 1}");

    public static SyntaxMessage QuotesMissing(Token found, string fitting) =>
        new("S028", $"{Show(found)} stands without quotes: {fitting} fits here.", "put the text between \" and \"");

    public static SyntaxMessage ForeignQuotes(char opening, char closing) =>
        new("S029", $"The quotation marks {opening} and {closing} are not the language's: the straight mark \" fits on both sides.", "replace both by \"");

    public static string DidYouMean(string word) => $"did you mean {word}?";

    /// <summary>Commas, and a final "or".</summary>
    public static string Words(IEnumerable<string> words)
    {
        string[] all = [.. words];
        return all.Length < 2 ? string.Concat(all) : $"{string.Join(", ", all[..^1])} or {all[^1]}";
    }

    private static string Show(Token token) => token.Kind == TokenKind.Quoted ? $"The text \"{Cut(token.Text)}\"" : Show(token.Text);

    private static string Show(string text) => $"`{Cut(text)}`";

    private static string Cut(string text) => text.Length <= LongestQuote ? text : string.Concat(text.AsSpan(0, LongestQuote), "…");

    private static string? NumberCure(string found)
    {
        if (found.Contains('_', StringComparison.Ordinal))
            return "leave the _ out";
        if (found.StartsWith('.'))
            return $"write 0{Cut(found)}";
        return found.EndsWith('.') ? "leave the last point out, or write a digit behind it" : "keep one point";
    }
}
