using System.Globalization;

namespace ResourceCheck.Reports;

/// <summary>Writes a report's long table by RFC 4180, every number with all its digits; what is no number or infinite leaves its field empty.</summary>
internal static class CsvReport
{
    private const string LineEnd = "\r\n";
    private static readonly System.Buffers.SearchValues<char> Special = System.Buffers.SearchValues.Create(",\"\r\n");

    /// <summary>Writes the table.</summary>
    public static void Write(Report report, TextWriter writer)
    {
        WriteRow(report.Data.Columns.Select(c => c.Unit.Length == 0 ? c.Id : $"{c.Id} [{c.Unit}]"), writer);
        foreach (IReadOnlyList<Cell> row in report.Data.Rows)
            WriteRow(row.Select(Show), writer);
    }

    private static void WriteRow(IEnumerable<string> cells, TextWriter writer) => writer.Write(string.Join(',', cells.Select(Quote)) + LineEnd);

    private static string Show(Cell cell) => cell switch
    {
        NumberCell { Value: var value } => Full(value),
        DifferenceCell { Value: var value } => Full(value),
        TextCell text => text.Text,
        _ => "",
    };

    private static string Full(double value) => double.IsFinite(value) ? value.ToString("R", CultureInfo.InvariantCulture) : "";

    private static string Quote(string text) =>
        text.AsSpan().IndexOfAny(Special) < 0 && text == text.Trim() ? text : $"\"{text.Replace("\"", "\"\"", StringComparison.Ordinal)}\"";
}
