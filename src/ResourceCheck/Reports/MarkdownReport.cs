using System.Text;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Writes a report as Markdown: headings and pipe tables, all text from inputs escaped.</summary>
internal static class MarkdownReport
{
    private const string Markup = "\\`*_{}[]<>#|~&";

    /// <summary>Writes the report, provenance first below the verdict.</summary>
    public static void Write(Report report, TextWriter writer)
    {
        writer.Write($"# {Escape(report.Headline)}\n\n");
        foreach (string line in report.Provenance)
            writer.Write($"- {Escape(line)}\n");
        foreach (Section section in report.Sections)
            WriteSection(section, writer);
        if (report.Warnings.Count > 0)
            writer.Write("\n## Warnings and notes\n\n");
        foreach (Diagnostics.Diagnostic warning in report.Warnings)
            writer.Write($"- {warning.Severity}: {Escape(warning.Message)} ({warning.Code})\n");
        writer.Write($"\n{Escape(Report.Caution)}\n");
    }

    private static void WriteSection(Section section, TextWriter writer)
    {
        if (section.Title is { } title)
            writer.Write($"\n## {Escape(title)}\n");
        if (section.Table is { Rows.Count: > 0 } table)
            WriteTable(table.WithoutEmptyColumns(), writer);
        foreach (string line in section.Lines)
            writer.Write($"\n{Escape(line)}\n");
    }

    private static void WriteTable(Table table, TextWriter writer)
    {
        writer.Write('\n');
        WriteRow(table.Columns.Select(c => Escape(c.Title)), writer);
        WriteRow(table.Columns.Select(_ => "---"), writer);
        foreach (IReadOnlyList<Cell> row in table.Rows)
            WriteRow(row.Select(Show), writer);
    }

    private static void WriteRow(IEnumerable<string> cells, TextWriter writer) => writer.Write($"| {string.Join(" | ", cells)} |\n");

    private static string Show(Cell cell) => cell switch
    {
        NumberCell number => FigureText.Of(number.Value, number.Unit, number.Rounding),
        DifferenceCell difference => difference.Shown,
        TextCell text => Escape(text.Text),
        _ => "",
    };

    private static string Escape(string text)
    {
        StringBuilder escaped = new();
        foreach (char c in Visible.InLine(text))
        {
            if (Markup.Contains(c, StringComparison.Ordinal))
                escaped.Append('\\');
            escaped.Append(c);
        }

        return escaped.ToString();
    }
}
