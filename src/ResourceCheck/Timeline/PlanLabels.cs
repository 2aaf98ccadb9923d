namespace ResourceCheck.Timeline;

/// <summary>The checkpoints of a plan in the order written, conditional ones included.</summary>
internal static class PlanLabels
{
    public static IReadOnlyList<string> Of(Plan plan) => [.. In(plan.Steps).Distinct()];

    private static IEnumerable<string> In(IEnumerable<PlanStep> steps) => steps.SelectMany(step => step switch
    {
        CheckpointPlanStep look => [look.Label],
        WhenPlanStep block => In(block.Then).Concat(In(block.Otherwise)),
        _ => Enumerable.Empty<string>(),
    });
}
