using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Puts the evaluations of all inputs and listed parameter values together: the least success, fidelity and yield, the greatest failure and abort, both ends of reports.</summary>
internal static class MetricGathering
{
    public static IReadOnlyList<MetricResult> Metrics(IReadOnlyList<Evaluated> all)
    {
        List<MetricResult> metrics =
        [
            Worst("success", all, e => e.Success, greatest: false),
            Worst("failure", all, e => e.Failure, greatest: true),
            Worst("abort", all, e => e.Abort, greatest: true),
        ];
        foreach (string label in all.SelectMany(e => e.Setting.Protocol.Reports.Select(r => r.Label)).Distinct())
            metrics.Add(Report(label, all));
        return metrics;
    }

    public static IReadOnlyList<CheckpointResult> Checkpoints(IReadOnlyList<Evaluated> all) =>
        [.. all.SelectMany(e => PlanLabels.Of(e.Setting.Plan)).Distinct().Select(label => Checkpoint(label, all))];

    public static YieldResult Yield(IReadOnlyList<Evaluated> all)
    {
        Evaluation worst = all.MinBy(e => e.Actual.Yield)!.Actual;
        return new YieldResult(Estimate.Exact(worst.Yield), worst.Heralded, worst.Seen, worst.Kept, worst.Seen < 1 - 1e-12) { Range = Range(all.Select(e => e.Actual.Yield)) };
    }

    private static MetricResult Worst(string name, IReadOnlyList<Evaluated> all, Func<Evaluation, Estimate> figure, bool greatest)
    {
        Evaluated worst = all.MinBy(e => (greatest ? -1 : 1) * figure(e.Actual).Value)!;
        (double Low, double High)? range = Range(all.Select(e => figure(e.Actual).Value));
        return new MetricResult(name, figure(worst.Actual), Defined(figure(worst.Ideal).Value), range, range is null ? null : worst.At); // where all are alike none is the worst
    }

    private static MetricResult Report(string label, IReadOnlyList<Evaluated> all)
    {
        MetricName name = new(MetricKind.Report, label);
        Evaluated[] having = [.. all.Where(e => e.Figure(name) is not null)];
        Evaluated least = having.MinBy(e => e.Figure(name)!.Value)!;
        return new MetricResult(label, least.Figure(name)!, Defined((least with { Actual = least.Ideal }).Figure(name)?.Value ?? double.NaN), Range(having.Select(e => e.Figure(name)!.Value)), null); // which end is the worse one only a goal could tell
    }

    private static CheckpointResult Checkpoint(string label, IReadOnlyList<Evaluated> all)
    {
        (Evaluated Of, CheckpointEvaluation Look)[] looks = [.. all.SelectMany(e => e.Actual.Checkpoints.Where(c => c.Label == label).Select(c => (e, c)))];
        if (looks.Length == 0)
            return new CheckpointResult(label, Estimate.Exact(double.NaN), Ideal(label, all[0]), null, 0, double.NaN, [], false);
        (Evaluated worst, CheckpointEvaluation look) = looks.MinBy(pair => pair.Look.Fidelity.Value);
        double? ideal = Ideal(label, worst);
        bool builtIn = worst.Actual.Checkpoints.Take(BuiltIn).Any(c => c.Label == label);
        return new CheckpointResult(label, look.Fidelity, ideal, ideal - look.Fidelity.Value, look.Kept, look.At, look.Branches, builtIn) { Range = Range(looks.Select(l => l.Look.Fidelity.Value)) };
    }

    private static double? Ideal(string label, Evaluated at) => Defined(at.Ideal.Checkpoints.FirstOrDefault(c => c.Label == label)?.Fidelity.Value ?? double.NaN);

    /// <summary>Under ideal conditions a figure may be undefined although it is not under these.</summary>
    private static double? Defined(double value) => double.IsNaN(value) ? null : value;

    /// <summary>Values closer than this differ by the order of their sums alone.</summary>
    private const double RoundOff = 1e-12;

    /// <summary>prepared, stored, arrived.</summary>
    internal const int BuiltIn = 3;

    internal static (double Low, double High)? Range(IEnumerable<double> values)
    {
        double[] found = [.. values];
        return found.Length < 2 || found.Max() - found.Min() < RoundOff ? null : (found.Min(), found.Max());
    }
}
