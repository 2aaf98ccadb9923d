using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;

namespace ResourceCheck.Figures;

/// <summary>Figures of tolerances, numbers of copies, storage and relaxation.</summary>
internal static class CurveFigures
{
    /// <summary>The goal's figure against what is varied.</summary>
    public static FigureImage Of(ToleranceResult tolerance, string id)
    {
        Variation varied = tolerance.Varied;
        string crossings = tolerance.Crossings.Count == 0
            ? tolerance.MetAt.From ? "the goal is met everywhere" : "the goal is met nowhere"
            : $"the goal is just met at {string.Join(", ", tolerance.Crossings.Select(c => SweepFigures.Value(varied, c.Value)))}";
        return ChartPlot.Of(new Chart(
            id,
            $"{tolerance.Title}: {tolerance.Figure} against {varied.Path}, and where the goal is just met",
            $"From {SweepFigures.Value(varied, varied.From)} to {SweepFigures.Value(varied, varied.To)} of {varied.Path}, {tolerance.Figure} goes from {FigureText.Number(tolerance.Scan[0].Figure.Value)} to {FigureText.Number(tolerance.Scan[^1].Figure.Value)}; {crossings}. The goal is {tolerance.Goal}.",
            new ChartAxis(SweepFigures.AxisTitle(varied), varied.IsLogarithmic, varied.WholeOnly),
            new ChartAxis(tolerance.Figure),
            [new ChartSeries(tolerance.Figure, [.. tolerance.Scan.Select(p => Point(p.Value, p.Figure))], !varied.WholeOnly)],
            [new ChartLine(tolerance.Threshold, $"goal: {tolerance.Goal}"), .. tolerance.Crossings.Select(c => new ChartLine(c.Value, $"just met at {SweepFigures.Value(varied, c.Value)}", IsVertical: true))]));
    }

    /// <summary>Honest failure and the worst harm against the number of copies.</summary>
    public static FigureImage Of(CopiesResult copies, string id)
    {
        CopiesStep[] harms = [.. copies.Steps.Where(s => s.Harm is not null)];
        double last = copies.Steps[^1].Failure.Value;
        return ChartPlot.Of(new Chart(
            id,
            $"{copies.Title}: failure against the number of copies",
            $"Honest failure falls from {FigureText.Number(copies.Steps[0].Failure.Value)} at {copies.Steps[0].Copies} copies to {FigureText.Number(last)} at {copies.Steps[^1].Copies}. The targets hold from {copies.Copies} copies on.",
            new ChartAxis($"copies kept, {copies.Parameter}", WholeOnly: true),
            new ChartAxis("failure probability", IsLogarithmic: true),
            [
                new ChartSeries("honest failure", [.. copies.Steps.Select(s => Point(s.Copies, s.Failure))]),
                .. harms.Length == 0 ? [] : new[] { new ChartSeries("worst harm of the listed strategies (bound, at most)", [.. harms.Select(s => Point(s.Copies, s.Harm!))]) },
            ],
            [
                new ChartLine(copies.Targets.Failure, copies.Targets.Harm == copies.Targets.Failure ? "target" : "target of failure"),
                .. copies.Targets.Harm < 1 && copies.Targets.Harm != copies.Targets.Failure ? [new ChartLine(copies.Targets.Harm, "target of harm")] : Array.Empty<ChartLine>(),
                new ChartLine(copies.Copies, $"{copies.Copies} copies", IsVertical: true),
            ]));
    }

    /// <summary>Numbers of copies against a varied value.</summary>
    public static FigureImage? Of(CopiesTable copies, string id)
    {
        CopiesRow[] found = [.. copies.Rows.Where(r => r.Copies is not null)];
        if (copies.Varied is not { } varied || found.Length == 0)
            return null;
        return ChartPlot.Of(new Chart(
            id,
            $"{copies.Title}: copies against {varied.Path}",
            $"From {SweepFigures.Value(varied, varied.From)} to {SweepFigures.Value(varied, varied.To)} of {varied.Path}, "
                + $"{string.Join("; ", found.GroupBy(r => r.Targets).Select(g => $"a failure of at most {FigureText.Number(g.Key.Failure)} takes {g.First().Copies} to {g.Last().Copies} copies"))}."
                + (found.Length < copies.Rows.Count ? " Where points are missing no number of copies was found." : ""),
            new ChartAxis(SweepFigures.AxisTitle(varied), varied.IsLogarithmic, varied.WholeOnly),
            new ChartAxis($"copies kept, {copies.Parameter}", IsLogarithmic: true),
            [
                .. copies.Rows.GroupBy(r => r.Targets).Take(PlotStyle.MostSeries).Select(g => new ChartSeries(
                    $"failure at most {FigureText.Number(g.Key.Failure)}", [.. g.Select(r => new ChartPoint(r.Value!.Value, r.Copies ?? double.NaN))])),
            ],
            []));
    }

    /// <summary>Storage side by side against time.</summary>
    public static FigureImage Of(StorageResult storage, string id)
    {
        (double size, string unit) = TimeUnit.For(storage.Points[^1].Time);
        StoragePoint last = storage.Points[^1];
        return ChartPlot.Of(new Chart(
            id,
            $"Fidelity of {storage.Emitters} emitters stored side by side, against time",
            $"After {FigureText.Time(last.Time)} the antisymmetric state has fidelity {FigureText.Number(last.Fidelity)}, its counterpart with all signs + {FigureText.Number(last.SymmetricFidelity)}, emitters that decay each alone {FigureText.Number(last.Independent)}. All exact.",
            new ChartAxis($"storage time ({unit})"),
            new ChartAxis("fidelity"),
            [
                Series("antisymmetric", p => p.Fidelity),
                .. storage.Heralded ? [Series("antisymmetric, if no photon", p => p.PhotonFreeFidelity)] : Array.Empty<ChartSeries>(),
                Series("all signs +", p => p.SymmetricFidelity),
                Series("each alone", p => p.Independent),
            ],
            []));

        ChartSeries Series(string name, Func<StoragePoint, double> value) => new(name, [.. storage.Points.Select(p => new ChartPoint(p.Time / size, value(p)))]);
    }

    /// <summary>Relaxation by shared decay against time.</summary>
    public static FigureImage Of(RelaxationResult relaxation, string id)
    {
        (double size, string unit) = TimeUnit.For(relaxation.Points[^1].Time);
        RelaxationPoint last = relaxation.Points[^1];
        return ChartPlot.Of(new Chart(
            id,
            $"Populations of {relaxation.Emitters} emitters that relax together, against time",
            $"After {FigureText.Time(last.Time)} the antisymmetric state holds {FigureText.Number(last.Antisymmetric.Value)}, its counterpart with all signs + {FigureText.Number(last.Symmetric.Value)}; without a photon are {FigureText.Number(last.NoPhoton)} of the copies.",
            new ChartAxis($"time ({unit})"),
            new ChartAxis("population"),
            [
                Series("antisymmetric", p => p.Antisymmetric),
                Series("all signs +", p => p.Symmetric),
                Series("antisymmetric, each alone", p => p.Independent),
                Series("no photon", p => Estimate.Exact(p.NoPhoton)),
            ],
            []));

        ChartSeries Series(string name, Func<RelaxationPoint, Estimate> value) => new(name, [.. relaxation.Points.Select(p => Point(p.Time / size, value(p)))]);
    }

    private static ChartPoint Point(double x, Estimate e) => e.Label == TruthLabel.Exact ? new ChartPoint(x, e.Value) : new ChartPoint(x, e.Value, e.Low, e.High);
}
