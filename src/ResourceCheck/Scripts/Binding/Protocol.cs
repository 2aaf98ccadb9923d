using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A checked protocol at fixed parameter values: loops unrolled, names resolved, every action known to be possible for its actor.</summary>
public sealed record Protocol
{
    /// <summary>The script's text, for places in later messages.</summary>
    public required SourceText Source { get; init; }

    /// <summary>Name in the <c>protocol</c> line.</summary>
    public required string Name { get; init; }

    /// <summary>One-line description; empty when there is none.</summary>
    public required string About { get; init; }

    /// <summary>All parties in the order declared, outsiders last.</summary>
    public required IReadOnlyList<string> Parties { get; init; }

    /// <summary>Indices, ascending, of parties that hold a qudit at the start. First is the most significant site.</summary>
    public required IReadOnlyList<int> Holders { get; init; }

    /// <summary>Indices of outsiders.</summary>
    public required IReadOnlyList<int> Outsiders { get; init; }

    /// <summary>Levels of each qudit: as many as holders.</summary>
    public int Levels => Holders.Count;

    /// <summary>Parameters with the values used here.</summary>
    public required IReadOnlyList<ParameterValue> Parameters { get; init; }

    /// <summary>Private inputs; their slots are filled before the first step.</summary>
    public required IReadOnlyList<InputValues> Inputs { get; init; }

    /// <summary>All variables, messages and inputs.</summary>
    public required IReadOnlyList<SlotInfo> Slots { get; init; }

    /// <summary>What happens, in the order written.</summary>
    public required IReadOnlyList<Step> Steps { get; init; }

    /// <summary>The referee's condition.</summary>
    public required BoundExpression Success { get; init; }

    /// <summary>Further figures, in the order written.</summary>
    public required IReadOnlyList<Report> Reports { get; init; }

    /// <summary>What the protocol promises under ideal conditions.</summary>
    public required IReadOnlyList<Claim> Claims { get; init; }

    /// <summary>What the user needs.</summary>
    public required IReadOnlyList<Goal> Goals { get; init; }

    /// <summary>Conditions on parameters, with whether they hold here.</summary>
    public required IReadOnlyList<Requirement> Requirements { get; init; }

    /// <summary>The part that works on lists; null for a protocol on single copies.</summary>
    public ListProtocol? Lists { get; init; }

    /// <summary>Cheating strategies, in the order written.</summary>
    public IReadOnlyList<DishonestCase> Dishonest { get; init; } = [];

    /// <summary>When the cheat at hand does harm; null in the honest case. See <see cref="DishonestCase.In"/>.</summary>
    public BoundExpression? Harm { get; init; }

    /// <summary>Whether the script mentions <c>none</c>, and so handles measurements without a click itself.</summary>
    public required bool HandlesNone { get; init; }
}

/// <summary>A parameter with its value here.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Value">Its value here.</param>
/// <param name="IsDefault">Whether the script's default was used.</param>
public sealed record ParameterValue(string Name, Rational Value, bool IsDefault);

/// <summary>A private input: who holds it and what it may be.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Party">Index of the holder.</param>
/// <param name="Slot">Slot that holds it.</param>
/// <param name="Values">The values tried.</param>
public sealed record InputValues(string Name, int Party, int Slot, IReadOnlyList<Value> Values);

/// <summary>A place for one value per copy.</summary>
/// <param name="Name">Name as written, such as <c>k</c>; in a loop every turn has a slot of its own.</param>
/// <param name="Party">Index of the party that makes it.</param>
/// <param name="Kind">How the value comes about.</param>
/// <param name="Span">Where it is made.</param>
public sealed record SlotInfo(string Name, int Party, SlotKind Kind, Span Span);

/// <summary>How a slot's value comes about.</summary>
public enum SlotKind
{
    /// <summary>Outcome of a measurement.</summary>
    Outcome,

    /// <summary>Random choice.</summary>
    Pick,

    /// <summary>Computed locally.</summary>
    Set,

    /// <summary>Content of a message, fixed when sent.</summary>
    Message,

    /// <summary>Private input.</summary>
    Input,
}

/// <summary>A further figure.</summary>
/// <param name="Label">Its label.</param>
/// <param name="Figure">What is computed.</param>
public sealed record Report(string Label, Figure Figure);

/// <summary>A promise: two figures and a comparison between them (<c>=</c>, <c>&gt;=</c>, <c>&lt;=</c>).</summary>
/// <param name="Text">The claim as written, without the word <c>claim</c>.</param>
/// <param name="Left">Left side.</param>
/// <param name="Comparison">How the sides compare.</param>
/// <param name="Right">Right side.</param>
/// <param name="Span">Where it stands.</param>
public sealed record Claim(string Text, Figure Left, BinaryOperator Comparison, Figure Right, Span Span);

/// <summary>A need: a metric, a comparison (<c>&gt;=</c>, <c>&lt;=</c>) and a number.</summary>
/// <param name="Text">The goal as written, without the word <c>goal</c>.</param>
/// <param name="Metric">What is compared.</param>
/// <param name="Comparison">How.</param>
/// <param name="Threshold">With what.</param>
/// <param name="Span">Where it stands.</param>
public sealed record Goal(string Text, MetricName Metric, BinaryOperator Comparison, double Threshold, Span Span);

/// <summary>A condition on parameters that the protocol needs.</summary>
/// <param name="Text">The condition as written.</param>
/// <param name="Reason">Why it is needed.</param>
/// <param name="Holds">Whether it holds here.</param>
/// <param name="Figures">Both sides with their values here, such as <c>2 &gt;= 3</c>.</param>
/// <param name="Span">Where it stands.</param>
public sealed record Requirement(string Text, string Reason, bool Holds, string Figures, Span Span);
