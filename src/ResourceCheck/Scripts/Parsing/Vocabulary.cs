namespace ResourceCheck.Scripts.Parsing;

/// <summary>The words of the language that cannot be names, and the functions.</summary>
internal static class Vocabulary
{
    /// <summary>Bases as scripts write them.</summary>
    public static IReadOnlyList<string> Bases { get; } = ["level", "fourier", "phased", "matrix"];

    /// <summary>Local unitaries, with their arguments.</summary>
    public static IReadOnlyDictionary<string, string> Unitaries { get; } = new Dictionary<string, string>
    {
        ["shift"] = "shift(k)",
        ["clock"] = "clock(k)",
        ["fourier"] = "fourier",
        ["inverse"] = "inverse fourier",
        ["complement"] = "complement(BASIS, k)",
        ["levelswap"] = "levelswap(i, j)",
        ["matrix"] = "matrix \"file\"",
    };

    /// <summary>Functions, with the words that may part their arguments.</summary>
    public static IReadOnlyDictionary<string, IReadOnlyList<string>> Functions { get; } = new Dictionary<string, IReadOnlyList<string>>
    {
        ["abs"] = [],
        ["bellvalue"] = [],
        ["count"] = ["over", "in"],
        ["distinct"] = [],
        ["entropy"] = [],
        ["guess"] = ["from"],
        ["information"] = [";"],
        ["largest"] = ["over"],
        ["mean"] = ["given"],
        ["missing"] = [],
        ["probability"] = ["given"],
        ["same"] = [],
        ["share"] = ["in"],
        ["size"] = [],
        ["some"] = ["of"],
        ["where"] = [],
    };

    /// <summary>Every separator, so that a wrong one is told as such.</summary>
    public static IReadOnlyList<string> Separators { get; } = ["over", "in", "of", "from", "given", ";"];

    /// <summary>Metrics that are also words of statements and stay readable as values.</summary>
    public static IReadOnlySet<string> Metrics { get; } = new HashSet<string> { "success", "abort" };

    private static readonly HashSet<string> Reserved =
    [
        "and", "or", "not", "if", "then", "else", "true", "false", "none", "mod", "minus", "in", "of", "over", "from", "given", "to", "as", "on",
        "end", "when", "otherwise", "all", "others", "level", "fourier", "phased", "matrix",
        .. StatementTable.Words.Select(w => w.Word), .. VerbTable.Forms,
    ];

    /// <summary>Whether a word belongs to the language and cannot be a name.</summary>
    public static bool IsReserved(string word) => Reserved.Contains(word);
}
