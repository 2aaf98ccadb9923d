using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>The result document of <c>run</c>: everything every report format shows, ordered once.</summary>
public sealed record RunResult
{
    /// <summary>Program version.</summary>
    public required string Version { get; init; }

    /// <summary>The script.</summary>
    public required InputFile Protocol { get; init; }

    /// <summary>Name in the <c>protocol</c> line.</summary>
    public required string Title { get; init; }

    /// <summary>The conditions; null when ideal.</summary>
    public required InputFile? Conditions { get; init; }

    /// <summary>Overrides in the order given.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>Which engine and why.</summary>
    public required EngineChoice Engine { get; init; }

    /// <summary>Estimated error of the probabilities from integrating collective decay; 0 when there was none.</summary>
    public double IntegrationError { get; init; }

    /// <summary>Seed of sampled figures; null when nothing was sampled.</summary>
    public required long? Seed { get; init; }

    /// <summary>Parameters with the values used; several values where all were tried.</summary>
    public required IReadOnlyList<ParameterUse> Parameters { get; init; }

    /// <summary>The honest case, then the dishonest ones.</summary>
    public required IReadOnlyList<CaseResult> Cases { get; init; }

    /// <summary>What each cheating strategy does at its worst numbers.</summary>
    public IReadOnlyList<AttackResult> Attacks { get; init; } = [];

    /// <summary>How verdicts on lists were found, in a sentence; null for a protocol on single copies.</summary>
    public string? ListMethod { get; init; }

    /// <summary>Copies kept for one use of a list protocol, with the time until they are; null for a protocol on single copies or without a preparation rate.</summary>
    public (int Copies, double? Seconds)? List { get; init; }

    /// <summary>Every assignment of physical levels to values, best first; empty when they were not compared.</summary>
    public IReadOnlyList<LevelsResult> Levels { get; init; } = [];

    /// <summary>What a drift does to failure and harms; null when none was asked for.</summary>
    public DriftResult? Drift { get; init; }

    /// <summary>What the uncertainties of the conditions make of the figures; null when that was not asked for.</summary>
    public UncertaintyResult? Uncertainty { get; init; }

    /// <summary>Checkpoints in order.</summary>
    public required IReadOnlyList<CheckpointResult> Checkpoints { get; init; }

    /// <summary>Kept fraction of prepared copies, with its factors.</summary>
    public required YieldResult Yield { get; init; }

    /// <summary>What becomes of attempts stage by stage, with rates where the conditions give a preparation rate.</summary>
    public RateChain? Rates { get; init; }

    /// <summary>Time of one copy, s; the longest over listed parameter values.</summary>
    public required double Duration { get; init; }

    /// <summary>Shortest and longest time of one copy over listed parameter values, s; null when there is but one.</summary>
    public (double Low, double High)? DurationRange { get; init; }

    /// <summary>Seconds per kept copy at the preparation rate, the most over inputs and listed parameter values; null when no rate is given.</summary>
    public required double? SecondsPerKeptCopy { get; init; }

    /// <summary>Least and most seconds per kept copy over inputs and listed parameter values; null when there is but one.</summary>
    public (double Low, double High)? SecondsPerKeptCopyRange { get; init; }

    /// <summary>Goals in the order written.</summary>
    public required IReadOnlyList<GoalResult> Goals { get; init; }

    /// <summary>The verdict.</summary>
    public required Verdict Verdict { get; init; }

    /// <summary>The verdict in words: first line of the text output.</summary>
    public required string VerdictText { get; init; }

    /// <summary>What limits the result, in words; null when nothing does.</summary>
    public required string? Hint { get; init; }

    /// <summary>All parties in the script's order.</summary>
    public IReadOnlyList<string> Parties { get; init; } = [];

    /// <summary>The schedule.</summary>
    public required IReadOnlyList<ScheduleLine> Timeline { get; init; }

