using ResourceCheck.Engines;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>tolerance</c>: up to which value a goal is met.</summary>
internal static class ToleranceReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(ToleranceResult tolerance)
    {
        Table crossings = Crossings(tolerance);
        return new Report(
            Headline(tolerance),
            tolerance.Crossings.Count > 0 || tolerance.MetAt.From,
            [new Section(null, crossings, [$"Found in {tolerance.Evaluations} evaluations; two crossings closer than a step of the scan would not be seen."])],
            crossings,
            Provenance.Of(tolerance),
            tolerance.Warnings);
    }

    private static string Headline(ToleranceResult tolerance)
    {
        string range = $"from {Text(tolerance, tolerance.Varied.From)} to {Text(tolerance, tolerance.Varied.To)}";
        return (tolerance.Crossings, tolerance.MetAt.From) switch
        {
            ([], true) => $"Every value of {tolerance.Varied.Path} {range} meets {tolerance.Goal}.",
            ([], false) => $"No value of {tolerance.Varied.Path} {range} meets {tolerance.Goal}.",
            ([var only], _) => $"{tolerance.Goal} holds {(only.MetBelow ? "up to" : "from")} {tolerance.Varied.Path} = {Text(tolerance, only.Value)} ({Truth.Name(only.Figure.Label)}){(only.MetBelow ? "" : " upwards")}.",
            (var several, _) => $"{tolerance.Goal} is crossed {several.Count} times {range}: {string.Join(", ", several.Select(c => $"{Text(tolerance, c.Value)} ({(c.MetBelow ? "met below" : "met above")})"))}.",
        };
    }

    private static Table Crossings(ToleranceResult tolerance) => new(
        [
            new("value", tolerance.Varied.Unit.Length == 0 ? tolerance.Varied.Path : $"{tolerance.Varied.Path}, {tolerance.Varied.Unit}", tolerance.Varied.Unit),
            new("met", "Goal is met"),
            new("figure", "Figure there"),
            new("label", "Label"),
            new("distance", "Longest way, km", "km"),
            new("time", "Its time"),
        ],
        [.. tolerance.Crossings.Select(c => (IReadOnlyList<Cell>)
        [
            Cell.Of(c.Value, ""),
            Cell.Of(c.MetBelow ? "below" : "above"),
            Truth.CellOf(c.Figure),
            Cell.Of(Truth.Describe(c.Figure)),
            Cell.Of(c.Flight?.Metres / 1000, ""),
            Cell.Of(c.Flight?.Seconds, "s"),
        ])]);

    private static string Text(ToleranceResult tolerance, double value) =>
        tolerance.Varied.Unit.Length == 0 ? FigureText.Number(value) : $"{FigureText.Number(value)} {tolerance.Varied.Unit}";
}
