using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
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
        RunResult result = Conclude(setup with { Notes = [.. setup.Notes, .. findings.Distinct()] }, all);
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
    public static List<Evaluated> All(Setup setup, List<Diagnostic> findings, bool cheats) =>
        [.. setup.Settings.SelectMany(s => Evaluate(s, setup.Request, findings, cheats))];

    private static IEnumerable<Evaluated> Evaluate(Setting setting, RunRequest request, List<Diagnostic> findings, bool withCheats)
    {
        Outcome<IReadOnlyList<Evaluation>> actual = Evaluator.Evaluate(setting, request);
        findings.AddRange(actual.Findings);
        if (actual.Value is not { } evaluations)
            return [];
        Outcome<IReadOnlyList<Evaluation>> ideal = setting.IsIdeal ? actual : Evaluator.Evaluate(setting.Idealised(), request, mayKeepNothing: true);
        findings.AddRange(ideal.Succeeded ? [] : ideal.Findings);
        Outcome<IReadOnlyList<CheatEvaluation>> cheats = withCheats ? Evaluator.Cheats(setting, evaluations, request) : Outcome<IReadOnlyList<CheatEvaluation>>.Of([]);
        findings.AddRange(cheats.Findings);
        return ideal.Value is { } best && cheats.Value is { } strategies
            ? evaluations.Zip(best, (a, i) => new Evaluated(setting, a, i) { Cheats = strategies }) : [];
    }

    private static RunResult Conclude(Setup setup, IReadOnlyList<Evaluated> all)
    {
        IReadOnlyList<(Goal Goal, GoalResult Result)> goals = GoalJudgement.Goals(all);
        YieldResult yield = MetricGathering.Yield(all);
        double[] paces = [.. all.Select(e => SecondsPerKeptCopy(e.Setting, e.Actual.Yield)).OfType<double>()];
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
            List = ListOf(longest, yield),
            DurationRange = MetricGathering.Range(setup.Settings.Select(s => s.Plan.Duration.Seconds)),
            Checkpoints = MetricGathering.Checkpoints(all),
            Yield = yield,
            Duration = longest.Plan.Duration.Seconds,
            SecondsPerKeptCopy = paces.Length == 0 ? null : paces.Max(),
            SecondsPerKeptCopyRange = MetricGathering.Range(paces),
            Goals = [.. goals.Select(g => g.Result)],
            Verdict = goals.Count == 0 ? Verdict.NoGoals : goals.All(g => g.Result.Met) ? Verdict.Met : Verdict.NotMet,
            VerdictText = GoalJudgement.Sentence(goals, all) + Outside(setup.Settings),
            Hint = Limits.Hint(goals, all, setup.Request),
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

    internal static (int Copies, double? Seconds)? ListOf(Setting setting, YieldResult yield) => setting.Protocol.Lists is not { Copies: var copies } ? null
        : (copies, SecondsPerKeptCopy(setting, yield.Value.Value) is { } each ? (copies * each) + setting.Plan.Duration.Seconds : null);

    /// <summary>Preparation and use of copies overlap, so the slower of the two sets the pace.</summary>
    private static double? SecondsPerKeptCopy(Setting setting, double yield)
    {
        if (setting.World.Preparation is not { } preparation)
            return null;
        double period = 1 / (preparation.Attempts.PerSecond * preparation.Success.Value);
        return Math.Max(period, setting.Plan.Duration.Seconds) / yield;
    }
}
