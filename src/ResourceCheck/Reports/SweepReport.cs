using ResourceCheck.Engines;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>sweep</c>: a row for each point, a column for each figure.</summary>
internal static class SweepReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(SweepResult sweep) => new(
        Headline(sweep),
        null,
        [new Section(null, Points(sweep, shown: true), Remarks(sweep))],
        Points(sweep, shown: false),
        Provenance.Of(sweep),
        sweep.Warnings);

    private static string Headline(SweepResult sweep)
    {
        int met = sweep.Points.Count(p => p is { GoalsMet: true, Undecided: false }), judged = sweep.Points.Count(p => p.GoalsMet is not null), failed = sweep.Points.Count(p => p.Failure is not null);
        int open = sweep.Points.Count(p => p.Undecided);
        string goals = judged == 0 ? "no goal is set" : $"all goals are met at {met} of {judged}{(open == 0 ? "" : $", {open} more are undecided")}";
        return $"{sweep.Points.Count} points of {string.Join(" and ", sweep.Varied.Select(v => v.Path))}: {goals}{(failed == 0 ? "" : $"; {failed} could not be computed")}.";
    }

    private static Table Points(SweepResult sweep, bool shown)
    {
        string[] names = [.. sweep.Points.SelectMany(p => p.Figures.Select(f => f.Key)).Distinct()];
        bool banded = sweep.Points.Any(p => p.Bands.Count > 0);
        return new Table(
            [
                .. sweep.Varied.Select(v => new Column(v.Path, v.Unit.Length == 0 ? v.Path : $"{v.Path}, {v.Unit}", v.Unit)),
                .. names.SelectMany(n => Columns(n, shown, banded)),
                new("goals", "Goals"),
                new("failure", "Failure"),
            ],
            [.. sweep.Points.Select(p => (IReadOnlyList<Cell>)
            [
                .. p.Values.Select(v => Cell.Of(v, "")),
                .. names.SelectMany(n => Cells(p, n, shown, banded)),
                Cell.Of((p.Undecided, p.GoalsMet) switch { (true, _) => "undecided", (_, true) => "met", (_, false) => "not met", _ => null }),
                Cell.Of(p.Failure),
            ])]);
    }

    private static IEnumerable<Column> Columns(string name, bool shown, bool banded) =>
    [
        new(name, name),
        .. shown ? Array.Empty<Column>() : [new($"{name} label", $"{name}, label"), new($"{name} low", $"{name}, low"), new($"{name} high", $"{name}, high")],
        .. banded ? [new($"{name} uncertainty", "±")] : Array.Empty<Column>(),
        .. banded && !shown ? [new($"{name} band low", $"{name}, band from"), new($"{name} band high", $"{name}, band to")] : Array.Empty<Column>(),
    ];

    private static IEnumerable<Cell> Cells(SweepPoint point, string name, bool shown, bool banded)
    {
        Estimate? estimate = point.Figures.FirstOrDefault(f => f.Key == name).Value;
        PointBand? band = point.Bands.FirstOrDefault(b => b.Name == name);
        yield return estimate is null ? Cell.Empty : shown ? Truth.CellOf(estimate) : Cell.Of(estimate.Value);
        if (!shown)
        {
            yield return Cell.Of(estimate is null ? null : Truth.Name(estimate.Label));
            yield return Cell.Of(estimate?.Low);
            yield return Cell.Of(estimate?.High);
        }

        if (banded)
            yield return shown ? Cell.Of(band is null ? null : FigureText.Uncertainty(band.StandardUncertainty)) : Cell.Of(band?.StandardUncertainty);
        if (banded && !shown)
        {
            yield return Cell.Of(band?.Low);
            yield return Cell.Of(band?.High);
        }
    }

    // One sentence per label in place of one word per cell.
    private static IReadOnlyList<string> Remarks(SweepResult sweep)
    {
        var labels = sweep.Points.SelectMany(p => p.Figures).GroupBy(f => f.Value.Label).ToDictionary(g => g.Key, g => g.Select(f => f.Key).Distinct().ToArray());
        string[] bands = sweep.Points.Any(p => p.Bands.Count > 0) ? ["± is the standard uncertainty from the uncertain values, to first order (linear); files hold the 95 % bands. A point is undecided where a goal is missed at one end of its band only."] : [];
        return labels.Count == 1 && labels.ContainsKey(TruthLabel.Exact) ? ["All figures are exact.", .. bands]
            : [.. bands, .. labels.Select(l => $"{char.ToUpperInvariant(Truth.Name(l.Key)[0])}{Truth.Name(l.Key)[1..]}: {string.Join(", ", l.Value)}.")];
    }
}
