using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Studies;

/// <summary>What <c>sweep</c> tells: figures against one or two varied values.</summary>
public sealed record SweepResult
{
    /// <summary>Program version.</summary>
    public required string Version { get; init; }

    /// <summary>The script.</summary>
    public required InputFile Protocol { get; init; }

    /// <summary>Name in the <c>protocol</c> line.</summary>
    public required string Title { get; init; }

    /// <summary>The conditions; null when ideal.</summary>
    public required InputFile? Conditions { get; init; }

    /// <summary>Overrides that hold at every point.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>What was varied; one or two.</summary>
    public required IReadOnlyList<Variation> Varied { get; init; }

    /// <summary>The points, the first variation slowest.</summary>
    public required IReadOnlyList<SweepPoint> Points { get; init; }

    /// <summary>Goals on figures of the points; those on harms are left out.</summary>
    public required IReadOnlyList<SweepGoal> Goals { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>A goal that points are held against.</summary>
/// <param name="Figure">Name of the figure, as in the points.</param>
/// <param name="Text">The goal as written.</param>
/// <param name="Threshold">What the figure is compared with.</param>
public sealed record SweepGoal(string Figure, string Text, double Threshold);

/// <summary>One point of a sweep.</summary>
/// <param name="Values">Values varied, in their units.</param>
/// <param name="Figures">Figures by name, the worst over inputs; empty when the point failed.</param>
/// <param name="GoalsMet">Whether all goals are met; null when there are none or the point failed.</param>
/// <param name="Failure">What stood against the point, with its code; null when it was computed.</param>
public sealed record SweepPoint(IReadOnlyList<double> Values, IReadOnlyList<KeyValuePair<string, Estimate>> Figures, bool? GoalsMet, string? Failure)
{
    /// <summary>Bands of figures from the uncertain values, to first order; empty when uncertainties are not carried through.</summary>
    public IReadOnlyList<PointBand> Bands { get; init; } = [];

    /// <summary>Whether no goal is missed throughout its band, but some is missed at one end of it.</summary>
    public bool Undecided { get; init; }
}

/// <summary>The band of a figure at one point.</summary>
/// <param name="Name">Name of the figure.</param>
/// <param name="StandardUncertainty">Standard uncertainty to first order; not a number where a derivative is not defined.</param>
/// <param name="Low">Lower end of the 95 % band.</param>
/// <param name="High">Upper end.</param>
public sealed record PointBand(string Name, double StandardUncertainty, double Low, double High);

/// <summary>State of a sweep.</summary>
/// <param name="Done">Points finished.</param>
/// <param name="Total">Points in all.</param>
/// <param name="Remaining">Estimated time left, s; null before anything can be said.</param>
public sealed record SweepProgress(int Done, int Total, double? Remaining);

/// <summary>What <c>sweep</c> is asked.</summary>
/// <param name="Run">Script, conditions and what holds at every point.</param>
/// <param name="Vary">Path and range, once or twice.</param>
/// <param name="Journal">File that keeps finished points until the sweep is done; null keeps none.</param>
/// <param name="Progress">Told about every finished point; null for nobody.</param>
public sealed record SweepRequest(RunRequest Run, IReadOnlyList<KeyValuePair<string, string>> Vary, string? Journal, IProgress<SweepProgress>? Progress);
