using System.Runtime.CompilerServices;

namespace ResourceCheck.Tests.Scripts;

/// <summary>One case of a case file: a script, and what must come of it.</summary>
public sealed record ScriptCase(string File, string Title, string Source, string Kind, string Expected)
{
    public override string ToString() => $"{File}: {Title}";
}

/// <summary>
/// Reads the case files. A case opens with <c>## title</c>, then its script, then <c>=&gt; same</c> (prints as written),
/// <c>=&gt; printed</c> and the formatted script, or <c>=&gt; findings</c> and the whole diagnostics.
/// </summary>
public static class ScriptCases
{
    public static IReadOnlyList<ScriptCase> All { get; } = Read();

    private static IReadOnlyList<ScriptCase> Read([CallerFilePath] string here = "")
    {
        string folder = Path.Combine(Path.GetDirectoryName(here)!, "Cases");
        return [.. Directory.GetFiles(folder, "*.txt").Order(StringComparer.Ordinal).SelectMany(ReadFile)];
    }

    private static IEnumerable<ScriptCase> ReadFile(string path)
    {
        string text = "\n" + File.ReadAllText(path).ReplaceLineEndings("\n");
        foreach (string part in text.Split("\n## ").Skip(1))
        {
            string[] lines = part.TrimEnd('\n').Split('\n');
            int arrow = Array.FindIndex(lines, l => l.StartsWith("=> ", StringComparison.Ordinal));
            string source = string.Concat(lines[1..arrow].Select(l => l + "\n"));
            string expected = string.Concat(lines[(arrow + 1)..].Select(l => l + "\n"));
            string kind = lines[arrow][3..].Trim();
            yield return new ScriptCase(Path.GetFileName(path), lines[0], source, kind, kind == "same" ? source : expected);
        }
    }
}
