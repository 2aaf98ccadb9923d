using System.Globalization;
using System.Runtime.CompilerServices;

namespace ResourceCheck.Tests.Reference;

/// <summary>One row of a table under tests/reference; how the columns read stands at the head of each table.</summary>
public sealed record TableRow(string Table, string Name, int N, string Kind, IReadOnlyDictionary<string, string> Parameters, double Value)
{
    /// <summary>The rows of a table, comments and the line of column names left out.</summary>
    public static IReadOnlyList<TableRow> Of(string table) =>
        [.. File.ReadLines(Path.Combine(Folder(), table + ".csv")).Where(l => l.Length > 0 && l[0] != '#').Skip(1).Select(l => Parse(table, l))];

    /// <summary>The folder tests/reference.</summary>
    public static string Folder([CallerFilePath] string file = "") => Path.GetFullPath(Path.Combine(Path.GetDirectoryName(file)!, "..", "..", "reference"));

    /// <summary>A parameter's text for one party: its own share where the value lists the parties, else the whole.</summary>
    public string? Of(string key, int party)
    {
        if (!Parameters.TryGetValue(key, out string? text))
            return null;
        string[] parts = text.Split('|');
        return parts.Length == 1 ? parts[0] : parts[party];
    }

    /// <summary>A number for one party; 0 where the row does not give it.</summary>
    public double Number(string key, int party, double absent = 0) => Of(key, party) is { } text ? Number(text) : absent;

    public static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    public override string ToString() => $"{Table} {Name} N={N} {Kind}";

    private static TableRow Parse(string table, string line)
    {
        string[] cells = Cells(line);
        Dictionary<string, string> parameters = cells[3].Split(';', StringSplitOptions.RemoveEmptyEntries)
            .Select(p => p.Split('=', 2)).ToDictionary(p => p[0], p => p[1]);
        return new TableRow(table, cells[0], int.Parse(cells[1], CultureInfo.InvariantCulture), cells[2], parameters, Number(cells[4]));
    }

    private static string[] Cells(string line)
    {
        List<string> cells = [""];
        bool quoted = false;
        foreach (char c in line)
        {
            if (c == '"')
                quoted = !quoted;
            else if (c == ',' && !quoted)
                cells.Add("");
            else
                cells[^1] += c;
        }

        return [.. cells];
    }
}
