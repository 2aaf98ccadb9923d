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
        int met = sweep.Points.Count(p => p.GoalsMet == true), judged = sweep.Points.Count(p => p.GoalsMet is not null), failed = sweep.Points.Count(p => p.Failure is not null);
        string goals = judged == 0 ? "no goal is set" : $"all goals are met at {met} of {judged}";
        return $"{sweep.Points.Count} points of {string.Join(" and ", sweep.Varied.Select(v => v.Path))}: {goals}{(failed == 0 ? "" : $"; {failed} could not be computed")}.";
    }

    private static Table Points(SweepResult sweep, bool shown)
    {
        string[] names = [.. sweep.Points.SelectMany(p => p.Figures.Select(f => f.Key)).Distinct()];
        return new Table(
            [
                .. sweep.Varied.Select(v => new Column(v.Path, v.Unit.Length == 0 ? v.Path : $"{v.Path}, {v.Unit}", v.Unit)),
                .. names.SelectMany(n => shown ? [new Column(n, n)] : new[] { new Column(n, n), new Column($"{n} label", $"{n}, label"), new Column($"{n} low", $"{n}, low"), new Column($"{n} high", $"{n}, high") }),
                new("goals", "Goals"),
                new("failure", "Failure"),
            ],
            [.. sweep.Points.Select(p => (IReadOnlyList<Cell>)
            [
                .. p.Values.Select(v => Cell.Of(v, "")),
                .. names.SelectMany(n => Cells(p.Figures.FirstOrDefault(f => f.Key == n).Value, shown)),
                Cell.Of(p.GoalsMet switch { true => "met", false => "not met", _ => null }),
                Cell.Of(p.Failure),
            ])]);
    }

    private static IEnumerable<Cell> Cells(Estimate? estimate, bool shown)
    {
        if (estimate is null)
            return Enumerable.Repeat(Cell.Empty, shown ? 1 : 4);
        return shown ? [Truth.CellOf(estimate)] : [Cell.Of(estimate.Value), Cell.Of(Truth.Name(estimate.Label)), Cell.Of(estimate.Low), Cell.Of(estimate.High)];
    }

    // One sentence per label in place of one word per cell.
    private static IReadOnlyList<string> Remarks(SweepResult sweep)
    {
        var labels = sweep.Points.SelectMany(p => p.Figures).GroupBy(f => f.Value.Label).ToDictionary(g => g.Key, g => g.Select(f => f.Key).Distinct().ToArray());
        return labels.Count == 1 && labels.ContainsKey(TruthLabel.Exact) ? ["All figures are exact."]
            : [.. labels.Select(l => $"{char.ToUpperInvariant(Truth.Name(l.Key)[0])}{Truth.Name(l.Key)[1..]}: {string.Join(", ", l.Value)}.")];
    }
}
