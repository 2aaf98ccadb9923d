using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Evaluates one point of a sweep.</summary>
internal static class PointFigures
{
    /// <summary>The point; harms are left out, since each would be searched anew.</summary>
    public static SweepPoint Of(IReadOnlyList<double> values, RunRequest request)
    {
        Outcome<Setup> setup = Setup.From(request);
        List<Diagnostic> findings = [.. setup.Findings];
        List<Evaluated> all = setup.Value is { } read ? RunJudgement.All(read, findings, cheats: false) : [];
        if (findings.FirstOrDefault(f => f.Severity == Severity.Error) is { } error)
            return new SweepPoint(values, [], null, $"{error.Message} ({error.Code})");
        (Goal Goal, GoalResult Result)[] goals = [.. GoalJudgement.Goals(all).Where(g => g.Goal.Metric.Kind != MetricKind.Harm)];
        SweepPoint point = new(values, [.. Figures(all)], goals.Length == 0 ? null : goals.All(g => g.Result.Met), null);
        return request.Uncertainty is null ? point : WithBands(point, setup.Value!, all, goals);
    }

    /// <summary>Name of a metric among the figures of a point.</summary>
    public static string Name(MetricName metric) => metric.Kind switch
    {
        MetricKind.Checkpoint => $"fidelity {metric.Label}",
        MetricKind.Report => metric.Label,
        _ => metric.ToString(),
    };

    private static SweepPoint WithBands(SweepPoint point, Setup setup, IReadOnlyList<Evaluated> all, IReadOnlyList<(Goal Goal, GoalResult Result)> goals)
    {
        Outcome<UncertaintyResult> found = UncertaintyJudgement.Of(setup, RunFigures.Of(all), null, samples: 0, s => RunFigures.Of(s, cheats: false));
        return found.Value is not { } uncertainty ? new SweepPoint(point.Values, [], null, $"{found.Findings[0].Message} ({found.Findings[0].Code})") : point with
        {
            Bands = [.. uncertainty.Figures.Where(f => point.Figures.Any(p => p.Key == NameOf(f))).Select(f => new PointBand(NameOf(f), f.StandardUncertainty, f.Low, f.High))],
            Undecided = GoalJudgement.VerdictOf(GoalJudgement.WithBands(goals, uncertainty)) == Verdict.Undecided,
        };
    }

    /// <summary>The name under which a point shows a figure; that of a goal is shown nowhere.</summary>
    private static string NameOf(FigureBand figure) => figure.Kind switch
    {
        FigureKind.Checkpoint => $"fidelity {figure.Name}",
        FigureKind.Metric or FigureKind.Yield => figure.Name,
        _ => "",
    };

    private static IEnumerable<KeyValuePair<string, Estimate>> Figures(IReadOnlyList<Evaluated> all)
    {
        foreach (MetricResult metric in MetricGathering.Metrics(all))
            yield return new(metric.Name, metric.Estimate);
        yield return new("yield", MetricGathering.Yield(all).Value);
        foreach (CheckpointResult look in MetricGathering.Checkpoints(all).Where(c => !c.BuiltIn || c.Name == "arrived"))
            yield return new($"fidelity {look.Name}", look.Fidelity);
    }
}
