using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>The figure that advice is about: that of the goal with the least margin, else the last checkpoint, else success.</summary>
internal static class MetricChoice
{
    public static MetricName Of(IReadOnlyList<(Goal Goal, GoalResult Result)> goals, IReadOnlyList<Evaluated> all)
    {
        if (goals.Count > 0)
            return goals.MinBy(g => g.Result.Margin).Goal.Metric;
        CheckpointEvaluation? last = all[0].Actual.Checkpoints.Skip(MetricGathering.BuiltIn).LastOrDefault();
        return last is null ? new MetricName(MetricKind.Success, "") : new MetricName(MetricKind.Checkpoint, last.Label);
    }

    /// <summary>+1 when more is better.</summary>
    public static int Sign(MetricName metric) => metric.Kind is MetricKind.Failure or MetricKind.Abort or MetricKind.Harm ? -1 : 1;

    /// <summary>The sign that a goal on the metric asks for; reports have no better end of their own.</summary>
    public static int Sign(MetricName metric, IEnumerable<Goal> goals) => goals.FirstOrDefault(g => g.Metric == metric) is { } goal
        ? goal.Comparison == Scripts.Syntax.BinaryOperator.GreaterOrEqual ? 1 : -1
        : Sign(metric);
}
