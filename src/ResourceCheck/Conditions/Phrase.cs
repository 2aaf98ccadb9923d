namespace ResourceCheck.Conditions;

/// <summary>Lists in sentences.</summary>
internal static class Phrase
{
    /// <summary><c>a, b or c</c>.</summary>
    public static string Or(IEnumerable<string> items) => Join([.. items.Distinct()], "or");

    /// <summary><c>a, b and c</c>.</summary>
    public static string And(IEnumerable<string> items) => Join([.. items.Distinct()], "and");

    private static string Join(IReadOnlyList<string> items, string last) => items.Count switch
    {
        0 => "",
        1 => items[0],
        _ => $"{string.Join(", ", items.Take(items.Count - 1))} {last} {items[^1]}",
    };
}
