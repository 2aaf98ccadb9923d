using ResourceCheck.Conditions;

namespace ResourceCheck.Timeline;

/// <summary>Which sources of loss a plan has at all.</summary>
internal static class PlanSources
{
    /// <summary>Sources present, in the order of <see cref="Source"/>.</summary>
    public static IReadOnlyList<Source> Of(Plan plan)
    {
        HashSet<Source> found = [.. Of(plan.Steps, plan.Protocol.Levels)];
        if (plan.World.Resource != ResourceModel.Ideal)
            found.Add(Source.Preparation);
        return [.. found.Order()];
    }

    private static IEnumerable<Source> Of(IEnumerable<PlanStep> steps, int levels) => steps.SelectMany(s => Of(s, levels));

    private static IEnumerable<Source> Of(PlanStep step, int levels) => step switch
    {
        NoisePlanStep noise => [noise.Source],
        StoragePlanStep => [Source.Storage],
        ApplyPlanStep apply => apply.Model is { Depolarising: 0, OverRotation: 0 } ? [] : [Source.Operations],
        MeasurePlanStep measure => IsPerfect(measure.Model, levels) ? [] : [Source.Detection],
        CheckpointPlanStep look => look.Waits.Select(w => w.Source),
        WhenPlanStep block => Of(block.Then.Concat(block.Otherwise), levels),
        _ => [],
    };

    private static bool IsPerfect(DetectionModel model, int levels) =>
        model is { Efficiency: 1, Dark: 0 } && Enumerable.Range(0, levels).All(i => model.Confusion[i, i] == 1);
}
