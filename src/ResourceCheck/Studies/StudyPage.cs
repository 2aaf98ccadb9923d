using ResourceCheck.Figures;
using ResourceCheck.Reports;

namespace ResourceCheck.Studies;

/// <summary>A report before it is written: sections in the order a referee reads them.</summary>
/// <param name="Title">Title.</param>
/// <param name="About">The author's words; null for none.</param>
/// <param name="Sections">Sections.</param>
internal sealed record StudyPage(string Title, string? About, IReadOnlyList<PageSection> Sections);

/// <summary>A section.</summary>
/// <param name="Id">Its anchor.</param>
/// <param name="Title">Heading.</param>
/// <param name="Items">What stands in it.</param>
internal sealed record PageSection(string Id, string Title, IReadOnlyList<PageItem> Items);

/// <summary>One result.</summary>
/// <param name="Title">Heading; null for none.</param>
/// <param name="File">Beginning of the names of its files; null when it has none.</param>
/// <param name="Headline">Its answer in a sentence; null for none.</param>
/// <param name="Standing">Whether the answer is good; null when it is neither.</param>
/// <param name="Sections">Tables and paragraphs.</param>
/// <param name="Data">Table with all digits for programs; null when there is none.</param>
/// <param name="Figures">Figures.</param>
internal sealed record PageItem(
    string? Title, string? File, string? Headline, bool? Standing, IReadOnlyList<Section> Sections, Table? Data, IReadOnlyList<FigureImage> Figures)
{
    /// <summary>Paragraphs alone.</summary>
    public static PageItem Of(string? title, IReadOnlyList<string> lines) => new(title, null, null, null, [Section.Of(lines)], null, []);
}
