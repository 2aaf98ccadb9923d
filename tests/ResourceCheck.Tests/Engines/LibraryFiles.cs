using ResourceCheck.Conditions;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Tests.Engines;

/// <summary>The protocol library with its conditions.</summary>
internal static class LibraryFiles
{
    /// <summary>All protocols, by file name.</summary>
    public static IEnumerable<string> Names =>
        Directory.GetFiles(Folder, "*.protocol").Select(f => Path.GetFileNameWithoutExtension(f)).Order(StringComparer.Ordinal);

    /// <summary>A protocol at its default parameters and the world of its conditions file.</summary>
    public static (Protocol Protocol, World World) Bind(string name)
    {
        Protocol protocol = TestScripts.Bind(File.ReadAllText(Path.Combine(Folder, name + ".protocol")));
        string conditions = Path.Combine(Folder, name + ".conditions.json");
        ConditionsDocument document = ConditionsFile.Read(conditions, File.ReadAllText(conditions), []).Value!;
        return (protocol, ConditionsFile.Bind(document, protocol).Value!); // notes about parties that today's n leaves out are no matter here
    }

    private static string Folder => Path.Combine(Reports.Golden.Root, "protocols");
}
