using System.Globalization;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Writes a report for people: verdict first, then small aligned tables.</summary>
internal static class TextReport
{
    private const string Gap = "  ";

    /// <summary>A longer text pushes the rest of its own row aside instead of widening the column for all.</summary>
    private const int WidestColumn = 60;

    /// <summary>Width of paragraphs.</summary>
    private const int LineWidth = 100;

    private const string Good = "\u001b[1;32m";
    private const string Bad = "\u001b[1;31m";
    private const string Plain = "\u001b[0m";

    /// <summary>Writes the report; colours mark the verdict only where the caller knows of a terminal.</summary>
    public static void Write(Report report, TextWriter writer, bool colour)
    {
        string headline = Prose(report.Headline);
        writer.Write((colour, report.Standing) switch
        {
            (true, true) => $"{Good}{headline}{Plain}\n",
            (true, false) => $"{Bad}{headline}{Plain}\n",
            _ => $"{headline}\n",
        });
        foreach (Section section in report.Sections)
            WriteSection(section, writer);
        WriteWarnings(report, writer);
        writer.Write('\n');
        foreach (string line in report.Provenance.Append(Report.Caution))
            writer.Write($"{Prose(line)}\n");
    }

    private static void WriteSection(Section section, TextWriter writer)
    {
        if (section.Title is { } title)
            writer.Write($"\n{Visible.InLine(title)}\n");
        if (section.Table is { Rows.Count: > 0 } table)
            WriteTable(table.WithoutEmptyColumns(), writer);
        foreach (string line in section.Lines)
            writer.Write($"\n{Prose(line)}\n");
    }

    private static void WriteTable(Table table, TextWriter writer)
    {
        List<string[]> rows = [.. table.Rows.Select(row => row.Select((cell, c) => Show(cell, table.Headed ? "" : table.Columns[c].Lead)).ToArray())];
        if (table.Headed)
            rows.Insert(0, [.. table.Columns.Select(c => c.Title)]);
        int[] widths = [.. Enumerable.Range(0, table.Columns.Count).Select(c => rows.Select(row => Width(row[c])).Where(w => w <= WidestColumn).Append(0).Max())];
        writer.Write('\n');
        foreach (string[] row in rows)
        {
            IEnumerable<string> padded = row.Select((text, c) => text + new string(' ', Math.Max(0, widths[c] - Width(text))));
            writer.Write($"{Gap}{string.Join(Gap, padded).TrimEnd()}\n");
        }
    }

    private static void WriteWarnings(Report report, TextWriter writer)
    {
        if (report.Warnings.Count > 0)
            writer.Write('\n');
        foreach (Diagnostics.Diagnostic warning in report.Warnings)
            writer.Write($"{Prose($"{warning.Severity}: {warning.Message} ({warning.Code})")}\n");
    }

    /// <summary>A paragraph in lines that fit a page; a word longer than a line stays whole.</summary>
    private static string Prose(string text)
    {
        System.Text.StringBuilder wrapped = new();
        int column = 0;
        foreach (string word in Visible.InLine(text).Split(' '))
        {
            int width = Width(word);
            bool breaks = column > 0 && column + 1 + width > LineWidth;
            wrapped.Append(breaks ? "\n" : column > 0 ? " " : "").Append(word);
            column = breaks || column == 0 ? width : column + 1 + width;
        }

        return wrapped.ToString();
    }

    private static string Show(Cell cell, string lead) => cell switch
    {
        NumberCell number => lead + FigureText.Of(number.Value, number.Unit, number.Rounding),
        DifferenceCell difference => lead + difference.Shown,
        TextCell { Text: "" } => "",
        TextCell text => lead + Visible.InLine(text.Text),
        _ => "",
    };

    private static int Width(string text) => new StringInfo(text).LengthInTextElements;
}
