using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>
/// The outcomes that later steps depend on: bases, unitaries, conditions of blocks and aborts, and keeps before a later look. Only these make
/// histories split; all other outcomes stay open to the end.
/// </summary>
internal static class FollowedSlots
{
    /// <summary>Indices of the slots.</summary>
    public static HashSet<int> Of(Plan plan)
    {
        HashSet<int> followed = [];
        PlanStep[] steps = [.. Flat(plan.Steps)];
        int lastLook = Array.FindLastIndex(steps, s => s is CheckpointPlanStep);
        for (int i = 0; i < steps.Length; i++)
            followed.UnionWith(Needs(steps[i], i < lastLook));
        Spread(steps, followed);
        return followed;
    }

    private static IEnumerable<PlanStep> Flat(IEnumerable<PlanStep> steps) =>
        steps.SelectMany(s => s is WhenPlanStep block ? [block, .. Flat(block.Then), .. Flat(block.Otherwise)] : (IEnumerable<PlanStep>)[s]);

    private static IEnumerable<int> Needs(PlanStep step, bool looksFollow) => step switch
    {
        ApplyPlanStep apply => Dependencies.Of(apply.Unitary),
        MeasurePlanStep measure => Dependencies.Of(measure.Basis),
        InterceptPlanStep intercept => Dependencies.Of(intercept.Basis).Append(intercept.Slot),
        WhenPlanStep block => Dependencies.Of(block.Condition),
        AbortPlanStep abort => Dependencies.Of(abort.Condition),
        KeepPlanStep keep when looksFollow => Dependencies.Of(keep.Condition),
        _ => [],
    };

    /// <summary>What a followed value is computed from is followed too.</summary>
    private static void Spread(PlanStep[] steps, HashSet<int> followed)
    {
        AssignPlanStep[] assignments = [.. steps.OfType<AssignPlanStep>()];
        int before;
        do
        {
            before = followed.Count;
            foreach (AssignPlanStep assign in assignments.Where(a => followed.Contains(a.Slot)))
                followed.UnionWith(Dependencies.Of(assign.Value));
        }
        while (followed.Count > before);
    }
}