    /// <summary>Warnings and notes that go with the numbers.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>An input file and its hash.</summary>
/// <param name="Name">Name as the user gave it.</param>
/// <param name="Sha256">SHA-256 of its bytes, lower-case hexadecimal.</param>
public sealed record InputFile(string Name, string Sha256);

/// <summary>A parameter's value or values.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Values">Exact values as text, such as <c>4</c> or <c>1/3</c>.</param>
/// <param name="IsDefault">Whether the script's default was used.</param>
public sealed record ParameterUse(string Name, IReadOnlyList<string> Values, bool IsDefault);

/// <summary>The metrics of the honest case or of one dishonest case.</summary>
/// <param name="Case"><c>honest</c> or the name of the dishonest block.</param>
/// <param name="Dishonest">Who cheats; empty in the honest case.</param>
/// <param name="Metrics">Metrics in order.</param>
public sealed record CaseResult(string Case, IReadOnlyList<string> Dishonest, IReadOnlyList<MetricResult> Metrics);

/// <summary>One metric.</summary>
/// <param name="Name"><c>success</c>, <c>failure</c>, <c>abort</c>, <c>harm</c> or a report's label.</param>
/// <param name="Estimate">The number, its label and interval. Over inputs and listed parameters the worst: least success, greatest failure, abort and harm.</param>
/// <param name="Ideal">The same figure under ideal conditions.</param>
/// <param name="Range">Least and greatest over inputs and listed parameter values; null when there is but one.</param>
/// <param name="WorstAt">Input and parameter values at which the shown value is taken; null when there is but one, and where all are alike.</param>
public sealed record MetricResult(string Name, Estimate Estimate, double? Ideal, (double Low, double High)? Range, string? WorstAt);

/// <summary>A cheating strategy at the numbers that do most harm.</summary>
/// <param name="Case">Name of the dishonest block.</param>
/// <param name="At">Parameter and input values; null when there is but one assignment.</param>
/// <param name="Choices">Numbers chosen by the cheat, by name.</param>
/// <param name="Value">Harm at these numbers. On lists it is conditional on the cheat's list holding enough positions, and so a bound on what these numbers achieve.</param>
/// <param name="Average">Average harm of a cheat that picks after it has seen its own list; null where it has no list or no choice, or where it was not evaluated.</param>
/// <param name="Method">How numbers and harm were found.</param>
public sealed record AttackResult(string Case, string? At, IReadOnlyList<KeyValuePair<string, string>> Choices, Estimate Value, Estimate? Average, string Method);

/// <summary>Failure and harms when a fraction of runs is under worse conditions.</summary>
/// <param name="Fraction">The fraction.</param>
/// <param name="Conditions">The worse conditions.</param>
/// <param name="Figures">Case and figure, with the whole and the part that the drift alone gives: no number of copies brings the whole below that.</param>
public sealed record DriftResult(double Fraction, InputFile Conditions, IReadOnlyList<DriftFigure> Figures);

/// <summary>One figure under drift.</summary>
/// <param name="Case"><c>honest</c> or the name of a dishonest block.</param>
/// <param name="Name"><c>failure</c> or <c>harm</c>.</param>
/// <param name="Whole">(1 - fraction) · figure + fraction · figure under the worse conditions.</param>
/// <param name="Floor">fraction · figure under the worse conditions.</param>
public sealed record DriftFigure(string Case, string Name, Estimate Whole, Estimate Floor);

/// <summary>Fidelity at a checkpoint.</summary>
/// <param name="Name">Its label.</param>
/// <param name="Fidelity">Fidelity of the copies kept so far; the least over inputs and listed parameter values; not a number where it is never reached.</param>
/// <param name="Ideal">The same under ideal conditions; null where it is never reached then.</param>
/// <param name="Loss">Ideal minus fidelity; null where there is no ideal.</param>
/// <param name="Kept">Fraction of prepared copies kept so far.</param>
/// <param name="At">Time of the look, s; not a number where it is never reached.</param>
/// <param name="Branches">Fidelity by outcomes.</param>
/// <param name="BuiltIn">Whether it is <c>prepared</c>, <c>stored</c> or <c>arrived</c>.</param>
public sealed record CheckpointResult(string Name, Estimate Fidelity, double? Ideal, double? Loss, double Kept, double At, IReadOnlyList<BranchEvaluation> Branches, bool BuiltIn)
{
    /// <summary>Least and greatest fidelity over inputs and listed parameter values; null when there is but one.</summary>
    public (double Low, double High)? Range { get; init; }
}

/// <summary>Kept fraction and its factors; all exact for exact engines.</summary>
/// <param name="Value">Heralded · seen · kept.</param>
/// <param name="Heralded">All heralded qudits arrived.</param>
/// <param name="Seen">Of these, every measurement clicked.</param>
/// <param name="Kept">Of these, kept by the script.</param>
/// <param name="OnlySeen">Whether figures are "of the copies that all saw": some copies were dropped for a missing click.</param>
public sealed record YieldResult(Estimate Value, double Heralded, double Seen, double Kept, bool OnlySeen)
{
    /// <summary>Least and greatest over inputs and listed parameter values; null when there is but one.</summary>
    public (double Low, double High)? Range { get; init; }
}

/// <summary>A goal and whether it is met.</summary>
/// <param name="Text">The goal as written.</param>
/// <param name="Value">The figure compared.</param>
/// <param name="Threshold">What it is compared with.</param>
/// <param name="Met">Whether it is met at the central values.</param>
/// <param name="Margin">How far inside (positive) or outside (negative) the goal the figure lies.</param>
public sealed record GoalResult(string Text, Estimate Value, double Threshold, bool Met, double Margin)
{
    /// <summary>The figure's band; null when no uncertainties were carried through, or not to this figure.</summary>
    public FigureBand? Band { get; init; }

    /// <summary>Whether the goal is met at one end of the band and missed at the other: the conditions are not known well enough to tell.</summary>
    public bool Undecided { get; init; }
}

/// <summary>A line of the schedule with names in place of indices.</summary>
/// <param name="Start">s.</param>
/// <param name="End">s.</param>
/// <param name="Party">Party name; <c>all</c> for everybody.</param>
/// <param name="Kind">Kind.</param>
/// <param name="Text">What happens.</param>
/// <param name="To">A message's recipient; null otherwise.</param>
public sealed record ScheduleLine(double Start, double End, string Party, TimelineKind Kind, string Text, string? To);

/// <summary>Whether the goals are met.</summary>
public enum Verdict
{
    /// <summary>There are no goals.</summary>
    NoGoals,

    /// <summary>All goals are met.</summary>
    Met,

    /// <summary>Some goal is not met.</summary>
    NotMet,

    /// <summary>No goal is missed throughout its band, but some is met at one end of it and missed at the other.</summary>
    Undecided,
}
