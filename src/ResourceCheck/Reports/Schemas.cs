using ResourceCheck.Conditions;

namespace ResourceCheck.Reports;

/// <summary>The published JSON schemas by name.</summary>
public static class Schemas
{
    private const string Conditions = "conditions";

    /// <summary>Names of all schemas.</summary>
    public static IReadOnlyList<string> Names { get; } = [Conditions, "result", "verification", "inspection", "state", "storage", "relaxation", "budget", "sweep", "tolerance", "copies", "copies-table", "study"];

    /// <summary>A schema's text; null for an unknown name.</summary>
    public static string? Find(string name) =>
        name == Conditions ? ConditionsFile.Schema : Names.Contains(name) ? Embedded(name) : null;

    private static string Embedded(string name)
    {
        using Stream stream = typeof(Schemas).Assembly.GetManifestResourceStream($"schema/{name}.schema.json")
            ?? throw new InvalidOperationException($"The schema {name} is not built into the library.");
        using StreamReader reader = new(stream);
        return reader.ReadToEnd();
    }
}
