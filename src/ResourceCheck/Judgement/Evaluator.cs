using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Chooses an engine for a setting, refuses what does not fit before anything is allocated, and evaluates.</summary>
internal static class Evaluator
{
    /// <summary>Part of the machine's memory that an evaluation may take; the rest is for the system and the runtime.</summary>
    private const double UsableMemory = 0.8;

    /// <summary>The engine that would run; findings when none can.</summary>
    public static Outcome<EngineChoice> Choose(Setting setting, RunRequest request)
    {
        if (request.Engine is not (null or "dense"))
            return Outcome<EngineChoice>.Failed([JudgementMessages.UnknownEngine(request.Engine)]);
        if (setting.World.Storage is not null && setting.Protocol.Levels > RelaxedPrepared.MostParties)
            return Outcome<EngineChoice>.Failed([JudgementMessages.CollectiveTooLarge(setting.Protocol.Levels, RelaxedPrepared.MostParties)]);
        EngineChoice choice = DenseEngine.Estimate(setting.Plan, Reason(setting, request));
        double limit = Math.Min(request.MemoryLimit ?? (GC.GetGCMemoryInfo().TotalAvailableMemoryBytes * UsableMemory), DenseEngine.LargestMemory);
        if (choice.MemoryBytes > limit)
            return Outcome<EngineChoice>.Failed([JudgementMessages.DoesNotFit(choice, limit, request.MemoryLimit is not null, setting.Plan.NeedsSink)]);
        return TooLong(setting.World) is { } tooLong ? Outcome<EngineChoice>.Failed([tooLong]) : Outcome<EngineChoice>.Of(choice);
    }

    /// <summary>Evaluates a setting for all private inputs.</summary>
    public static Outcome<IReadOnlyList<Evaluation>> Evaluate(Setting setting, RunRequest request, bool mayKeepNothing = false)
    {
        Outcome<EngineChoice> choice = Choose(setting, request);
        if (choice.Value is not { } engine)
            return Outcome<IReadOnlyList<Evaluation>>.Failed(choice.Findings);
        Outcome<PreparedState> prepared = Resource.Prepare(setting.World.Resource, setting.Protocol.Holders.Count);
        if (prepared.Value is not { } state)
            return Outcome<IReadOnlyList<Evaluation>>.Failed(prepared.Findings);
        Evaluation[] evaluations = [.. setting.InputAssignments().Select(i => Evaluate(setting, setting.Plan, state, i, engine, request))];
        return !mayKeepNothing && evaluations.Any(e => !(e.Yield > 0))
            ? Outcome<IReadOnlyList<Evaluation>>.Failed([JudgementMessages.NothingKept(setting.Words)])
            : Outcome<IReadOnlyList<Evaluation>>.From(evaluations, prepared.Findings);
    }

    /// <summary>Evaluates one plan for one assignment of the private inputs, with the verdicts of its lists.</summary>
    public static Evaluation Evaluate(Setting setting, Plan plan, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine, RunRequest request) =>
        DenseEngine.Evaluate(plan, state, inputs, engine, setting.Matrices, request.Cancellation, plan.Protocol.Lists is null ? null : law => ListVerdicts.Of(
            new ListTask { Protocol = plan.Protocol, Copies = law, Inputs = inputs }, request));

    /// <summary>Evaluates the rounds alone: of a protocol on lists this is the law of one copy.</summary>
    public static Evaluation Copies(Setting setting, Plan plan, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine, RunRequest request) =>
        DenseEngine.Evaluate(plan, state, inputs, engine, setting.Matrices, request.Cancellation);

    /// <summary>Evaluates all cheating strategies of a setting, for all private inputs.</summary>
    public static Outcome<IReadOnlyList<CheatEvaluation>> Cheats(Setting setting, IReadOnlyList<Evaluation> honest, RunRequest request)
    {
        if (setting.Protocol.Dishonest.Count == 0)
            return Outcome<IReadOnlyList<CheatEvaluation>>.Of([]);
        PreparedState state = Resource.Prepare(setting.World.Resource, setting.Protocol.Holders.Count).Value!; // was prepared for the honest case
        Outcome<CheatEvaluation>[] outcomes = [.. setting.Protocol.Dishonest.SelectMany(cheat =>
            (cheat.Asks(setting.Protocol.Inputs) ? honest : honest.Take(1)).Select(h => CheatEvaluator.Evaluate(setting, cheat, state, h, request)))];
        return Outcome<IReadOnlyList<CheatEvaluation>>.From([.. outcomes.Select(o => o.Value).OfType<CheatEvaluation>()], [.. outcomes.SelectMany(o => o.Findings)]);
    }

    private static Diagnostic? TooLong(World world)
    {
        double storage = EvolutionCost.OfStorage(world), relaxed = EvolutionCost.OfPreparation(world);
        return Math.Max(storage, relaxed) <= EvolutionCost.Most ? null
            : storage >= relaxed ? JudgementMessages.TooLongToIntegrate("storage", storage) : JudgementMessages.TooLongToIntegrate("resource.relaxed", relaxed);
    }

    private static string Reason(Setting setting, RunRequest request)
    {
        string size = $"{setting.Protocol.Holders.Count} qudits of {setting.Protocol.Levels} levels fit in memory as a density operator";
        return request.Engine is null ? $"{size}, so every outcome is followed exactly" : $"asked for; {size}";
    }
}
