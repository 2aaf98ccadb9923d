using ResourceCheck.Engines;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>tolerance</c>: up to which value a goal is met.</summary>
internal static class ToleranceReport
{
    private const double Hundred = 100;

    /// <summary>Builds the report.</summary>
    public static Report From(ToleranceResult tolerance)
    {
        Table crossings = Crossings(tolerance);
        return new Report(
            string.Join(' ', new[] { Headline(tolerance), TodayInWords(tolerance) }.OfType<string>()),
            tolerance.Crossings.Count > 0 || tolerance.MetAt.From,
            [
                new Section(null, crossings, Remarks(tolerance)),
                .. tolerance.Uncertainty is { Leading: { Moves: true } leading } uncertainty ? [UncertaintyReport.Ranking(leading, uncertainty)] : Array.Empty<Section>(),
            ],
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

    /// <summary>Today's value against the goal and the nearest crossing; null when the conditions give none.</summary>
    private static string? TodayInWords(ToleranceResult tolerance)
    {
        if (tolerance.Today is not { } today)
            return null;
        string now = $"Today's value, {Text(tolerance, today.Value)}, {(today.Met ? "meets" : "misses")} the goal";
        if (tolerance.Crossings.Count == 0)
            return $"{now}.";
        Crossing nearest = tolerance.Crossings.MinBy(c => Math.Abs(c.FromToday!.Value))!;
        string relative = nearest.Relative is { } part ? $" ({FigureText.Number(Hundred * Math.Abs(part))} %)" : "";
        return $"{now}; it {(today.Met ? "may" : "must")} {(nearest.FromToday > 0 ? "grow" : "fall")} by {Text(tolerance, Math.Abs(nearest.FromToday!.Value))}{relative}{(today.Met ? "" : " to meet it")}.";
    }

    private static IReadOnlyList<string> Remarks(ToleranceResult tolerance) =>
    [
        $"Found in {tolerance.Evaluations} evaluations; two crossings closer than a step of the scan would not be seen.",
        .. tolerance.Crossings.Any(c => c.Band is not null) ? ["± is the standard uncertainty from the other uncertain values, to first order (linear), with its 95 % band."] : Array.Empty<string>(),
        .. (tolerance.Uncertainty?.LeftOut ?? []).Select(l => $"Left out: {l}."),
    ];

    private static Table Crossings(ToleranceResult tolerance) => new(
        [
            new("value", tolerance.Varied.Unit.Length == 0 ? tolerance.Varied.Path : $"{tolerance.Varied.Path}, {tolerance.Varied.Unit}", tolerance.Varied.Unit),
            new("met", "Goal is met"),
            new("figure", "Figure there"),
            new("label", "Label"),
            new("distance", "Longest way, km", "km"),
            new("time", "Its time"),
            new("today", $"From today{(tolerance.Varied.Unit.Length == 0 ? "" : $", {tolerance.Varied.Unit}")}", tolerance.Varied.Unit),
            new("relative", "From today, %", "%"),
            new("uncertainty", "±", tolerance.Varied.Unit),
            new("low", "95 % from", tolerance.Varied.Unit),
            new("high", "to", tolerance.Varied.Unit),
        ],
        [.. tolerance.Crossings.Select(c => (IReadOnlyList<Cell>)
        [
            Cell.Of(c.Value, ""),
            Cell.Of(c.MetBelow ? "below" : "above"),
            Truth.CellOf(c.Figure),
            Cell.Of(Truth.Describe(c.Figure)),
            Cell.Of(c.Flight?.Metres / 1000, ""),
            Cell.Of(c.Flight?.Seconds, "s"),
            Cell.Of(c.FromToday, ""),
            Cell.Of(Hundred * c.Relative, ""),
            Cell.Of(c.Band?.StandardUncertainty, ""),
            Cell.Of(c.Band?.Low, ""),
            Cell.Of(c.Band?.High, ""),
        ])]);

    private static string Text(ToleranceResult tolerance, double value) =>
        tolerance.Varied.Unit.Length == 0 ? FigureText.Number(value) : $"{FigureText.Number(value)} {tolerance.Varied.Unit}";
}
