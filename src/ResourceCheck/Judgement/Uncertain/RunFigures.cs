using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>All figures of a run by name.</summary>
internal static class RunFigures
{
    /// <summary>The figures of a setup; null when the evaluation is refused.</summary>
    public static IReadOnlyList<NamedFigure>? Of(Setup setup, bool cheats)
    {
        List<Diagnostic> findings = [];
        List<Evaluated> all = RunJudgement.All(setup, findings, cheats, besideIdeal: false);
        return findings.Any(f => f.Severity == Severity.Error) ? null : Of(all);
    }

    /// <summary>The figures of evaluations; where several are put together, the worst, as in results.</summary>
    public static IReadOnlyList<NamedFigure> Of(IReadOnlyList<Evaluated> all) =>
    [
        .. MetricGathering.Checkpoints(all).Select(c => new NamedFigure(new(FigureKind.Checkpoint, FigureBand.Honest, c.Name), c.Fidelity, FigureRange.Probability)),
        .. MetricGathering.Metrics(all).Select(m => OfMetric(FigureBand.Honest, m)),
        .. CaseGathering.Cases(all).SelectMany(c => c.Metrics.Select(m => OfMetric(c.Case, m))),
        new(new(FigureKind.Yield, FigureBand.Honest, "yield"), MetricGathering.Yield(all).Value, FigureRange.Probability),
        .. Times(all),
        .. GoalJudgement.Goals(all).Select(g => new NamedFigure(new(FigureKind.Goal, FigureBand.Honest, g.Result.Text), g.Result.Value, RangeOf(g.Goal.Metric))),
    ];

    private static IEnumerable<NamedFigure> Times(IReadOnlyList<Evaluated> all)
    {
        yield return Time("duration", all.Max(e => e.Setting.Plan.Duration.Seconds));
        double[] paces = [.. RunJudgement.Paces(all)];
        if (paces.Length > 0)
            yield return Time("seconds per kept copy", paces.Max());
    }

    private static NamedFigure Time(string name, double seconds) => new(new(FigureKind.Time, FigureBand.Honest, name), Estimate.Exact(seconds), FigureRange.NotNegative);

    private static NamedFigure OfMetric(string of, MetricResult metric) => new(
        new(FigureKind.Metric, of, metric.Name),
        metric.Estimate,
        metric.Name is "success" or "failure" or "abort" || of != FigureBand.Honest ? FigureRange.Probability : FigureRange.Any);

    private static FigureRange RangeOf(MetricName metric) => metric.Kind == MetricKind.Report ? FigureRange.Any : FigureRange.Probability;
}
