using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Dense;

/// <summary>Follows every branch of a plan to its end and hands looks and ends to the tally.</summary>
internal sealed class Walker(Plan plan, LocalModels models, Tally tally, CancellationToken cancellation)
{
    /// <summary>
    /// Outcomes less probable than this beside the likeliest one of the same measurement are round-off of impossible ones, whose sign is
    /// random. It must be relative: with a weak detector every outcome is improbable, and all of them are real.
    /// </summary>
    private const double Negligible = 1e-15;

    public void Walk(Branch start) => Go(new Cursor(plan.Steps, 0, null), start);

    /// <summary>Rest of a list of steps and what follows it.</summary>
    private sealed record Cursor(IReadOnlyList<PlanStep> Steps, int Index, Cursor? Then);

    private void Go(Cursor? cursor, Branch branch)
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

        tally.End(branch, branch.Weight(models.Basis.Trace));
    }

    /// <summary>The branch after a step; null when the branch has split or ended.</summary>
    private Branch? Next(PlanStep step, ref Cursor cursor, Branch branch)
    {
        switch (step)
        {
            case NoisePlanStep noise:
                return branch.Acting(noise.Party, models.Noise(noise.Noise));
            case StoragePlanStep storage:
                return Stored(storage.Model, branch);
            case HeraldPlanStep herald:
                return branch.Acting(herald.Party, models.Basis.DropSink());
            case ApplyPlanStep apply:
                return models.Unitary(apply.Unitary, apply.Model, branch.Slots) is { } map ? branch.Acting(apply.Party, map) : branch;
            case AssignPlanStep assign:
                return branch.With(assign.Slot, Idle(assign.Slot, branch) ? Scripts.Binding.Value.None : Value(assign.Value, branch));
            case AbortPlanStep abort:
                return Holds(abort.Condition, branch) ? branch.WithAborted(abort.Party) : branch;
            case WhenPlanStep block:
                cursor = new Cursor(Holds(block.Condition, branch) ? block.Then : block.Otherwise, 0, cursor);
                return branch;
            case CheckpointPlanStep checkpoint:
                tally.Look(checkpoint, branch, models);
                return branch;
            default:
                return Split(step, cursor, branch);
        }
    }

    /// <summary>Nothing has acted on single qudits yet, so no maps are pending.</summary>
    private Branch Stored(CollectiveModel model, Branch branch)
    {
        IReadOnlyList<int>? physical = plan.World.Resource.PhysicalLevels;
        int parties = branch.Tensor.Parties.Count;
        PreparedState before = new() { Parties = parties, Levels = models.Basis.Levels, Density = TensorUnfolding.ToDensity(models.Basis, branch.Tensor) };
        PreparedState inLevels = physical is null ? before : LevelOrdering.Of(before, LevelOrdering.Inverse(physical));
        (Complex[] density, double error) = CollectiveDecay.Evolve(model, inLevels.Density!);
        tally.IntegrationError(error);
        PreparedState after = before with { Density = density };
        after = physical is null ? after : LevelOrdering.Of(after, physical);
        return branch.Holding(TensorBuilder.Build(models.Basis, branch.Tensor.Parties, after, 0));
    }

    private Branch? Split(PlanStep step, Cursor cursor, Branch branch)
    {
        cancellation.ThrowIfCancellationRequested();
        switch (step)
        {
            case KeepPlanStep keep:
                if (Holds(keep.Condition, branch))
                    return branch;
                tally.Dropped(branch.Weight(models.Basis.Trace));
                return null;
            case PickPlanStep pick when Idle(pick.Slot, branch):
                return branch.With(pick.Slot, Scripts.Binding.Value.None);
            case PickPlanStep pick:
                foreach (BoundExpression option in pick.Options)
                    Go(cursor, branch.With(pick.Slot, Value(option, branch)).Scaled(1.0 / pick.Options.Count));
                return null;
            case MeasurePlanStep measure:
                Measure(measure, cursor, branch);
                return null;
            case InterceptPlanStep intercept:
                Intercept(intercept, cursor, branch);
                return null;
            default:
                throw new InvalidOperationException($"The dense engine does not know {step.GetType().Name}.");
        }
    }

    private void Measure(MeasurePlanStep step, Cursor cursor, Branch branch)
    {
        if (Idle(step.Slot, branch) || Value(step.Basis, branch) is not BasisValue basis)
        {
            Go(cursor, branch.Reading(step.Party, models.Basis.Trace).With(step.Slot, Scripts.Binding.Value.None)); // no basis, no measurement, no outcome
            return;
        }

        Branch[] outcomes = [.. models.Effects(basis, step.Model).Select(e => branch.Reading(step.Party, e))];
        double[] weights = [.. outcomes.Select(o => o.Weight(models.Basis.Trace))];
        Follow(outcomes[..^1], weights[..^1], step.Slot, cursor);
        if (plan.Protocol.HandlesNone && weights[^1] > Negligible * weights.Max())
            Go(cursor, outcomes[^1].With(step.Slot, Scripts.Binding.Value.None));
    }

    private void Follow(Branch[] outcomes, double[] weights, int slot, Cursor cursor)
    {
        double least = Negligible * weights.Max();
        for (int k = 0; k < outcomes.Length; k++)
        {
            if (weights[k] > least)
                Go(cursor, outcomes[k].With(slot, Scripts.Binding.Value.Of(k)));
        }
    }

    private void Intercept(InterceptPlanStep step, Cursor cursor, Branch branch)
    {
        if (Value(step.Basis, branch) is not BasisValue basis)
        {
            Go(cursor, branch.With(step.Slot, Scripts.Binding.Value.None));
            return;
        }

        Branch[] outcomes = [.. models.Projections(basis).Select(p => branch.Acting(step.Victim, p))];
        Follow(outcomes, [.. outcomes.Select(o => o.Weight(models.Basis.Trace))], step.Slot, cursor);
    }

    /// <summary>Whether the party that makes a value has given up.</summary>
    private bool Idle(int slot, Branch branch) => branch.Aborted != 0 && branch.HasAborted(plan.Protocol.Slots[slot].Party);

    private Value Value(BoundExpression expression, Branch branch) => ValueEvaluator.Evaluate(expression, branch.Slots, models.Basis.Levels);

    private bool Holds(BoundExpression condition, Branch branch) => Value(condition, branch) is TruthValue { Truth: true };
}
