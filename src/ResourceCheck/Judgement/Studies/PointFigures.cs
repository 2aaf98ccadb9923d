using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
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
        bool[] met = [.. GoalJudgement.Goals(all).Where(g => g.Goal.Metric.Kind != MetricKind.Harm).Select(g => g.Result.Met)];
        return new SweepPoint(values, [.. Figures(all)], met.Length == 0 ? null : met.All(m => m), null);
    }

    /// <summary>Name of a metric among the figures of a point.</summary>
    public static string Name(MetricName metric) => metric.Kind switch
    {
        MetricKind.Checkpoint => $"fidelity {metric.Label}",
        MetricKind.Report => metric.Label,
        _ => metric.ToString(),
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
