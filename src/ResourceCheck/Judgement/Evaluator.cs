using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Engines.Product;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Chooses an engine for a setting, refuses what does not fit before anything is allocated, and evaluates.</summary>
internal static class Evaluator
{
    /// <summary>The engine that would run; findings when none can.</summary>
    public static Outcome<EngineChoice> Choose(Setting setting, RunRequest request) => EngineSelection.Of(setting, request);

    /// <summary>The state that an engine starts from, without amplitudes where it needs none.</summary>
    public static Outcome<PreparedState> Prepare(Plan plan, EngineChoice engine)
    {
        int parties = plan.Protocol.Holders.Count;
        return engine.Name == EngineSelection.Product
            ? Outcome<PreparedState>.Of(new PreparedState { Parties = parties, Levels = parties })
            : Resource.Prepare(plan.World.Resource, parties);
    }

    /// <summary>Evaluates a setting for all private inputs.</summary>
    public static Outcome<IReadOnlyList<Evaluation>> Evaluate(Setting setting, RunRequest request, bool mayKeepNothing = false)
    {
        Outcome<EngineChoice> choice = Choose(setting, request);
        if (choice.Value is not { } engine)
            return Outcome<IReadOnlyList<Evaluation>>.Failed(choice.Findings);
        Outcome<PreparedState> prepared = Prepare(setting.Plan, engine);
        if (prepared.Value is not { } state)
            return Outcome<IReadOnlyList<Evaluation>>.Failed(prepared.Findings);
        Evaluation[] evaluations = [.. setting.InputAssignments().Select(i => Evaluate(setting, setting.Plan, state, i, engine, request))];
        return !mayKeepNothing && evaluations.Any(e => !(e.Yield > 0))
            ? Outcome<IReadOnlyList<Evaluation>>.Failed([JudgementMessages.NothingKept(setting.Words)])
            : Outcome<IReadOnlyList<Evaluation>>.From(evaluations, prepared.Findings);
    }

    /// <summary>Evaluates one plan for one assignment of the private inputs, with the verdicts of its lists.</summary>
    public static Evaluation Evaluate(Setting setting, Plan plan, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine, RunRequest request) =>
        Run(setting, plan, state, inputs, engine, request, plan.Protocol.Lists is null ? null : law => ListVerdicts.Of(
            new ListTask { Protocol = plan.Protocol, Copies = law, Inputs = inputs }, request));

    /// <summary>Evaluates the rounds alone: of a protocol on lists this is the law of one copy.</summary>
    public static Evaluation Copies(Setting setting, Plan plan, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine, RunRequest request) =>
        Run(setting, plan, state, inputs, engine, request, null);

    /// <summary>Evaluates all cheating strategies of a setting, for all private inputs.</summary>
    public static Outcome<IReadOnlyList<CheatEvaluation>> Cheats(Setting setting, IReadOnlyList<Evaluation> honest, RunRequest request)
    {
        if (setting.Protocol.Dishonest.Count == 0)
            return Outcome<IReadOnlyList<CheatEvaluation>>.Of([]);
        PreparedState state = Prepare(setting.Plan, honest[0].Engine).Value!; // was prepared for the honest case
        Outcome<CheatEvaluation>[] outcomes = [.. setting.Protocol.Dishonest.SelectMany(cheat =>
            (cheat.Asks(setting.Protocol.Inputs) ? honest : honest.Take(1)).Select(h => CheatEvaluator.Evaluate(setting, cheat, state, h, request)))];
        return Outcome<IReadOnlyList<CheatEvaluation>>.From([.. outcomes.Select(o => o.Value).OfType<CheatEvaluation>()], [.. outcomes.SelectMany(o => o.Findings)]);
    }

    private static Evaluation Run(
        Setting setting, Plan plan, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine, RunRequest request, Func<IReadOnlyList<CopyType>, ListEvaluation>? lists) =>
        engine.Name switch
        {
            EngineSelection.Product => ProductEngine.Evaluate(plan, inputs, engine, setting.Matrices, request.Cancellation, lists),
            _ => DenseEngine.Evaluate(plan, state, inputs, engine, setting.Matrices, request.Cancellation, lists),
        };
}
