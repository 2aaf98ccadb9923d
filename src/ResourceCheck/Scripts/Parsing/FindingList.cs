using ResourceCheck.Diagnostics;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>A message of the front end, before it has a place.</summary>
internal sealed record SyntaxMessage(string Code, string Text, string? Cure);

/// <summary>Gathers what lexer and parser find in one script.</summary>
internal sealed class FindingList(SourceText source)
{
    private readonly List<(int Start, Diagnostic Finding)> _found = [];

    public void Add(Span span, SyntaxMessage message) =>
        _found.Add((span.Start, new Diagnostic(message.Code, Severity.Error, message.Text, message.Cure, source.PlaceOf(span))));

    /// <summary>Everything found, in order of place.</summary>
    public IReadOnlyList<Diagnostic> ToList() => [.. _found.OrderBy(f => f.Start).Select(f => f.Finding)];
}
