using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Writes a report's tables for <c>\input</c> into a LaTeX document that loads booktabs and siunitx; where the numbers come from stands in comments.</summary>
internal static class LatexReport
{
    /// <summary>Writes the report: provenance as comments, then every table with its remarks below.</summary>
    public static void Write(Report report, TextWriter writer)
    {
        writer.Write("% needs \\usepackage{booktabs} and \\usepackage{siunitx}\n");
        foreach (string line in report.Provenance.Append(Report.Caution))
            writer.Write($"% {Visible.InLine(line)}\n");
        writer.Write($"\\par {LatexText.Escape(report.Headline)}\n");
        foreach (Section section in report.Sections)
            WriteSection(section, writer);
        foreach (Diagnostics.Diagnostic warning in report.Warnings)
            writer.Write($"\\par {LatexText.Escape($"{warning.Severity}: {warning.Message} ({warning.Code})")}\n");
    }

    /// <summary>Writes one table.</summary>
    public static void WriteTable(Table table, string? caption, TextWriter writer)
    {
        Table shown = table.WithoutEmptyColumns();
        writer.Write("\\begin{table}[htbp]\n  \\centering\n");
        if (caption is not null)
            writer.Write($"  \\caption{{{LatexText.Escape(caption)}}}\n");
        writer.Write($"  \\begin{{tabular}}{{{string.Concat(shown.Columns.Select((_, c) => shown.Rows.All(r => r[c] is not TextCell || r[c] == Cell.Empty) ? 'r' : 'l'))}}}\n    \\toprule\n");
        WriteRow(shown.Columns.Select(c => LatexText.Escape(c.Title)), writer);
        writer.Write("    \\midrule\n");
        foreach (IReadOnlyList<Cell> row in shown.Rows)
            WriteRow(row.Select(Show), writer);
        writer.Write("    \\bottomrule\n  \\end{tabular}\n\\end{table}\n");
    }

    private static void WriteSection(Section section, TextWriter writer)
    {
        if (section.Table is { Rows.Count: > 0 } table)
            WriteTable(table, section.Title, writer);
        foreach (string line in section.Lines)
            writer.Write($"\\par {LatexText.Escape(line)}\n");
    }

    private static void WriteRow(IEnumerable<string> cells, TextWriter writer) => writer.Write($"    {string.Join(" & ", cells)} \\\\\n");

    private static string Show(Cell cell) => cell switch
    {
        NumberCell number => LatexText.Quantity(FigureText.Of(number.Value, number.Unit, number.Rounding)),
        DifferenceCell difference => LatexText.Escape(difference.Side) + LatexText.Quantity(FigureText.Difference(difference.Value, difference.Rounding)),
        TextCell text => LatexText.Escape(text.Text),
        _ => "",
    };
}
