using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Tests.Conditions;

/// <summary>
/// A case file: sections that begin with <c>--- set</c> (path=value), <c>--- parties</c> (names; outsiders behind <c>outside</c>),
/// <c>--- conditions</c> and <c>--- findings</c>. Without parties the file is only read.
/// </summary>
internal sealed record ConditionsCase(string Conditions, IReadOnlyList<KeyValuePair<string, string>> Overrides, Protocol? Protocol, string Expected)
{
    /// <summary>Folder of all case files, in the sources.</summary>
    public static string Folder { get; } = FindFolder();

    /// <summary>Reads a case file.</summary>
    public static ConditionsCase Load(string file)
    {
        List<KeyValuePair<string, string>> overrides = [];
        Protocol? protocol = null;
        string conditions = "", expected = "";
        foreach (string section in File.ReadAllText(Path.Combine(Folder, file)).Split("--- ", StringSplitOptions.RemoveEmptyEntries))
        {
            string head = section.Split('\n', 2)[0], body = section.Split('\n', 2)[1].Trim('\n');
            if (head.StartsWith("set ", StringComparison.Ordinal))
                overrides.Add(new(head[4..head.IndexOf('=', StringComparison.Ordinal)], head[(head.IndexOf('=', StringComparison.Ordinal) + 1)..]));
            else if (head.StartsWith("parties ", StringComparison.Ordinal))
                protocol = ProtocolOf(head[8..]);
            else if (head == "conditions")
                conditions = body;
            else if (head == "findings")
                expected = body;
            else
                throw new InvalidDataException($"{file} has a section `{head}`");
        }

        return new ConditionsCase(conditions, overrides, protocol, expected);
    }

    /// <summary>What reading, and binding when there is a protocol, finds; folders of this machine cut off.</summary>
    public string Findings()
    {
        string name = Path.Combine(Folder, "valley.conditions.json");
        Outcome<ConditionsDocument> read = ConditionsFile.Read(name, Conditions, Overrides);
        IReadOnlyList<Diagnostic> all = read.Findings;
        if (read.Value is { } document && Protocol is not null)
            all = [.. all, .. ConditionsFile.Bind(document, Protocol).Findings];
        return string.Join("\n\n", all).Replace(Folder + Path.DirectorySeparatorChar, "", StringComparison.Ordinal);
    }

    private static Protocol ProtocolOf(string line)
    {
        string[] halves = line.Split(" outside ");
        return TestProtocol.Of(halves[0].Split(' '), halves.Length > 1 ? halves[1].Split(' ') : []);
    }

    private static string FindFolder()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "ResourceCheck.sln")))
            folder = folder.Parent;
        return Path.Combine(folder!.FullName, "tests", "ResourceCheck.Tests", "Conditions", "Cases");
    }
}
