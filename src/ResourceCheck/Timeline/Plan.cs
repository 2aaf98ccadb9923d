using ResourceCheck.Conditions;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Timeline;

/// <summary>What happens to each qudit and value, in order, with noise already placed by the clock. Every engine takes this and nothing else.</summary>
public sealed record Plan
{
    /// <summary>The protocol the plan is of.</summary>
    public required Protocol Protocol { get; init; }

    /// <summary>The world the plan is under.</summary>
    public required World World { get; init; }

    /// <summary>Whether any qudit can be lost or leak, so that a sink level is needed.</summary>
    public required bool NeedsSink { get; init; }

    /// <summary>What happens, in an order that respects every dependence.</summary>
    public required IReadOnlyList<PlanStep> Steps { get; init; }

    /// <summary>The schedule as people read it, in order of time.</summary>
    public required IReadOnlyList<TimelineEntry> Timeline { get; init; }

    /// <summary>Time from the end of preparation until the last party is done.</summary>
    public required Duration Duration { get; init; }
}

/// <summary>A line of the schedule.</summary>
/// <param name="Start">When it begins; preparation ends at 0.</param>
/// <param name="End">When it ends.</param>
/// <param name="Party">Index of the party; -1 for everybody.</param>
/// <param name="Kind">What kind of thing.</param>
/// <param name="Text">What happens, in words: <c>measures fourier as k</c>.</param>
/// <param name="To">Index of a message's recipient; -1 otherwise.</param>
public sealed record TimelineEntry(Duration Start, Duration End, int Party, TimelineKind Kind, string Text, int To = -1);

/// <summary>Kinds of lines of the schedule.</summary>
public enum TimelineKind
{
    /// <summary>The emitters stand side by side.</summary>
    Storage,

    /// <summary>A qudit travels.</summary>
    Flight,

    /// <summary>A qudit is held.</summary>
    Waiting,

    /// <summary>A local unitary.</summary>
    Operation,

    /// <summary>A measurement.</summary>
    Detection,

    /// <summary>A classical message travels.</summary>
    Message,

    /// <summary>An outsider intercepts.</summary>
    Interception,

    /// <summary>The state is compared with the ideal one.</summary>
    Checkpoint,
}
