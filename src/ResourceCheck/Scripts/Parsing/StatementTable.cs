using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Where a statement may stand.</summary>
[Flags]
internal enum Places
{
    None = 0,
    Script = 1,
    Loop = 2,
    Round = 4,
    Discussion = 8,
    Dishonest = 16,
    Replacement = 32,
    Anywhere = 63,
}

/// <summary>A statement that starts with a word of its own.</summary>
/// <param name="Word">The word.</param>
/// <param name="Places">Where the statement may stand.</param>
/// <param name="Parse">Reads it, its first word included; a block's body stays empty.</param>
/// <param name="Opens">What kind of place its body is, for a block; null for a line.</param>
internal sealed record StatementWord(string Word, Places Places, Func<LineCursor, Statement> Parse, Places? Opens = null);

/// <summary>All statements that start with a word of their own.</summary>
internal static class StatementTable
{
    private const Places Top = Places.Script;
    private const Places Turns = Places.Script | Places.Loop;
    private const Places Quantum = Places.Round | Places.Replacement;

    /// <summary>In the order in which a script usually holds them.</summary>
    public static IReadOnlyList<StatementWord> Words { get; } =
    [
        new("protocol", Top, DeclarationParser.Protocol),
        new("about", Top, DeclarationParser.About),
        new("parameter", Top, DeclarationParser.Parameter),
        new("input", Top, DeclarationParser.Input),
        new("require", Top, DeclarationParser.Require),
        new("parties", Top, DeclarationParser.Parties),
        new("outsider", Top, DeclarationParser.Outsider),
        new("resource", Top, DeclarationParser.Resource),
        new("copies", Top, DeclarationParser.Copies),
        new("for", Turns, BlockHeaderParser.For, Places.Loop),
        new("round", Turns, BlockHeaderParser.Round, Places.Round),
        new("discussion", Turns, BlockHeaderParser.Discussion, Places.Discussion),
        new("when", Places.Round | Places.Discussion | Places.Replacement, BlockHeaderParser.When, Places.Anywhere),
        new("keep", Quantum | Turns, FigureParser.Keep),
        new("checkpoint", Turns | Places.Round, FigureParser.Checkpoint),
        new("success", Top, FigureParser.Success),
        new("report", Turns, FigureParser.Report),
        new("claim", Turns, FigureParser.Claim),
        new("goal", Turns, FigureParser.Goal),
        new("dishonest", Top, BlockHeaderParser.Dishonest, Places.Dishonest),
        new("choose", Places.Dishonest, DeclarationParser.Choose),
        new("perfect", Places.Dishonest, DeclarationParser.Perfect),
        new("instead", Places.Dishonest, BlockHeaderParser.Instead, Places.Replacement),
        new("before", Places.Dishonest, BlockHeaderParser.Before, Places.Replacement),
        new("harm", Places.Dishonest, FigureParser.Harm),
    ];

    private static readonly Dictionary<string, StatementWord> ByWord = MakeIndex();

    // Habits from elsewhere that no edit distance finds.
    private static readonly Dictionary<string, string> Habits = new()
    {
        ["if"] = "when",
        ["fro"] = "for",
        ["foreach"] = "for",
        ["while"] = "for",
        ["repeat"] = "for",
        ["title"] = "protocol",
        ["party"] = "parties",
        ["assert"] = "require",
    };

    /// <summary>The statement a word begins, or null.</summary>
    public static StatementWord? Find(string word) => ByWord.GetValueOrDefault(word);

    // Of three letters, a change makes too many other words.
    private static readonly string[] Guessable = [.. ByWord.Keys.Where(w => w.Length > 3)];

    /// <summary>The statement that was probably meant, or null.</summary>
    public static StatementWord? Near(string word)
    {
        string lower = word.ToLowerInvariant();
        return Find(lower) ?? Find(Habits.GetValueOrDefault(lower) ?? NearWords.Find(lower, Guessable) ?? "");
    }

    /// <summary>The words that may begin a line there.</summary>
    public static IEnumerable<string> Fitting(Places place) => Words.Where(w => w.Places.HasFlag(place)).Select(w => w.Word);

    private static Dictionary<string, StatementWord> MakeIndex()
    {
        Dictionary<string, StatementWord> index = Words.ToDictionary(w => w.Word);
        index["chooses"] = index["choose"];
        return index;
    }
}
