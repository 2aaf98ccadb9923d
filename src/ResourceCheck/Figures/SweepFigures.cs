using ResourceCheck.Engines;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;
using ResourceCheck.Reports;

namespace ResourceCheck.Figures;

/// <summary>Figures of a sweep: curves against one value, maps of two.</summary>
internal static class SweepFigures
{
    /// <summary>Failures that stay below this are told apart on a logarithmic axis only.</summary>
    private const double Small = 0.1;

    private const string Success = "success", Failure = "failure", Yield = "yield";

    /// <summary>Draws a sweep.</summary>
    /// <param name="sweep">The sweep.</param>
    /// <param name="id">Name of the figure; maps of further figures get a number behind it.</param>
    /// <param name="tolerated">Value up to which the goal is met, to be marked; null for none.</param>
    public static IReadOnlyList<FigureImage> Of(SweepResult sweep, string id, double? tolerated = null)
    {
        if (sweep.Varied.Count == 1)
            return [ChartPlot.Of(Curves(sweep, id, tolerated))];
        string[] shown = [.. sweep.Goals.Select(g => g.Figure).Distinct().Where(f => Has(sweep, f)).DefaultIfEmpty(Success)];
        return [.. shown.Select((figure, i) => MapPlot.Of(sweep, figure, i == 0 ? id : $"{id}-{i + 1}"))];
    }

    private static Chart Curves(SweepResult sweep, string id, double? tolerated)
    {
        Variation varied = sweep.Varied[0];
        string[] names = [.. Shown(sweep).Take(PlotStyle.MostSeries)];
        bool small = names.All(n => Values(sweep, n).All(e => e.Value is > 0 and < Small));
        SweepGoal[] goals = [.. sweep.Goals.Where(g => names.Contains(g.Figure))];
        return new Chart(
            id,
            $"{sweep.Title}: {string.Join(", ", names)} against {varied.Path}",
            Description(sweep, names, goals, tolerated),
            new ChartAxis(AxisTitle(varied), varied.IsLogarithmic, varied.WholeOnly),
            new ChartAxis(names.All(n => n.StartsWith("fidelity", StringComparison.Ordinal)) ? "fidelity" : "probability, fidelity", small),
            [.. names.Select(n => new ChartSeries(Label(sweep, n), [.. sweep.Points.Select(p => Point(p, n))], !varied.WholeOnly))],
            [.. goals.Select(g => new ChartLine(g.Threshold, $"goal: {g.Text}")), .. tolerated is { } t ? [new ChartLine(t, $"tolerated: {Value(varied, t)}", IsVertical: true)] : Array.Empty<ChartLine>()]);
    }

    /// <summary>An axis title with the unit.</summary>
    public static string AxisTitle(Variation varied) => varied.Unit.Length == 0 ? varied.Path : $"{varied.Path} ({varied.Unit})";

    /// <summary>A value with its unit.</summary>
    public static string Value(Variation varied, double value) => varied.Unit.Length == 0 ? FigureText.Number(value) : $"{FigureText.Number(value)} {varied.Unit}";

    /// <summary>A figure of a point; none where the point failed.</summary>
    public static Estimate? FigureOf(SweepPoint point, string name) => point.Figures.FirstOrDefault(f => f.Key == name).Value;

    // What goals ask for, and the probabilities and fidelities that every reader looks for; failure is success read from the other end.
    private static IEnumerable<string> Shown(SweepResult sweep)
    {
        IEnumerable<string> all = sweep.Points.SelectMany(p => p.Figures.Select(f => f.Key)).Distinct();
        string[] goals = [.. sweep.Goals.Select(g => g.Figure).Distinct().Where(f => Has(sweep, f))];
        if (goals.Length > 0 && goals.All(g => g is Failure or "abort"))
            return goals;
        bool yieldMoves = Values(sweep, Yield).Any(e => e.Value < 1 - 1e-12);
        return goals.Concat(all.Where(n => n == Success || n.StartsWith("fidelity ", StringComparison.Ordinal) || (n == Yield && yieldMoves))).Distinct().Where(n => Has(sweep, n));
    }

    private static bool Has(SweepResult sweep, string name) => Values(sweep, name).Any();

    private static IEnumerable<Estimate> Values(SweepResult sweep, string name) => sweep.Points.Select(p => FigureOf(p, name)).OfType<Estimate>().Where(e => double.IsFinite(e.Value));

    private static ChartPoint Point(SweepPoint point, string name) => (FigureOf(point, name), point.Bands.FirstOrDefault(b => b.Name == name)) switch
    {
        (null, _) => new ChartPoint(point.Values[0], double.NaN),
        ({ } e, { } band) => new ChartPoint(point.Values[0], e.Value, band.Low, band.High),
        ({ Label: TruthLabel.Exact } e, _) => new ChartPoint(point.Values[0], e.Value),
        var (e, _) => new ChartPoint(point.Values[0], e.Value, e.Low, e.High),
    };

    private static string Label(SweepResult sweep, string name)
    {
        TruthLabel[] labels = [.. Values(sweep, name).Select(e => e.Label).Distinct()];
        return labels is [TruthLabel.Exact] ? name : $"{name} ({string.Join(", ", labels.Select(Truth.Name))})";
    }

    private static string Description(SweepResult sweep, string[] names, SweepGoal[] goals, double? tolerated)
    {
        Variation varied = sweep.Varied[0];
        IEnumerable<string> courses = names.Select(n =>
        {
            Estimate[] values = [.. Values(sweep, n)];
            return $"{n} goes from {FigureText.Number(values[0].Value)} to {FigureText.Number(values[^1].Value)}";
        });
        string failed = sweep.Points.Count(p => p.Failure is not null) is > 0 and var count ? $" {count} points could not be computed." : "";
        return $"From {Value(varied, varied.From)} to {Value(varied, varied.To)} of {varied.Path}, {string.Join("; ", courses)}."
            + string.Concat(goals.Select(g => $" The line at {FigureText.Number(g.Threshold)} is the goal {g.Text}."))
            + (sweep.Points.Any(p => p.Bands.Count > 0) ? " Shaded bands hold 95 % of what the uncertain conditions allow." : "")
            + (tolerated is { } t ? $" The goal is met up to {Value(varied, t)}." : "") + failed;
    }
}
