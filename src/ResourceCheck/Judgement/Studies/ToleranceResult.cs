using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;

namespace ResourceCheck.Judgement.Studies;

/// <summary>What <c>tolerance</c> tells: how far a value may go before a goal is missed.</summary>
public sealed record ToleranceResult
{
    /// <summary>Program version.</summary>
    public required string Version { get; init; }

    /// <summary>The script.</summary>
    public required InputFile Protocol { get; init; }

    /// <summary>Name in the <c>protocol</c> line.</summary>
    public required string Title { get; init; }

    /// <summary>The conditions; null when ideal.</summary>
    public required InputFile? Conditions { get; init; }

    /// <summary>Overrides that hold at every value.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>What is varied.</summary>
    public required Variation Varied { get; init; }

    /// <summary>The goal held.</summary>
    public required string Goal { get; init; }

    /// <summary>Name of the goal's figure.</summary>
    public required string Figure { get; init; }

    /// <summary>What the goal compares it with.</summary>
    public required double Threshold { get; init; }

    /// <summary>All values that were evaluated, ascending, with the goal's figure.</summary>
    public required IReadOnlyList<ScanPoint> Scan { get; init; }

    /// <summary>Engine used.</summary>
    public required EngineChoice Engine { get; init; }

    /// <summary>Values at which the goal is just met, ascending.</summary>
    public required IReadOnlyList<Crossing> Crossings { get; init; }

    /// <summary>Whether the goal is met at the ends of the range.</summary>
    public required (bool From, bool To) MetAt { get; init; }

    /// <summary>The value that the conditions, or the script for a parameter, give today; null when they give none.</summary>
    public TodaysValue? Today { get; init; }

    /// <summary>What the other uncertain values make of the crossings, a figure each, in their order; null when that was not asked for.</summary>
    public UncertaintyResult? Uncertainty { get; init; }

    /// <summary>Number of evaluations.</summary>
    public required int Evaluations { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>The goal's figure at one value, in the unit varied.</summary>
public sealed record ScanPoint(double Value, Estimate Figure);

/// <summary>A value at which the goal is just met.</summary>
/// <param name="Value">The value, in the unit varied; for whole numbers the last one that meets the goal.</param>
/// <param name="MetBelow">Whether the goal is met below it and missed above, rather than the reverse.</param>
/// <param name="Figure">The goal's figure there.</param>
/// <param name="Flight">Longest flight there: distance in m and time in s; null where nothing flies.</param>
public sealed record Crossing(double Value, bool MetBelow, Estimate Figure, (double Metres, double Seconds)? Flight)
{
    /// <summary>How far it lies above today's value (below: negative), in the unit varied; null when there is none today.</summary>
    public double? FromToday { get; init; }

    /// <summary>The same relative to today's value; null when there is none today or it is 0.</summary>
    public double? Relative { get; init; }

    /// <summary>Its band from the other uncertain values; null when uncertainties are not carried through, or for whole numbers.</summary>
    public FigureBand? Band { get; init; }
}

/// <summary>The value that is varied, as it is without being varied.</summary>
/// <param name="Value">The value, in the unit varied.</param>
/// <param name="Met">Whether it meets the goal.</param>
/// <param name="Figure">The goal's figure there.</param>
public sealed record TodaysValue(double Value, bool Met, Estimate Figure);

/// <summary>What <c>tolerance</c> is asked.</summary>
/// <param name="Run">Script, conditions and what holds at every value.</param>
/// <param name="Vary">Path and range.</param>
/// <param name="Goal">Goal to hold, as behind the word <c>goal</c>; null takes the script's tightest.</param>
public sealed record ToleranceRequest(RunRequest Run, IReadOnlyList<KeyValuePair<string, string>> Vary, string? Goal);
