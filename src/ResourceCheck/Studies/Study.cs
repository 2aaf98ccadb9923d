using ResourceCheck.Judgement;

namespace ResourceCheck.Studies;

/// <summary>What a study file asks for, read and checked: the parts of a feasibility section.</summary>
/// <param name="Title">Title of the report.</param>
/// <param name="About">What the study is about, in the author's words; null for nothing.</param>
/// <param name="File">The study file.</param>
/// <param name="Parts">Its parts, each a protocol under conditions.</param>
public sealed record Study(string Title, string? About, InputFile File, IReadOnlyList<StudyPart> Parts);

/// <summary>One protocol under conditions with what is to be found out.</summary>
public sealed record StudyPart
{
    /// <summary>Title in the report.</summary>
    public required string Title { get; init; }

    /// <summary>The author's words; null for none.</summary>
    public string? About { get; init; }

    /// <summary>Script, conditions, overrides, parameters.</summary>
    public required RunRequest Request { get; init; }

    /// <summary>Whether the loss is shared out among its sources.</summary>
    public bool Budget { get; init; }

    /// <summary>Values of which the tolerated one is sought.</summary>
    public IReadOnlyList<StudyTolerance> Tolerances { get; init; } = [];

    /// <summary>Curves and maps: one or two paths with their ranges.</summary>
    public IReadOnlyList<IReadOnlyList<KeyValuePair<string, string>>> Sweeps { get; init; } = [];

    /// <summary>Failure probabilities whose price in copies is sought.</summary>
    public IReadOnlyList<StudyCopies> Copies { get; init; } = [];
}

/// <summary>A tolerance to be found.</summary>
/// <param name="Path">Path or parameter.</param>
/// <param name="Range">Range, as behind <c>--vary</c>.</param>
/// <param name="Goal">Goal to hold; null takes the script's tightest.</param>
public sealed record StudyTolerance(string Path, string Range, string? Goal);

/// <summary>A number of copies to be found.</summary>
/// <param name="Failure">What honest failure must not exceed.</param>
/// <param name="Harm">What harms must not exceed; 1 looks at none.</param>
/// <param name="Vary">Path and range against which the number is found; empty for today's value alone.</param>
public sealed record StudyCopies(double Failure, double Harm, IReadOnlyList<KeyValuePair<string, string>> Vary);
