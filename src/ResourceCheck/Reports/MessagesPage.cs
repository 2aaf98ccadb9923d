using ResourceCheck.Diagnostics;

namespace ResourceCheck.Reports;

/// <summary>The catalogue of messages as text: one entry for a terminal, all of them as a page of the docs.</summary>
public static class MessagesPage
{
    /// <summary>One explanation for a terminal.</summary>
    public static string Text(Explanation e)
    {
        string example = e.Example is null ? "" : $"\n  Example:\n{Indent(e.Example)}";
        return $"{e.Code}: {e.Title}\n\n  Cause: {e.Cause}\n  Cure: {e.Cure}\n{example}";
    }

    /// <summary>A line a code.</summary>
    public static string List(IEnumerable<Explanation> all) => string.Concat(all.Select(e => $"{e.Code}  {e.Title}\n"));

    /// <summary>The page docs/messages.md.</summary>
    public static string Markdown(IEnumerable<Explanation> all) =>
        "# Messages\n\nEvery message ends with a code that never changes its meaning. `resourcecheck explain CODE` prints the same text.\n"
        + string.Concat(all.Select(Entry));

    /// <summary>One entry of the page.</summary>
    public static string Entry(Explanation e)
    {
        string example = e.Example is null ? "" : $"\n```\n{e.Example.TrimEnd('\n')}\n```\n";
        return $"\n## {e.Code}: {e.Title}\n\nCause: {e.Cause}\n\nCure: {e.Cure}\n{example}";
    }

    private static string Indent(string text) => string.Concat(text.TrimEnd('\n').Split('\n').Select(line => $"    {line}\n"));
}
