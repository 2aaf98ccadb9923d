namespace ResourceCheck.Reports;

/// <summary>A column: everything that a writer says about it.</summary>
/// <param name="Id">Name in files for programs.</param>
/// <param name="Title">Heading for people.</param>
/// <param name="Unit">Unit of all its numbers, named in the heading; empty when cells carry their own or there is none.</param>
/// <param name="Legend">What it holds, in a few words.</param>
/// <param name="Lead">Word before each value in tables without headings.</param>
internal sealed record Column(string Id, string Title, string Unit = "", string Legend = "", string Lead = "");

/// <summary>A table, built once for all writers.</summary>
/// <param name="Columns">Its columns.</param>
/// <param name="Rows">Its rows, each with as many cells as there are columns.</param>
/// <param name="Headed">Whether text output shows headings.</param>
internal sealed record Table(IReadOnlyList<Column> Columns, IReadOnlyList<IReadOnlyList<Cell>> Rows, bool Headed = true)
{
    /// <summary>The same table without columns that hold nothing.</summary>
    public Table WithoutEmptyColumns()
    {
        int[] used = [.. Enumerable.Range(0, Columns.Count).Where(c => Rows.Any(row => row[c] != Cell.Empty))];
        return new([.. used.Select(c => Columns[c])], [.. Rows.Select(row => (IReadOnlyList<Cell>)[.. used.Select(c => row[c])])], Headed);
    }
}
