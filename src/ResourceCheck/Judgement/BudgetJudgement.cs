using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Shares out a loss among its sources by evaluating every subset of them.</summary>
internal static class BudgetJudgement
{
    /// <summary>Losses below this are round-off.</summary>
    private const double Nothing = 1e-12;

    public static Outcome<BudgetResult> Of(Setup setup)
    {
        Outcome<BudgetResult> shared = Shared(setup);
        return shared.Value is { } budget && setup.Request.Uncertainty is not null ? BudgetUncertainty.Of(setup, budget) : shared;
    }

    /// <summary>The budget at the values of a setup.</summary>
    public static Outcome<BudgetResult> Shared(Setup setup)
    {
        List<Diagnostic> findings = [];
        List<Evaluated> all = RunJudgement.All(setup, findings, cheats: false);
        if (findings.Any(f => f.Severity == Severity.Error))
            return Outcome<BudgetResult>.Failed([.. findings.Distinct()]);
        (Goal Goal, GoalResult Result)[] goals = [.. GoalJudgement.Goals(all).Where(g => g.Goal.Metric.Kind != MetricKind.Harm)];
        MetricName metric = MetricChoice.Of(goals, all);
        int sign = MetricChoice.Sign(metric, goals.Select(g => g.Goal));
        Evaluated[] having = [.. all.Where(e => e.Figure(metric) is { Value: not double.NaN })];
        if (having.Length == 0)
            return Outcome<BudgetResult>.Failed([JudgementMessages.NothingToShare(GoalJudgement.Name(metric), "it is defined nowhere")]);
        Evaluated worst = having.MinBy(e => sign * e.Figure(metric)!.Value)!;
        if (worst.Figure(metric)!.Label != TruthLabel.Exact)
            return Outcome<BudgetResult>.Failed([JudgementMessages.NothingToShare(GoalJudgement.Name(metric), "it is known only as a bound or from samples, whose differences say nothing exact")]);
        IReadOnlyList<Source> sources = PlanSources.Of(worst.Setting.Plan);
        double[] figures = Figures(worst, metric, sources, setup.Request);
        return figures.Any(double.IsNaN)
            ? Outcome<BudgetResult>.Failed([JudgementMessages.NothingToShare(GoalJudgement.Name(metric), "it is not defined without some of the sources")])
            : Outcome<BudgetResult>.Of(Conclude(setup, worst, metric, sign, sources, figures, [.. setup.Notes, .. findings.Distinct()]));
    }

    /// <summary>The figure for every subset of sources that act, bit i standing for source i.</summary>
    private static double[] Figures(Evaluated worst, MetricName metric, IReadOnlyList<Source> sources, RunRequest request)
    {
        double[] figures = new double[1 << sources.Count];
        PreparedState prepared = Prepare(worst.Setting.Plan, worst.Actual.Engine);
        ParallelOptions options = new() { CancellationToken = request.Cancellation, MaxDegreeOfParallelism = request.Threads > 0 ? request.Threads : -1 };
        Parallel.For(0, figures.Length, options, subset =>
        {
            Plan plan = worst.Setting.Plan;
            for (int i = 0; i < sources.Count; i++)
                plan = (subset & (1 << i)) == 0 ? PlanWithout.Of(plan, sources[i]) : plan;
            PreparedState state = ReferenceEquals(plan.World, worst.Setting.Plan.World) ? prepared : Prepare(plan, worst.Actual.Engine);
            Evaluation evaluation = Evaluator.Evaluate(worst.Setting, plan, state, worst.Actual.Inputs, worst.Actual.Engine, request);
            figures[subset] = (worst with { Actual = evaluation }).Figure(metric)?.Value ?? double.NaN;
        });
        return figures;
    }

    private static PreparedState Prepare(Plan plan, EngineChoice engine) => Evaluator.Prepare(plan, engine).Value!; // was prepared once already

    private static BudgetResult Conclude(
        Setup setup, Evaluated worst, MetricName metric, int sign, IReadOnlyList<Source> sources, double[] figures, IReadOnlyList<Diagnostic> notes)
    {
        double[] losses = [.. figures.Select(f => sign * (figures[0] - f))];
        double[] shares = Shapley.Shares(losses, sources.Count);
        SourceShare[] rows =
            [.. sources.Select((s, i) => new SourceShare(s, losses[1 << i], losses[^1] - losses[losses.Length - 1 - (1 << i)], shares[i])).OrderByDescending(s => s.Share)];
        return new BudgetResult
        {
            Version = Provenance.Version,
            Protocol = new InputFile(setup.Request.Script.Name, setup.Request.Script.Sha256),
            Title = worst.Setting.Protocol.Name,
            Conditions = Provenance.Conditions(setup),
            Overrides = setup.Request.Overrides,
            Parameters = Provenance.Parameters(setup),
            Engine = worst.Actual.Engine,
            Metric = GoalJudgement.Name(metric),
            At = worst.At,
            Figures = (figures[^1], figures[0]),
            Loss = losses[^1],
            Shares = rows,
            Advice = losses[^1] < Nothing || rows.Length == 0 ? null : Advice(rows.MaxBy(r => r.Removed)!, worst, metric, sign, setup.Request),
            Warnings = notes,
        };
    }

    private static string Advice(SourceShare first, Evaluated worst, MetricName metric, int sign, RunRequest request)
    {
        string name = GoalJudgement.Name(metric);
        double value = worst.Figure(metric)!.Value;
        string without = $"Improve first what is lost {Limits.Words(first.Source)}: without it {name} would be {FigureText.Number(value + (sign * first.Removed))} (exact)";
        if (PlanHalved.Of(worst.Setting.Plan, first.Source) is not { } halved)
            return $"{without}.";
        Evaluation evaluation = Evaluator.Evaluate(worst.Setting, halved, Prepare(halved, worst.Actual.Engine), worst.Actual.Inputs, worst.Actual.Engine, request);
        return (worst with { Actual = evaluation }).Figure(metric) is { Value: not double.NaN } better ? $"{without}, with half of it {FigureText.Number(better.Value)} (exact)." : $"{without}.";
    }
}
