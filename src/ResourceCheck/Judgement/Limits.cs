using ResourceCheck.Engines;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Finds what limits a result: the source without which the figure would be best.</summary>
internal static class Limits
{
    /// <summary>Work beyond which the dozen of further evaluations would keep the user waiting.</summary>
    private const double MostWork = 3e7;

    /// <summary>Improvements below this are not worth a sentence.</summary>
    private const double Noticeable = 1e-6;

    /// <summary>A sentence about the worst goal, or the last checkpoint, or success; null when nothing is lost or it would take long.</summary>
    public static string? Hint(IReadOnlyList<(Goal Goal, GoalResult Result)> goals, IReadOnlyList<Evaluated> all, RunRequest request)
    {
        MetricName metric = MetricChoice.Of(goals, all);
        int sign = MetricChoice.Sign(metric, goals.Select(g => g.Goal));
        Evaluated? worst = all.Where(e => e.Figure(metric) is not null).MinBy(e => sign * e.Figure(metric)!.Value);
        if (worst is null || worst.Setting.IsIdeal || worst.Actual.Engine.Work > MostWork || !double.IsFinite(worst.Figure(metric)!.Value))
            return null;
        PreparedState prepared = Prepare(worst.Setting.Plan, worst.Actual.Engine);
        Func<Source, int?, double> without = (source, party) => Without(worst, prepared, metric, source, party, request);
        double now = worst.Figure(metric)!.Value;
        (Source source, double best) = Enum.GetValues<Source>().Select(s => (s, without(s, null))).MaxBy(pair => sign * pair.Item2);
        return sign * (best - now) < Noticeable ? null : Sentence(metric, now, source, best, WorstParty(worst, source, metric, sign, without));
    }

    private static PreparedState Prepare(Plan plan, EngineChoice engine) => Evaluator.Prepare(plan, engine).Value!; // was prepared once already

    private static double Without(Evaluated worst, PreparedState prepared, MetricName metric, Source source, int? party, RunRequest request)
    {
        Plan plan = PlanWithout.Of(worst.Setting.Plan, source, party);
        PreparedState state = source == Source.Preparation ? Prepare(plan, worst.Actual.Engine) : prepared;
        Evaluation evaluation = Evaluator.Evaluate(worst.Setting, plan, state, worst.Actual.Inputs, worst.Actual.Engine, request);
        double value = (worst with { Actual = evaluation }).Figure(metric)?.Value ?? double.NaN; // a checkpoint may never be reached without the source
        return double.IsNaN(value) ? worst.Figure(metric)!.Value : value;
    }

    private static string? WorstParty(Evaluated worst, Source source, MetricName metric, int sign, Func<Source, int?, double> without)
    {
        if (source is Source.Preparation or Source.Storage)
            return null;
        Protocol protocol = worst.Setting.Protocol;
        (int party, double value) = protocol.Holders.Select(p => (p, without(source, p))).MaxBy(pair => sign * pair.Item2);
        double gain = Math.Abs(value - worst.Figure(metric)!.Value);
        return gain < Noticeable ? null : $"{protocol.Parties[party]}'s {FigureText.Number(gain)}";
    }

    private static string Sentence(MetricName metric, double now, Source source, double best, string? party)
    {
        string above = party is null ? "" : $", above all {party}";
        return $"Most is lost {Words(source)}: {FigureText.Number(Math.Abs(best - now))}{above}; without it {GoalJudgement.Name(metric)} would be {FigureText.Number(best)} (exact).";
    }

    internal static string Words(Source source) => source switch
    {
        Source.Preparation => "in the preparation of the state",
        Source.Storage => "in storage before the particles part",
        Source.Interface => "at the interface",
        Source.FlightDecay => "to decay in flight",
        Source.FlightNoise => "to noise in flight",
        Source.Loss => "to loss in flight",
        Source.Waiting => "while qudits are held",
        Source.Operations => "in local operations",
        _ => "in detection",
    };
}
