using ResourceCheck.Engines.Dense;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>Follows the histories of a plan that differ in anything but open outcomes; the counterpart of <see cref="Walker"/>.</summary>
/// <param name="plan">What happens.</param>
/// <param name="models">Maps and functionals.</param>
/// <param name="tally">Takes what histories contribute.</param>
/// <param name="estimating">Follow one history of each kind and count how many there are, instead of following all.</param>
/// <param name="cancellation">Stops the walk.</param>
internal sealed class ProductWalker(Plan plan, LocalModels models, IProductTally tally, bool estimating, CancellationToken cancellation)
{
    /// <summary>As in <see cref="Walker"/>: outcomes that much less probable than their likeliest sibling are round-off of impossible ones.</summary>
    private const double Negligible = 1e-15;

    private readonly HashSet<int> _followed = FollowedSlots.Of(plan);
    private readonly Inlining _inlining = new(plan.Protocol.Levels);

    public void Walk(ProductBranch start) => Go(new Cursor(plan.Steps, 0, null), start);

    /// <summary>Rest of a list of steps and what follows it.</summary>
    private sealed record Cursor(IReadOnlyList<PlanStep> Steps, int Index, Cursor? Then);

    private void Go(Cursor? cursor, ProductBranch branch)
    {
        while (cursor is not null)
        {
            if (cursor.Index == cursor.Steps.Count)
            {
                cursor = cursor.Then;
                continue;
            }

            PlanStep step = cursor.Steps[cursor.Index];
            cursor = cursor with { Index = cursor.Index + 1 };
            if (Next(step, ref cursor, branch) is not { } next)
                return;
            branch = next;
        }

        tally.End(branch);
    }

    /// <summary>The branch after a step; null when it has split or ended.</summary>
    private ProductBranch? Next(PlanStep step, ref Cursor cursor, ProductBranch branch)
    {
        switch (step)
        {
            case NoisePlanStep noise:
                return Acting(branch, noise.Party, models.Noise(noise.Noise));
            case HeraldPlanStep herald:
                return models.Basis.HasSink ? Acting(branch, herald.Party, models.Herald) : branch;
            case ApplyPlanStep apply:
                return Apply(apply, branch);
            case AssignPlanStep assign:
                return Assign(assign, branch);
            case AbortPlanStep abort:
                return Holds(abort.Condition, branch) ? branch with { Aborted = branch.Aborted | (1UL << abort.Party) } : branch;
            case WhenPlanStep block:
                cursor = new Cursor(Holds(block.Condition, branch) ? block.Then : block.Otherwise, 0, cursor);
                return branch;
            case CheckpointPlanStep look:
                tally.Look(look, branch, look.Waits.Aggregate(branch, (b, w) => Acting(b, w.Party, models.Noise(w.Noise))));
                return branch;
            default:
                return Split(step, cursor, branch);
        }
    }

    private static ProductBranch Acting(ProductBranch branch, int party, SiteMap map) => branch.WithSite(party, branch.Sites[party]!.After(map));

    private ProductBranch Apply(ApplyPlanStep step, ProductBranch branch) =>
        models.Unitary(step.Unitary, step.Model, branch.Slots) is { } map
            ? branch.WithSite(step.Party, branch.Sites[step.Party]!.After(map, models.UnitaryMatrix(step.Unitary, step.Model, branch.Slots)))
            : branch;

    private ProductBranch Assign(AssignPlanStep step, ProductBranch branch)
    {
        if (Idle(step.Slot, branch))
            return branch.With(step.Slot, Scripts.Binding.Value.None);
        BoundExpression value = _inlining.In(step.Value, branch);
        return value is BoundLiteral literal ? branch.With(step.Slot, literal.Value) : branch.WithSymbol(step.Slot, value);
    }

