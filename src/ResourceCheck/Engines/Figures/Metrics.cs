using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Figures;

/// <summary>The metrics that figures may name.</summary>
internal sealed record Metrics(Estimate Success, Estimate Failure, Estimate Abort, double Yield, IReadOnlyList<CheckpointEvaluation> Checkpoints)
{
    /// <summary>A metric other than a report.</summary>
    public Estimate Of(MetricName metric) => metric.Kind switch
    {
        MetricKind.Success => Success,
        MetricKind.Failure => Failure,
        MetricKind.Abort => Abort,
        MetricKind.Yield => Estimate.Exact(Yield),
        MetricKind.Checkpoint => Checkpoints.FirstOrDefault(c => c.Label == metric.Label)?.Fidelity ?? Estimate.Exact(double.NaN), // none when no copy got there
        _ => Estimate.Exact(double.NaN), // harms are no figure of the honest case; claims on them are decided by VerifyJudgement
    };
}
