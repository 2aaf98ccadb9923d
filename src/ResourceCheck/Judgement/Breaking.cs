using ResourceCheck.Engines;
using ResourceCheck.Engines.Figures;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Judgement;

/// <summary>The outcomes that break a claim: for success those in which it fails, for a probability those that are too frequent, for a checkpoint those with the lowest fidelity, else the most probable histories, which a mean or a guess is made of.</summary>
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

    /// <summary>
    /// What to judge as success so that its failures are the outcomes that break a claim on one probability: those in which the condition
    /// holds where it is too probable, those in which it does not where it is too improbable. Null for any other claim.
    /// </summary>
    public static BoundExpression? WouldMend(Claim claim, Protocol protocol, double left, double right)
    {
        (Figure figure, bool tooGreat) = claim.Right is NumberFigure ? (claim.Left, left > right) : (claim.Right, right > left);
        if (figure is MetricFigure { Metric: { Kind: MetricKind.Report } named })
            figure = protocol.Reports.First(r => r.Label == named.Label).Figure;
        // An abort counts as a failure whatever the condition, so it would be told as breaking where it is not.
        if (figure is not ProbabilityFigure probability || protocol.Lists is not null || MayAbort(protocol.Steps))
            return null;
        BoundExpression outside = probability.Given is { } given ? Not(given) : new BoundLiteral(probability.Span, new TruthValue(false));
        return new BoundBinary(probability.Span, BinaryOperator.Or, outside, tooGreat ? Not(probability.Condition) : probability.Condition);
    }

    private static BoundUnary Not(BoundExpression condition) => new(condition.Span, UnaryOperator.Not, condition);

    private static bool MayAbort(IReadOnlyList<Step> steps) => steps.Any(s => s is AbortStep || s is WhenStep block && (MayAbort(block.Then) || MayAbort(block.Otherwise)));

    private static IReadOnlyList<BranchEvaluation> Lowest(CheckpointEvaluation look, int count) =>
        [.. look.Branches.Where(b => b.Fidelity < 1 - Equality).OrderBy(b => Math.Round(b.Fidelity!.Value, 12)).ThenByDescending(b => b.Probability).Take(count)];
}
