using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>What actors can do.</summary>
/// <param name="Plural">As several do it: <c>measure</c>.</param>
/// <param name="Singular">As one does it: <c>measures</c>.</param>
/// <param name="Places">Where it may stand.</param>
/// <param name="Parse">Reads what follows the verb.</param>
internal sealed record Verb(string Plural, string Singular, Places Places, Func<LineCursor, PartyList, Statement> Parse);

/// <summary>All verbs.</summary>
internal static class VerbTable
{
    private const Places Quantum = Places.Round | Places.Replacement;
    private const Places Both = Places.Round | Places.Discussion | Places.Replacement;

    /// <summary>In the order in which messages list them.</summary>
    public static IReadOnlyList<Verb> Verbs { get; } =
    [
        new("measure", "measures", Quantum, ActionParser.Measure),
        new("pick", "picks", Both, ActionParser.Pick),
        new("announce", "announces", Both, ActionParser.Announce),
        new("send", "sends", Both, ActionParser.Send),
        new("apply", "applies", Quantum, ActionParser.Apply),
        new("wait", "waits", Quantum, ActionParser.Wait),
        new("set", "sets", Both, ActionParser.Set),
        new("abort", "aborts", Both, ActionParser.Abort),
        new("intercept", "intercepts", Quantum, ActionParser.Intercept),
    ];

    /// <summary>Plural forms.</summary>
    public static IEnumerable<string> BaseForms => Verbs.Select(v => v.Plural);

    /// <summary>Every form.</summary>
    public static IEnumerable<string> Forms => Verbs.SelectMany(v => new[] { v.Plural, v.Singular });

    /// <summary>The verb a word is a form of, or null.</summary>
    public static Verb? Find(string word) => Verbs.FirstOrDefault(v => v.Plural == word || v.Singular == word);

    /// <summary>The form that was probably meant, or null.</summary>
    public static string? Near(string word) => NearWords.Find(word, Forms);
}
