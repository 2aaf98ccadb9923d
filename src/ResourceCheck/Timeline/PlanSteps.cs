using ResourceCheck.Conditions;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Timeline;

/// <summary>A step of a plan. Sites are parties that hold qudits, by their index in the protocol.</summary>
public abstract record PlanStep;

/// <summary>Noise on one qudit.</summary>
/// <param name="Party">Whose qudit.</param>
/// <param name="Noise">What acts.</param>
/// <param name="Source">What a budget books it under.</param>
public sealed record NoisePlanStep(int Party, SiteNoise Noise, Source Source) : PlanStep;

/// <summary>Collective decay of all qudits before they part. Levels are physical ones.</summary>
public sealed record StoragePlanStep(CollectiveModel Model) : PlanStep;

/// <summary>The copy is dropped when the party's qudit did not arrive.</summary>
public sealed record HeraldPlanStep(int Party) : PlanStep;

/// <summary>A unitary whose arguments depend on classical values, then its depolarising.</summary>
public sealed record ApplyPlanStep(int Party, BoundUnitary Unitary, OperationModel Model) : PlanStep;

/// <summary>A measurement; without a click the slot is none.</summary>
public sealed record MeasurePlanStep(int Party, BoundExpression Basis, int Slot, DetectionModel Model) : PlanStep;

/// <summary>An ideal measurement in flight that sends on the basis vector found; only the outsider knows the outcome.</summary>
public sealed record InterceptPlanStep(int Victim, BoundExpression Basis, int Slot) : PlanStep;

/// <summary>A uniform random choice.</summary>
public sealed record PickPlanStep(int Slot, IReadOnlyList<BoundExpression> Options) : PlanStep;

/// <summary>A value is computed or a message's content fixed.</summary>
public sealed record AssignPlanStep(int Slot, BoundExpression Value) : PlanStep;

/// <summary>The copy is dropped unless the condition holds.</summary>
public sealed record KeepPlanStep(BoundExpression Condition) : PlanStep;

/// <summary>A party gives up when the condition holds: the copy counts as aborted, the party's later values are none.</summary>
public sealed record AbortPlanStep(int Party, BoundExpression Condition) : PlanStep;

/// <summary>One of two lists of steps is taken; both take the same time.</summary>
public sealed record WhenPlanStep(BoundExpression Condition, IReadOnlyList<PlanStep> Then, IReadOnlyList<PlanStep> Otherwise) : PlanStep;

/// <summary>A look at a copy of the state on which each party has waited for the last.</summary>
/// <param name="Label">The checkpoint's label.</param>
/// <param name="Parties">Whose state is compared with the antisymmetric state of as many parties, ascending.</param>
/// <param name="Waits">What acts on each of these qudits, on the copy only.</param>
/// <param name="At">When the last party is ready.</param>
public sealed record CheckpointPlanStep(string Label, IReadOnlyList<int> Parties, IReadOnlyList<NoisePlanStep> Waits, Quantities.Duration At) : PlanStep;

/// <summary>Noise on one qudit, in the order of the fields: dynamics for a time, leakage, rotation, phase noise, dephasing, depolarising, Kraus operators, transmission.</summary>
public sealed record SiteNoise
{
    /// <summary>Markovian dynamics; null for none.</summary>
    public LocalDynamics? Dynamics { get; init; }

    /// <summary>How long the dynamics act.</summary>
    public Quantities.Duration Time { get; init; }

    /// <summary>Probability per level of leaking into the sink; null for none.</summary>
    public double[]? LeakageProbability { get; init; }

    /// <summary>A fixed unitary; null for none.</summary>
    public System.Numerics.Complex[,]? Rotation { get; init; }

    /// <summary>d×d: factor of each element by phase noise; null for none.</summary>
    public double[,]? PhaseFactors { get; init; }

    /// <summary>Off-diagonals times 1 minus this.</summary>
    public double Dephasing { get; init; }

    /// <summary>Depolarising probability.</summary>
    public double Depolarising { get; init; }

    /// <summary>Kraus operators; null for none.</summary>
    public IReadOnlyList<System.Numerics.Complex[,]>? Kraus { get; init; }

    /// <summary>Probability per level of not being lost; null for none lost.</summary>
    public double[]? Transmission { get; init; }
}
