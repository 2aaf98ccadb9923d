using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Dense;

/// <summary>
/// Exact evaluation with the density operator: every outcome of every measurement is followed, depth first, so that memory holds
/// one path of branches. The state is kept in a real Hermitian operator basis; lost qudits are one component more per site.
/// </summary>
public static class DenseEngine
{
    private const double BytesPerNumber = 8;

    /// <summary>States held at once: the state itself, the target of a look, and one copy of it before and after a map.</summary>
    private const double StatesHeld = 4;

    /// <summary>Most memory this engine can use on any machine: arrays have at most 2³¹ numbers.</summary>
    public static double LargestMemory => BytesPerNumber * int.MaxValue * StatesHeld;

    /// <summary>What an evaluation would cost. Nothing is allocated.</summary>
    public static EngineChoice Estimate(Plan plan, string reason)
    {
        double site = (plan.Protocol.Levels * plan.Protocol.Levels) + (plan.NeedsSink ? 1 : 0);
        double numbers = Math.Pow(site, plan.Protocol.Levels);
        int looks = plan.Steps.Count(s => s is CheckpointPlanStep);
        double memory = BytesPerNumber * numbers * StatesHeld;
        if (plan.World.Storage is not null || plan.World.Resource.Preparation is RelaxedPreparation)
            memory += MasterEquation.Bytes(plan.Protocol.Levels, plan.Protocol.Levels);
        double work = (numbers * ((looks * site) + (2 * plan.Protocol.Levels))) + EvolutionCost.OfStorage(plan.World) + EvolutionCost.OfPreparation(plan.World);
        return new EngineChoice("dense", reason, memory, work);
    }

    /// <summary>Evaluates a plan for one assignment of the private inputs.</summary>
    /// <param name="plan">What happens.</param>
    /// <param name="state">The prepared state, of as many qudits and levels as the protocol has holders.</param>
    /// <param name="inputs">A value for each private input, in order.</param>
    /// <param name="choice">The estimate that was made, for the record.</param>
    /// <param name="matrices">The script's matrix files, by name.</param>
    /// <param name="cancellation">Stops the evaluation.</param>
    /// <param name="lists">Verdicts of the protocol's lists from the law of one kept copy; null for a protocol on single copies.</param>
    public static Evaluation Evaluate(
        Plan plan, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice choice, IReadOnlyDictionary<string, Complex[,]> matrices, CancellationToken cancellation,
        Func<IReadOnlyList<CopyType>, ListEvaluation>? lists = null)
    {
        OperatorBasis basis = new(plan.Protocol.Levels, plan.NeedsSink);
        Tally tally = new(plan, basis);
        tally.IntegrationError(state.IntegrationError);
        Walker walker = new(plan, new LocalModels(basis, matrices), tally, cancellation);
        walker.Walk(Start(plan, basis, state, inputs));
        return tally.Conclude(choice, inputs, lists);
    }

    private static Branch Start(Plan plan, OperatorBasis basis, PreparedState state, IReadOnlyList<Value> inputs)
    {
        Value[] slots = new Value[plan.Protocol.Slots.Count];
        Array.Fill(slots, History.NotYet);
        for (int i = 0; i < inputs.Count; i++)
            slots[plan.Protocol.Inputs[i].Slot] = inputs[i];
        return new Branch
        {
            Tensor = TensorBuilder.Build(basis, plan.Protocol.Holders, state, plan.World.Resource.White),
            Factor = state.Probability,
            Pending = new SiteMap?[plan.Protocol.Parties.Count],
            Slots = slots,
        };
    }
}
