using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>From a setup to the result document of <c>run</c>.</summary>
internal static class RunJudgement
{
    public static Outcome<RunResult> Of(Setup setup)
    {
        List<Diagnostic> findings = [];
        List<Evaluated> all = All(setup, findings, cheats: true);
        if (findings.Any(f => f.Severity == Severity.Error))
            return Outcome<RunResult>.Failed([.. findings.Distinct()]);
        Outcome<UncertaintyResult>? uncertainty = Uncertainty(setup, all);
        if (uncertainty is { Succeeded: false })
            return Outcome<RunResult>.Failed([.. findings.Concat(uncertainty.Findings).Distinct()]);
        RunResult result = Conclude(setup with { Notes = [.. setup.Notes, .. findings.Concat(uncertainty?.Findings ?? []).Distinct()] }, all, uncertainty?.Value);
        if (setup.Request.Drift is { } drift)
        {
            Outcome<DriftResult> drifted = DriftJudgement.Of(setup.Request, drift, result.Cases);
            if (drifted.Value is null)
                return Outcome<RunResult>.Failed(drifted.Findings);
            result = result with { Drift = drifted.Value };
        }

        if (!setup.Request.TryLevels)
            return new Outcome<RunResult>(result, result.Warnings);
        Outcome<IReadOnlyList<LevelsResult>> levels = LevelsJudgement.Of(setup);
        return levels.Value is { } compared
            ? new Outcome<RunResult>(result with { Levels = compared }, result.Warnings)
            : Outcome<RunResult>.Failed(levels.Findings);
    }

    /// <summary>Every setting and assignment of the private inputs, evaluated; what went wrong is added to the findings.</summary>
    /// <param name="setup">What is evaluated.</param>
    /// <param name="findings">Takes what went wrong.</param>
    /// <param name="cheats">Whether cheating strategies are evaluated too.</param>
    /// <param name="besideIdeal">Whether the same under ideal conditions is evaluated too; else the actual stands in its place.</param>
    public static List<Evaluated> All(Setup setup, List<Diagnostic> findings, bool cheats, bool besideIdeal = true) =>
        [.. setup.Settings.SelectMany(s => Evaluate(s, setup.Request, findings, cheats, besideIdeal))];

    private static IEnumerable<Evaluated> Evaluate(Setting setting, RunRequest request, List<Diagnostic> findings, bool withCheats, bool besideIdeal)
    {
        Outcome<IReadOnlyList<Evaluation>> actual = Evaluator.Evaluate(setting, request);
        findings.AddRange(actual.Findings);
        if (actual.Value is not { } evaluations)
            return [];
        Outcome<IReadOnlyList<Evaluation>> ideal = setting.IsIdeal || !besideIdeal ? actual : Evaluator.Evaluate(setting.Idealised(), request, mayKeepNothing: true);
        findings.AddRange(ideal.Succeeded ? [] : ideal.Findings);
        Outcome<IReadOnlyList<CheatEvaluation>> cheats = withCheats ? Evaluator.Cheats(setting, evaluations, request) : Outcome<IReadOnlyList<CheatEvaluation>>.Of([]);
        findings.AddRange(cheats.Findings);
        return ideal.Value is { } best && cheats.Value is { } strategies
            ? evaluations.Zip(best, (a, i) => new Evaluated(setting, a, i) { Cheats = strategies }) : [];
    }

    /// <summary>Seconds per kept copy at the preparation rate, of every evaluation; empty when no rate is given.</summary>
    public static IEnumerable<double> Paces(IReadOnlyList<Evaluated> all) => all.Select(e => SecondsPerKeptCopy(e.Setting, e.Actual.Yield)).OfType<double>();

    /// <summary>Null when uncertainties are not asked for. Harms on lists are left out: each is a search of its own at every value.</summary>
    private static Outcome<UncertaintyResult>? Uncertainty(Setup setup, IReadOnlyList<Evaluated> all)
    {
        if (setup.Request.Uncertainty is not { } asked)
            return null;
        bool cheats = setup.Settings.All(s => s.Protocol.Lists is null);
        IReadOnlyList<NamedFigure> centre = RunFigures.Of(cheats ? all : [.. all.Select(e => e with { Cheats = [] })]);
        Outcome<UncertaintyResult> found = UncertaintyJudgement.Of(setup, centre, LeadingOf(all), asked.Samples, s => RunFigures.Of(s, cheats));
        return cheats || found.Value is not { } result || all.All(e => e.Cheats.Count == 0) ? found
            : found with { Value = result with { LeftOut = [.. result.LeftOut, "harms, each of which is a search of its own on lists; goals on them are judged at the central values"] } };
    }