    private ProductBranch? Split(PlanStep step, Cursor cursor, ProductBranch branch)
    {
        cancellation.ThrowIfCancellationRequested();
        switch (step)
        {
            case KeepPlanStep keep:
                return Keep(keep, branch);
            case PickPlanStep pick when Idle(pick.Slot, branch):
                return branch.With(pick.Slot, Scripts.Binding.Value.None);
            case PickPlanStep pick:
                Pick(pick, cursor, branch);
                return null;
            case MeasurePlanStep measure:
                return Measure(measure, cursor, branch);
            case InterceptPlanStep intercept:
                Intercept(intercept, cursor, branch);
                return null;
            default:
                throw new InvalidOperationException($"The product engine does not know {step.GetType().Name}.");
        }
    }

    private ProductBranch? Keep(KeepPlanStep step, ProductBranch branch)
    {
        BoundExpression condition = _inlining.In(step.Condition, branch);
        if (condition is not BoundLiteral literal)
        {
            tally.Drop(branch, condition);
            return branch with { Conditions = [.. branch.Conditions, condition] };
        }

        if (literal.Value is TruthValue { Truth: true })
            return branch;
        tally.Drop(branch, null);
        return null;
    }

    private void Pick(PickPlanStep step, Cursor cursor, ProductBranch branch)
    {
        foreach (BoundExpression option in step.Options)
        {
            ProductBranch next = branch.With(step.Slot, Value(option, branch)) with { Factor = branch.Factor / step.Options.Count };
            Go(cursor, next);
        }
    }

    private ProductBranch? Measure(MeasurePlanStep step, Cursor cursor, ProductBranch branch)
    {
        SiteState site = branch.Sites[step.Party]!;
        if (Idle(step.Slot, branch) || Value(step.Basis, branch) is not BasisValue basis)
            return branch.Read(step.Party, Reading.Settled(site.Pull(models.Basis.Trace))).With(step.Slot, Scripts.Binding.Value.None);
        double[][] effects = models.Effects(basis, step.Model);
        double[][] told = plan.Protocol.HandlesNone ? effects : effects[..^1];
        if (!_followed.Contains(step.Slot))
        {
            Reading open = new(step.Slot, [.. told.Select(site.Pull)]);
            return branch.Read(step.Party, open).WithSymbol(step.Slot, new BoundSlot(plan.Protocol.Slots[step.Slot].Span, step.Slot));
        }

        Follow(
            [.. told.Select((e, k) => branch.Read(step.Party, Reading.Settled(site.Pull(e))).With(step.Slot, k < models.Basis.Levels ? Scripts.Binding.Value.Of(k) : Scripts.Binding.Value.None))],
            cursor);
        return null;
    }

    private void Intercept(InterceptPlanStep step, Cursor cursor, ProductBranch branch)
    {
        if (Value(step.Basis, branch) is not BasisValue basis)
            Go(cursor, branch.With(step.Slot, Scripts.Binding.Value.None));
        else
            Follow([.. models.Projections(basis).Select((p, k) => Acting(branch, step.Victim, p).With(step.Slot, Scripts.Binding.Value.Of(k)))], cursor);
    }

    private void Follow(ProductBranch[] outcomes, Cursor cursor)
    {
        if (estimating)
        {
            Go(cursor, outcomes[0] with { Copies = outcomes[0].Copies * outcomes.Length });
            return;
        }

        double[] weights = [.. outcomes.Select(tally.Weight)];
        double least = Negligible * weights.Max();
        for (int k = 0; k < outcomes.Length; k++)
        {
            if (weights[k] > least)
                Go(cursor, outcomes[k]);
        }
    }

    /// <summary>Whether the party that makes a value has given up.</summary>
    private bool Idle(int slot, ProductBranch branch) => branch.Aborted != 0 && branch.HasAborted(plan.Protocol.Slots[slot].Party);

    private Value Value(BoundExpression expression, ProductBranch branch) => ValueEvaluator.Evaluate(expression, branch.Slots, models.Basis.Levels);

    private bool Holds(BoundExpression condition, ProductBranch branch) => Value(condition, branch) is TruthValue { Truth: true };
}
