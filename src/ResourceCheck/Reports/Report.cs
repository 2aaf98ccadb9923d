using ResourceCheck.Diagnostics;

namespace ResourceCheck.Reports;

/// <summary>A result ready for any writer.</summary>
/// <param name="Headline">The verdict in words.</param>
/// <param name="Standing">Whether the verdict is good; null when it is neither.</param>
/// <param name="Sections">Tables and paragraphs for people, in order.</param>
/// <param name="Data">The one long table that files for programs hold.</param>
/// <param name="Provenance">Where the numbers come from, a fact a line.</param>
/// <param name="Warnings">What must be known with the numbers.</param>
internal sealed record Report(
    string Headline, bool? Standing, IReadOnlyList<Section> Sections, Table Data, IReadOnlyList<string> Provenance, IReadOnlyList<Diagnostic> Warnings)
{
    /// <summary>The caution that goes with every report.</summary>
    public const string Caution =
        "These figures evaluate a model with the values entered; they are no security proof, no certification and no safety case (see resourcecheck --help).";
}

/// <summary>A part of a report.</summary>
/// <param name="Title">Heading; null for none.</param>
/// <param name="Table">Table; null for none.</param>
/// <param name="Lines">Paragraphs below.</param>
internal sealed record Section(string? Title, Table? Table, IReadOnlyList<string> Lines)
{
    /// <summary>Paragraphs alone.</summary>
    public static Section Of(params IReadOnlyList<string> lines) => new(null, null, lines);
}
