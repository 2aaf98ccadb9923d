using System.Globalization;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>relaxation</c>.</summary>
internal static class RelaxationReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(RelaxationResult relaxation)
    {
        bool sampled = relaxation.Samples is not null;
        string exact = sampled ? "no photon and its fidelity exact, the others as marked" : "all figures exact";
        return new(
            Headline(relaxation),
            null,
            [new Section($"Against time ({exact})", Shown(relaxation.Points, sampled), Remarks(relaxation))],
            Data(relaxation.Points),
            [
                $"ResourceCheck {relaxation.Version}; under {Provenance.File(relaxation.Conditions.Name, relaxation.Conditions.Sha256)}",
                .. relaxation.Overrides.Select(o => $"Set: {o.Key} = {o.Value}"),
                string.Create(CultureInfo.InvariantCulture, $"{relaxation.Emitters} emitters: {relaxation.Method}") + (relaxation.Seed is { } seed ? string.Create(CultureInfo.InvariantCulture, $"; seed {seed}") : ""),
                $"Estimated error of the integration: {FigureText.Number(relaxation.ErrorEstimate, Rounding.Up)}",
            ],
            relaxation.Warnings);
    }

    private static string Headline(RelaxationResult relaxation)
    {
        RelaxationPoint last = relaxation.Points[^1], best = relaxation.Points.MaxBy(p => p.Antisymmetric.Value)!;
        string peak = best == last ? "" : $" It was largest after {FigureText.Time(best.Time)}: {Told(best.Antisymmetric)}.";
        string heralded = $"Copies without a photon, {FigureText.Number(last.NoPhoton)} of all (exact), have fidelity {FigureText.Number(last.PhotonFreeFidelity)} (exact)";
        return $"From {relaxation.Start}, the antisymmetric state of {relaxation.Emitters} emitters has fidelity {Told(last.Antisymmetric)} after {FigureText.Time(last.Time)}."
            + $"{peak} {heralded}{(relaxation.Heralded ? "; these conditions keep them alone" : "")}.";
    }

    private static string Told(Estimate estimate) => $"{FigureText.Number(estimate.Value)} ({Truth.Describe(estimate)})";

    private static Table Shown(IReadOnlyList<RelaxationPoint> points, bool sampled) => new Table(
        [
            new("time", "Time"), new("fidelity", "Fidelity"), new("low", "from"), new("high", "to"), new("symmetric", "All +"), new("independent", "Each alone"),
            new("no_photon", "No photon"), new("photon_free_fidelity", "its fidelity"), new("excited", "Excited"), new("label", "Label"),
        ],
        [.. CurveRows.Shown(points).Select(p => (IReadOnlyList<Cell>)[
            Cell.Of(p.Time, "s"), Cell.Of(p.Antisymmetric.Value),
            sampled ? Cell.Of(p.Antisymmetric.Low, rounding: Rounding.Down) : Cell.Empty, sampled ? Cell.Of(p.Antisymmetric.High, rounding: Rounding.Up) : Cell.Empty,
            Cell.Of(p.Symmetric.Value), Cell.Of(p.Independent.Value), Cell.Of(p.NoPhoton), Cell.Of(p.PhotonFreeFidelity), Cell.Of(p.Excited.Value),
            sampled ? Cell.Of(Truth.Name(p.Antisymmetric.Label)) : Cell.Empty])]).WithoutEmptyColumns();

    private static Table Data(IReadOnlyList<RelaxationPoint> points) => new(
        [
            new("time", "Time", "s"),
            .. Columns("antisymmetric"), .. Columns("symmetric"), .. Columns("independent"),
            new("no_photon", "No photon"), new("photon_free_fidelity", "Fidelity without a photon"),
            .. Columns("excited"),
        ],
        [.. points.Select(p => (IReadOnlyList<Cell>)[
            Cell.Of(p.Time, "s"), .. Cells(p.Antisymmetric), .. Cells(p.Symmetric), .. Cells(p.Independent), Cell.Of(p.NoPhoton), Cell.Of(p.PhotonFreeFidelity), .. Cells(p.Excited)])]);

    private static Column[] Columns(string id) => [new(id, id), new($"{id}_low", id), new($"{id}_high", id), new($"{id}_label", id)];

    private static Cell[] Cells(Estimate estimate) => [Cell.Of(estimate.Value), Cell.Of(estimate.Low), Cell.Of(estimate.High), Cell.Of(Truth.Name(estimate.Label))];

    private static IReadOnlyList<string> Remarks(RelaxationResult relaxation) =>
    [
        "Fidelity is of all copies. \"All +\" is the population of the counterpart with all signs +, \"each alone\" the fidelity when the emitters decay independently, \"excited\" the mean number of emitters in level 0. Heralding on no photon keeps the part \"no photon\" of the copies.",
        .. relaxation.Samples is null ? Array.Empty<string>() : [$"Intervals hold with {FigureText.Number(100 * relaxation.Points[^1].Antisymmetric.Confidence)} % each, not together; files for programs hold those of every figure."],
        .. relaxation.WithoutShifts ? ["The shape is one point, the limit of no distance: exchange shifts are left out."] : Array.Empty<string>(),
    ];
}
