using ResourceCheck.Engines;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Judgement;

/// <summary>Holds goals against the evaluations and puts the verdict into words.</summary>
internal static class GoalJudgement
{
    /// <summary>A figure that misses its goal by less than sums of some thousand terms lose to rounding has not missed it.</summary>
    private const double RoundOff = 1e-12;

    /// <summary>Each goal with the evaluation that comes off worst.</summary>
    public static IReadOnlyList<(Goal Goal, GoalResult Result)> Goals(IReadOnlyList<Evaluated> all) =>
        [.. all.SelectMany(e => e.Setting.Protocol.Goals).DistinctBy(g => g.Text).Select(goal => (goal, Judge(goal, all)))];

    /// <summary>The verdict in one sentence.</summary>
    public static string Sentence(IReadOnlyList<(Goal Goal, GoalResult Result)> goals, IReadOnlyList<Evaluated> all)
    {
        if (goals.Count == 0)
            return NoGoal(all);
        (Goal Goal, GoalResult Result)[] missed = [.. goals.Where(g => !g.Result.Met)];
        (Goal goal, GoalResult result) = (missed.Length > 0 ? missed : goals).MinBy(g => g.Result.Margin);
        string head = (missed.Length, goals.Count) switch
        {
            (0, 1) => "Goal met:",
            (0, int count) => $"All {count} goals met; the closest:",
            (_, 1) => "Goal not met:",
            (int count, int whole) => $"{count} of {whole} goals not met; the furthest:",
        };
        return $"{head} {Name(goal.Metric)} is {Value(result.Value, goal.Metric)}, the goal is {(goal.Comparison == BinaryOperator.GreaterOrEqual ? "at least" : "at most")} {FigureText.Number(goal.Threshold)}.";
    }

    /// <summary>A metric as sentences name it.</summary>
    public static string Name(MetricName metric) => metric.Kind == MetricKind.Checkpoint ? $"fidelity {metric}" : metric.ToString();

    private static GoalResult Judge(Goal goal, IReadOnlyList<Evaluated> all) =>
        all.Where(e => e.Setting.Protocol.Goals.Any(g => g.Text == goal.Text)).Select(e => Judge(goal, e)).MinBy(r => double.IsNaN(r.Margin) ? double.NegativeInfinity : r.Margin)!;

    private static GoalResult Judge(Goal goal, Evaluated evaluated)
    {
        Estimate value = evaluated.Figure(goal.Metric) ?? Estimate.Exact(double.NaN);
        bool least = goal.Comparison == BinaryOperator.GreaterOrEqual;
        double margin = least ? value.Value - goal.Threshold : goal.Threshold - value.Value;
        bool sideFits = double.IsFinite(least ? value.Low : value.High); // an upper bound proves no "at least", and the reverse
        return new GoalResult(goal.Text, value, goal.Threshold, margin >= -RoundOff && sideFits, margin);
    }

    private static string NoGoal(IReadOnlyList<Evaluated> all)
    {
        double success = all.Min(e => e.Actual.Success.Value);
        CheckpointEvaluation? last = all[0].Actual.Checkpoints.Skip(3).LastOrDefault();
        string fidelity = last is null ? "" : $", fidelity \"{last.Label}\" is {FigureText.Number(all.Min(e => e.Actual.Checkpoints.FirstOrDefault(c => c.Label == last.Label)?.Fidelity.Value ?? 1))}";
        return $"No goal set: success is {FigureText.Number(success)}{fidelity}.";
    }

    private static string Value(Estimate value, MetricName metric) => value switch
    {
        { Value: double.NaN } => metric.Kind == MetricKind.Checkpoint ? "undefined (never reached)" : "undefined",
        { Label: TruthLabel.Bound } => $"{(double.IsFinite(value.Low) ? "at least" : "at most")} {FigureText.Number(value.Value)}",
        _ => FigureText.Number(value.Value),
    };
}
