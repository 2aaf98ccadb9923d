using ResourceCheck.Conditions.Json;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Studies;

/// <summary>Texts about study files (J023 to J029).</summary>
internal static class StudyFileMessages
{
    public static Diagnostic UnknownKey(Spot at, string name, string what, IReadOnlyList<string> known)
    {
        string[] names = [.. known.Where(k => k != StudyKeys.Schema)];
        return new("J023", Severity.Error, $"`{name}` is no key of {what}: {Words.Or(names)} fit there.", NearWords.Find(name, names) is { } near ? $"did you mean {near}?" : "use one of these keys", at.ToPlace());
    }

    public static Diagnostic WrongKind(Node node, string what, string fits) =>
        new("J024", Severity.Error, $"{char.ToUpperInvariant(what[0])}{what[1..]} is {node.Kind}, but {fits} fits here.", "write it so", node.Spot.ToPlace());

    public static Diagnostic Missing(Spot at, string key, string fits) =>
        new("J025", Severity.Error, $"`{key}` is missing or empty: {fits} fits there.", "docs/study.md lists the keys, and protocols/winter.study.json is a study to start from", at.ToPlace());

    public static Diagnostic InPart(Diagnostic finding, string part) => finding with { Message = $"In \"{part}\": {finding.Message}" };

    public static Diagnostic NothingComputed() =>
        new("J026", Severity.Error, "Nothing of the study could be computed.", "mend what the messages above name", Place.Of("study"));

    public static IReadOnlyList<Explanation> Explanations { get; } =
    [
        new("J023", "unknown key in a study", "A study file holds title, about and parts; a part holds a script, conditions and what is to be found out.", "Use one of the keys that the message lists.", "{ \"parts\": [ { \"scrpt\": \"removal.protocol\" } ] }"),
        new("J024", "another kind of value in a study", "The key takes another kind of value.", "Write what the message says fits.", "{ \"parts\": { \"script\": \"removal.protocol\" } }"),
        new("J025", "something missing in a study", "Without it the study has nothing to compute.", "Add it.", "{ \"title\": \"Winter\" }"),
        new("J026", "nothing of a study was computed", "Every part of the study failed; the messages above say why.", "Mend the parts one by one with run, tolerance and sweep."),
    ];
}
