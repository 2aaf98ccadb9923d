using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Conditions;

/// <summary>The steps from a conditions file to the world of a protocol.</summary>
public static class ConditionsFile
{
    /// <summary>Reads a conditions file's text, overrides applied: form, units, ranges and everything that needs no protocol is checked. All mistakes in one run.</summary>
    /// <param name="name">File name as the user gave it; relative file names inside are resolved against its folder.</param>
    /// <param name="text">The file's content.</param>
    /// <param name="overrides">Pairs of path and value as given with <c>--set</c>; the value is JSON or a bare text such as <c>5 km</c>.</param>
    public static Outcome<ConditionsDocument> Read(string name, string text, IReadOnlyList<KeyValuePair<string, string>> overrides) => throw new NotSupportedException();

    /// <summary>Resolves conditions for a protocol: parties, levels, complete positivity. Unknown parties and levels are errors.</summary>
    public static Outcome<World> Bind(ConditionsDocument document, Protocol protocol) => throw new NotSupportedException();

    /// <summary>The JSON schema of conditions files, as published.</summary>
    public static string Schema => throw new NotSupportedException();
}
