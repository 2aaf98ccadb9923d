using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Dense;

/// <summary>A checkpoint's sums over branches.</summary>
internal sealed class Look(string label, double at, History history)
{
    /// <summary>Histories kept per checkpoint in results; the rest adds up to little and would only fill the document.</summary>
    private const int BranchesTold = 256;

    private const double Nothing = 1e-14;

    private double _overlap;

    public string Label { get; } = label;

    /// <summary>Probability of getting here, so far.</summary>
    public double Weight { get; private set; }

    public void Add(Value[] slots, double weight, double overlap)
    {
        Weight += weight;
        _overlap += overlap;
        history.Add(slots, weight, overlap);
    }

    /// <summary>An overlap of nothing is the round-off of a sum of terms of order one.</summary>
    private static double Whole(double fidelity) => Math.Abs(fidelity) < Nothing ? 0 : fidelity;

    public CheckpointEvaluation Conclude() =>
        new(Label, Estimate.Exact(Tally.Clip(Whole(Tally.Ratio(_overlap, Weight)))), Tally.Clip(Weight), at, [.. history.MostProbable(Weight, BranchesTold)]);
}
