using System.Collections.Immutable;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>One action of a protocol whose loops are unrolled; a statement with several actors becomes one step per actor.</summary>
/// <param name="Span">Statement it came from.</param>
public abstract record Step(Span Span)
{
    /// <summary>Counters of the loops that it was unrolled from, with their values in its turn; empty outside loops.</summary>
    public ImmutableDictionary<string, int> Counters { get; init; } = ImmutableDictionary<string, int>.Empty;
}

/// <summary>A party measures its qudit, which is consumed; the outcome goes to a slot.</summary>
public sealed record MeasureStep(Span Span, int Party, BoundExpression Basis, int Slot) : Step(Span);

/// <summary>A private uniform random choice.</summary>
public sealed record PickStep(Span Span, int Party, int Slot, IReadOnlyList<BoundExpression> Options) : Step(Span);

/// <summary>A party computes a value for itself.</summary>
public sealed record SetStep(Span Span, int Party, int Slot, BoundExpression Value) : Step(Span);

/// <summary>A classical message; its value is fixed when sent and held in a slot of its own. Announcing is sending to everybody else.</summary>
public sealed record SendStep(Span Span, int Party, int Slot, BoundExpression Value, IReadOnlyList<int> Recipients, bool Announced) : Step(Span);

/// <summary>A local unitary.</summary>
public sealed record ApplyStep(Span Span, int Party, BoundUnitary Unitary) : Step(Span);

/// <summary>A party idles.</summary>
public sealed record WaitStep(Span Span, int Party, Duration Time) : Step(Span);

/// <summary>An outsider measures a party's qudit in flight and sends on the basis vector found.</summary>
public sealed record InterceptStep(Span Span, int Outsider, int Victim, BoundExpression Basis, int Slot) : Step(Span);

/// <summary>Conditional steps; names made in one branch only are none in the other.</summary>
public sealed record WhenStep(Span Span, BoundExpression Condition, IReadOnlyList<Step> Then, IReadOnlyList<Step> Otherwise) : Step(Span);

/// <summary>The copy is dropped unless the condition holds.</summary>
public sealed record KeepStep(Span Span, BoundExpression Condition) : Step(Span);

/// <summary>The state of some parties is compared with the ideal one; the parties stand in the order of the protocol.</summary>
public sealed record CheckpointStep(Span Span, string Label, IReadOnlyList<int> Parties) : Step(Span);

/// <summary>A party gives up when the condition holds.</summary>
public sealed record AbortStep(Span Span, int Party, BoundExpression Condition) : Step(Span);

/// <summary>A local unitary whose arguments are evaluated at run time; with <c>none</c> it is the identity.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Kind">Which kind.</param>
/// <param name="Basis">Basis of complement.</param>
/// <param name="First">k of shift, clock, complement; i of levelswap; m of <c>fourier on m</c>, null for all levels.</param>
/// <param name="Second">j of levelswap.</param>
/// <param name="File">File of matrix.</param>
public sealed record BoundUnitary(Span Span, UnitaryKind Kind, BoundExpression? Basis, BoundExpression? First, BoundExpression? Second, string? File);
