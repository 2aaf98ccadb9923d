using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
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

    /// <summary>The goals with the bands of their figures. A goal is undecided when it is met at one end of its band and missed at the other.</summary>
    public static IReadOnlyList<(Goal Goal, GoalResult Result)> WithBands(IReadOnlyList<(Goal Goal, GoalResult Result)> goals, UncertaintyResult? uncertainty) =>
        uncertainty is null ? goals : [.. goals.Select(g => (g.Goal, WithBand(g.Goal, g.Result, uncertainty.Find(FigureKind.Goal, g.Result.Text))))];

    private static GoalResult WithBand(Goal goal, GoalResult result, FigureBand? band) => band is null ? result : result with
    {
        Band = band,
        Undecided = IsUndecided(goal, result, band),
    };

    /// <summary>Whether a goal is met at one end of a band and missed at the other; never where the figure is a bound from the wrong side.</summary>
    public static bool IsUndecided(Goal goal, GoalResult result, FigureBand band) =>
        SideFits(goal, result.Value) && (Margin(goal, band.Least) >= -RoundOff) != (Margin(goal, band.Greatest) >= -RoundOff);

    /// <summary>What the goals come to together.</summary>
    public static Verdict VerdictOf(IReadOnlyList<(Goal Goal, GoalResult Result)> goals) => goals switch
    {
        [] => Verdict.NoGoals,
        _ when goals.Any(g => g.Result is { Met: false, Undecided: false }) => Verdict.NotMet,
        _ when goals.Any(g => g.Result.Undecided) => Verdict.Undecided,
        _ => Verdict.Met,
    };

    /// <summary>The verdict in one sentence.</summary>
    public static string Sentence(IReadOnlyList<(Goal Goal, GoalResult Result)> goals, IReadOnlyList<Evaluated> all)
    {
        if (goals.Count == 0)
            return NoGoal(all);
        (Goal Goal, GoalResult Result)[] missed = [.. goals.Where(g => g.Result is { Met: false, Undecided: false })], open = [.. goals.Where(g => g.Result.Undecided)];
        (Goal goal, GoalResult result) = (missed.Length > 0 ? missed : open.Length > 0 ? open : goals).MinBy(g => g.Result.Margin);
        string head = (missed.Length, open.Length, goals.Count) switch
        {
            (0, 0, 1) => "Goal met:",
            (0, 0, int count) => $"All {count} goals met; the closest:",
            (0, _, 1) => "Goal undecided:",
            (0, int count, int whole) => $"{count} of {whole} goals undecided, the others met; the one most in doubt:",
            (_, _, 1) => "Goal not met:",
            (int count, 0, int whole) => $"{count} of {whole} goals not met; the furthest:",
            (int count, int doubtful, int whole) => $"{count} of {whole} goals not met, {doubtful} undecided; the furthest:",
        };
        return $"{head} {Name(goal.Metric)} is {Value(result.Value, goal.Metric)}{Band(result)}, the goal is {(goal.Comparison == BinaryOperator.GreaterOrEqual ? "at least" : "at most")} {FigureText.Number(goal.Threshold)}.";
    }

    private static string Band(GoalResult result) => result.Band is not { Moves: true } band ? ""
        : $" ± {FigureText.Uncertainty(band.StandardUncertainty)}, within {FigureText.Number(band.Least)} to {FigureText.Number(band.Greatest)} at 95 %";

    /// <summary>A metric as sentences name it.</summary>
    public static string Name(MetricName metric) => metric.Kind == MetricKind.Checkpoint ? $"fidelity {metric}" : metric.ToString();

    private static GoalResult Judge(Goal goal, IReadOnlyList<Evaluated> all) =>
        all.Where(e => e.Setting.Protocol.Goals.Any(g => g.Text == goal.Text)).Select(e => Judge(goal, e)).MinBy(r => double.IsNaN(r.Margin) ? double.NegativeInfinity : r.Margin)!;

    private static GoalResult Judge(Goal goal, Evaluated evaluated)
    {
        Estimate value = evaluated.Figure(goal.Metric) ?? Estimate.Exact(double.NaN);
        double margin = Margin(goal, value.Value);
        return new GoalResult(goal.Text, value, goal.Threshold, margin >= -RoundOff && SideFits(goal, value), margin);
    }

    private static double Margin(Goal goal, double value) => goal.Comparison == BinaryOperator.GreaterOrEqual ? value - goal.Threshold : goal.Threshold - value;

    /// <summary>An upper bound proves no "at least", and the reverse.</summary>
    private static bool SideFits(Goal goal, Estimate value) => double.IsFinite(goal.Comparison == BinaryOperator.GreaterOrEqual ? value.Low : value.High);

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