    private static FigureKey LeadingOf(IReadOnlyList<Evaluated> all)
    {
        (Goal Goal, GoalResult Result)[] goals = [.. GoalJudgement.Goals(all).OrderBy(g => g.Result.Margin)];
        return goals.Length > 0 ? new(FigureKind.Goal, FigureBand.Honest, goals[0].Result.Text)
            : MetricChoice.Of([], all) is { Kind: MetricKind.Checkpoint, Label: var label } ? new(FigureKind.Checkpoint, FigureBand.Honest, label)
            : new(FigureKind.Metric, FigureBand.Honest, "success");
    }

    private static RunResult Conclude(Setup setup, IReadOnlyList<Evaluated> all, UncertaintyResult? uncertainty)
    {
        IReadOnlyList<(Goal Goal, GoalResult Result)> goals = GoalJudgement.WithBands(GoalJudgement.Goals(all), uncertainty);
        YieldResult yield = MetricGathering.Yield(all);
        double[] paces = [.. Paces(all)];
        Setting longest = setup.Settings.MaxBy(s => s.Plan.Duration.Seconds)!;
        return new RunResult
        {
            Version = Provenance.Version,
            Protocol = new InputFile(setup.Request.Script.Name, setup.Request.Script.Sha256),
            Title = setup.Settings[0].Protocol.Name,
            Conditions = Provenance.Conditions(setup),
            Overrides = setup.Request.Overrides,
            Engine = all.MaxBy(e => e.Actual.Engine.MemoryBytes)!.Actual.Engine,
            IntegrationError = all.Max(e => e.Actual.IntegrationError),
            Seed = null,
            Parameters = Provenance.Parameters(setup),
            Cases = [new CaseResult("honest", [], MetricGathering.Metrics(all)), .. CaseGathering.Cases(all)],
            Attacks = CaseGathering.Attacks(all),
            ListMethod = all.Select(e => e.Actual.ListMethod).FirstOrDefault(m => m is not null),
            List = ListOf(longest, yield.Value.Value),
            DurationRange = MetricGathering.Range(setup.Settings.Select(s => s.Plan.Duration.Seconds)),
            Checkpoints = MetricGathering.Checkpoints(all),
            Yield = yield,
            Rates = RateChainJudgement.Of(all),
            Duration = longest.Plan.Duration.Seconds,
            SecondsPerKeptCopy = paces.Length == 0 ? null : paces.Max(),
            SecondsPerKeptCopyRange = MetricGathering.Range(paces),
            Goals = [.. goals.Select(g => g.Result)],
            Verdict = GoalJudgement.VerdictOf(goals),
            Uncertainty = uncertainty,
            VerdictText = GoalJudgement.Sentence(goals, all) + Outside(setup.Settings),
            Hint = Limits.Hint(goals, all, setup.Request),
            Parties = longest.Protocol.Parties,
            Timeline = Provenance.Schedule(longest),
            Warnings = [.. setup.Notes, .. Notes(all), .. longest.World.Storage is { } storage ? StorageAdvice.Of(storage, storage.Time.Seconds) : [], .. StorageAdvice.OfError(all.Max(e => e.Actual.IntegrationError))],
        };
    }

    private static string Outside(IReadOnlyList<Setting> settings) =>
        settings.Any(s => s.Protocol.Requirements.Any(r => !r.Holds)) ? " The script requires parameters that are not met here." : "";

    private static IEnumerable<Diagnostic> Notes(IReadOnlyList<Evaluated> all)
    {
        foreach (Evaluated evaluated in all)
        {
            for (int i = 0; i < evaluated.Actual.Reports.Count; i++)
            {
                if (double.IsNaN(evaluated.Actual.Reports[i].Value))
                    yield return JudgementMessages.NotFinite($"\"{evaluated.Setting.Protocol.Reports[i].Label}\"", evaluated.At);
            }
        }
    }

    internal static (int Copies, double? Seconds)? ListOf(Setting setting, double yield) => setting.Protocol.Lists is not { Copies: var copies } ? null
        : (copies, SecondsPerKeptCopy(setting, yield) is { } each ? (copies * each) + setting.Plan.Duration.Seconds : null);

    /// <summary>Preparation and use of copies overlap, so the slower of the two sets the pace.</summary>
    internal static double? SecondsPerKeptCopy(Setting setting, double yield)
    {
        if (setting.World.Preparation is not { } preparation)
            return null;
        return Math.Max(PreparationPeriod(preparation), setting.Plan.Duration.Seconds) / yield;
    }

    /// <summary>Mean time between two prepared copies, s.</summary>
    internal static double PreparationPeriod(PreparationModel preparation) => 1 / (preparation.Attempts.PerSecond * preparation.Success.Value);
}
