using ResourceCheck.Figures;
using ResourceCheck.Reports;

namespace ResourceCheck.Studies;

/// <summary>All files of a report: the page, tables as CSV and LaTeX, figures as SVG with their data, the inputs' hashes.</summary>
public static class StudyFiles
{
    /// <summary>Folder of the tables and of the figures, below that of the report.</summary>
    public const string Tables = "tables", Figures = "figures";

    /// <summary>Names, with a slash between folder and file, and texts. The same result gives the same bytes.</summary>
    public static IReadOnlyList<(string Name, string Text)> Of(StudyResult result)
    {
        StudyPage page = StudyPageBuilder.Of(result);
        PageItem[] items = [.. page.Sections.SelectMany(s => s.Items)];
        return
        [
            ("report.html", HtmlPage.Of(page, result.Version)),
            .. items.Where(i => i is { File: not null, Data: not null }).SelectMany(TablesOf),
            .. items.SelectMany(i => i.Figures).SelectMany(f => new[] { ($"{Figures}/{f.Id}.svg", f.Svg + "\n"), ($"{Figures}/{f.Id}.dat", f.Data) }),
        ];
    }

    private static IEnumerable<(string Name, string Text)> TablesOf(PageItem item)
    {
        Report report = new(item.Headline ?? item.Title ?? "", item.Standing, item.Sections, item.Data!, [], []);
        using StringWriter csv = new(), latex = new();
        CsvReport.Write(report, csv);
        yield return ($"{Tables}/{item.File}.csv", csv.ToString());
        foreach (Section section in item.Sections.Where(s => s.Table is { Rows.Count: > 0 }))
            LatexReport.WriteTable(section.Table!, section.Title ?? item.Title, latex);
        if (latex.ToString() is { Length: > 0 } tables)
            yield return ($"{Tables}/{item.File}.tex", tables);
    }
}
