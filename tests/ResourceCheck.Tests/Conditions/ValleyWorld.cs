using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary>Reads and binds in one go, for tests of good conditions.</summary>
internal static class ValleyWorld
{
    /// <summary>The world of Ada, Ben and Cyd (three levels).</summary>
    public static World Of(string text) => Of(text, TestProtocol.Of(["Ada", "Ben", "Cyd"]));

    /// <summary>The world of a protocol.</summary>
    public static World Of(string text, Protocol protocol, string name = "valley.conditions.json")
    {
        Outcome<ConditionsDocument> read = ConditionsFile.Read(name, text, []);
        Assert.Equal("", string.Join("\n", read.Findings));
        Outcome<World> bound = ConditionsFile.Bind(read.Value!, protocol);
        Assert.Equal("", string.Join("\n", bound.Findings));
        return bound.Value!;
    }

    /// <summary>Codes that binding finds.</summary>
    public static IReadOnlyList<string> BindCodes(string text, Protocol protocol)
    {
        Outcome<ConditionsDocument> read = ConditionsFile.Read("valley.conditions.json", text, []);
        Assert.Equal("", string.Join("\n", read.Findings));
        return [.. ConditionsFile.Bind(read.Value!, protocol).Findings.Select(f => f.Code)];
    }
}
