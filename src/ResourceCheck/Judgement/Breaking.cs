using ResourceCheck.Engines;
using ResourceCheck.Engines.Figures;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>The outcomes that break a claim: for success those in which it fails, for a checkpoint those with the lowest fidelity, else the most probable histories of the figure's conditions.</summary>
internal static class Breaking
{
    private const double Equality = 1e-9;

    public static IReadOnlyList<BranchEvaluation> Of(Claim claim, Protocol protocol, Evaluation evaluation, int count)
    {
        MetricName[] metrics = [.. new[] { claim.Left, claim.Right }.SelectMany(FigureTally.Leaves).OfType<MetricFigure>().Select(f => f.Metric)];
        if (metrics.FirstOrDefault(m => m.Kind == MetricKind.Checkpoint) is { } look)
            return evaluation.Checkpoints.FirstOrDefault(c => c.Label == look.Label) is { } reached ? Lowest(reached, count) : [];
        if (metrics.Any(m => m.Kind is MetricKind.Success or MetricKind.Failure or MetricKind.Abort))
            return [.. evaluation.Failures.Take(count)];
        return [.. evaluation.Ends.Take(count)];
    }

    private static IReadOnlyList<BranchEvaluation> Lowest(CheckpointEvaluation look, int count) =>
        [.. look.Branches.Where(b => b.Fidelity < 1 - Equality).OrderBy(b => Math.Round(b.Fidelity!.Value, 12)).ThenByDescending(b => b.Probability).Take(count)];
}
