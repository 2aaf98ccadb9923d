using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Tests.Conditions;

/// <summary>Protocols that only have parties: all that conditions look at.</summary>
internal static class TestProtocol
{
    /// <summary>Holders first, then parties without a qudit, then outsiders.</summary>
    public static Protocol Of(IReadOnlyList<string> holders, IReadOnlyList<string>? outsiders = null, IReadOnlyList<string>? others = null)
    {
        string[] parties = [.. holders, .. others ?? [], .. outsiders ?? []];
        return new Protocol
        {
            Source = new SourceText("valley.protocol", ""),
            Name = "valley",
            About = "",
            Parties = parties,
            Holders = [.. Enumerable.Range(0, holders.Count)],
            Outsiders = [.. Enumerable.Range(parties.Length - (outsiders?.Count ?? 0), outsiders?.Count ?? 0)],
            Parameters = [],
            Inputs = [],
            Slots = [],
            Steps = [],
            Success = new BoundLiteral(new Span(0, 0), Value.True),
            Reports = [],
            Claims = [],
            Goals = [],
            Requirements = [],
            HandlesNone = false,
        };
    }
}
