using ResourceCheck.Conditions;

namespace ResourceCheck.Timeline;

/// <summary>A plan with one source of loss taken away; times stay as they are, so that only that source's effect is gone.</summary>
internal static class PlanWithout
{
    /// <summary>Takes a source away, for one party or (null) for all. The preparation is the state's, not the plan's: see the world's resource.</summary>
    public static Plan Of(Plan plan, Source source, int? party = null)
    {
        World world = source == Source.Preparation ? plan.World with { Resource = ResourceModel.Ideal } : plan.World;
        return plan with { World = world, Steps = Steps(plan.Steps, source, party, plan.Protocol.Levels) };
    }

    private static IReadOnlyList<PlanStep> Steps(IEnumerable<PlanStep> steps, Source source, int? party, int levels) =>
        [.. steps.Select(s => Step(s, source, party, levels)).OfType<PlanStep>()];

    private static PlanStep? Step(PlanStep step, Source source, int? party, int levels) => step switch
    {
        NoisePlanStep noise => Hit(noise, source, party) ? null : noise,
        StoragePlanStep when source == Source.Storage => null,
        ApplyPlanStep apply when source == Source.Operations && Hit(apply.Party, party) => apply with { Model = OperationModel.Ideal },
        MeasurePlanStep measure when source == Source.Detection && Hit(measure.Party, party) => measure with { Model = DetectionModel.Ideal(levels) },
        CheckpointPlanStep look => look with { Waits = [.. look.Waits.Where(w => !Hit(w, source, party))] },
        WhenPlanStep block => block with { Then = Steps(block.Then, source, party, levels), Otherwise = Steps(block.Otherwise, source, party, levels) },
        _ => step,
    };

    private static bool Hit(NoisePlanStep noise, Source source, int? party) => noise.Source == source && Hit(noise.Party, party);

    private static bool Hit(int actor, int? party) => party is null || party == actor;
}
