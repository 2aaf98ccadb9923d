using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>From a setup to what <c>inspect</c> tells; of several parameter assignments the most expensive is shown.</summary>
internal static class InspectJudgement
{
    public static Outcome<InspectResult> Of(Setup setup)
    {
        Setting setting = setup.Settings.MaxBy(s => Engines.Dense.DenseEngine.Estimate(s.Plan, "").MemoryBytes)!;
        Outcome<EngineChoice> choice = Evaluator.Choose(setting, setup.Request);
        EngineChoice engine = choice.Value ?? Engines.Dense.DenseEngine.Estimate(setting.Plan, choice.Findings[0].Message);
        return Outcome<InspectResult>.Of(new InspectResult
        {
            Version = Provenance.Version,
            Protocol = new InputFile(setup.Request.Script.Name, setup.Request.Script.Sha256),
            Title = setting.Protocol.Name,
            Conditions = Provenance.Conditions(setup),
            Overrides = setup.Request.Overrides,
            Parameters = Provenance.Parameters(setup),
            Parties = setting.Protocol.Parties,
            Levels = setting.Protocol.Levels,
            Knowledge = Knowledge.Of(setting.Protocol),
            Timeline = Provenance.Schedule(setting),
            Duration = setting.Plan.Duration.Seconds,
            Engine = engine,
            Fits = choice.Succeeded,
            Costs = setup.Settings.Count == 1 ? [] : [.. setup.Settings.Select(s => Cost(s, setup.Request))],
            Requirements = [.. setting.Protocol.Requirements.Select(r => new RequirementLine(r.Text, r.Reason, r.Figures, r.Holds))],
            Warnings = [.. setup.Notes, .. choice.Findings.Select(f => f with { Severity = Severity.Warning })],
        });
    }

    private static SettingCost Cost(Setting setting, RunRequest request)
    {
        EngineChoice? choice = Evaluator.Choose(setting, request).Value;
        EngineChoice engine = choice ?? Engines.Dense.DenseEngine.Estimate(setting.Plan, "");
        return new SettingCost(setting.Words, setting.Plan.Duration.Seconds, engine, choice is not null);
    }
}
