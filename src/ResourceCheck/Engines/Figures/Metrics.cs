using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Figures;

/// <summary>The metrics that figures may name, as plain numbers.</summary>
internal sealed record Metrics(double Success, double Failure, double Abort, double Yield, IReadOnlyList<CheckpointEvaluation> Checkpoints)
{
    /// <summary>Value of a metric other than a report.</summary>
    public double Of(MetricName metric) => metric.Kind switch
    {
        MetricKind.Success => Success,
        MetricKind.Failure => Failure,
        MetricKind.Abort => Abort,
        MetricKind.Yield => Yield,
        MetricKind.Checkpoint => Checkpoints.FirstOrDefault(c => c.Label == metric.Label)?.Fidelity.Value ?? double.NaN, // none when no copy got there
        _ => throw new InvalidOperationException($"{metric} is no metric of the honest case."),
    };
}
