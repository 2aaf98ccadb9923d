using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Studies;

/// <summary>What <c>report</c> finds out.</summary>
/// <param name="Version">Program version.</param>
/// <param name="Study">The study.</param>
/// <param name="Parts">One entry for each part, in its order.</param>
public sealed record StudyResult(string Version, Study Study, IReadOnlyList<StudyPartResult> Parts)
{
    /// <summary>Whether any goal of any part is missed or undecided.</summary>
    public bool AnyMissed => Parts.Any(p => p.Run?.Verdict is Verdict.NotMet or Verdict.Undecided);
}

/// <summary>Results of one part; what failed is missing and told in <see cref="Failures"/>.</summary>
public sealed record StudyPartResult
{
    /// <summary>The part.</summary>
    public required StudyPart Part { get; init; }

    /// <summary>Its evaluation; null when it failed.</summary>
    public RunResult? Run { get; init; }

    /// <summary>Loss by source; null when not asked for or failed.</summary>
    public BudgetResult? Budget { get; init; }

    /// <summary>Tolerances found.</summary>
    public IReadOnlyList<ToleranceResult> Tolerances { get; init; } = [];

    /// <summary>Curves and maps.</summary>
    public IReadOnlyList<SweepResult> Sweeps { get; init; } = [];

    /// <summary>Numbers of copies.</summary>
    public IReadOnlyList<CopiesResult> Copies { get; init; } = [];

    /// <summary>Numbers of copies against a varied value.</summary>
    public IReadOnlyList<CopiesTable> CopiesTables { get; init; } = [];

    /// <summary>What could not be had, in words, with the findings that say why.</summary>
    public IReadOnlyList<StudyFailure> Failures { get; init; } = [];
}

/// <summary>Something that a part asked for and that could not be had.</summary>
/// <param name="What">What, in words.</param>
/// <param name="Findings">Why.</param>
public sealed record StudyFailure(string What, IReadOnlyList<Diagnostic> Findings);

/// <summary>What <c>report</c> is asked.</summary>
/// <param name="Study">The study.</param>
/// <param name="Journals">Folder that keeps finished points of sweeps until the report is written; null keeps none.</param>
/// <param name="Progress">Told about every step that begins; null for nobody.</param>
/// <param name="Threads">Threads; 0 uses all cores.</param>
/// <param name="Seed">Seed of sampled figures.</param>
/// <param name="Cancellation">Stops the work.</param>
public sealed record StudyRequest(Study Study, string? Journals, IProgress<StudyProgress>? Progress, int Threads, long Seed, CancellationToken Cancellation);

/// <summary>A step that begins.</summary>
/// <param name="Step">Number of the step, from 1.</param>
/// <param name="Steps">Steps in all.</param>
/// <param name="Part">Title of the part.</param>
/// <param name="What">What is found out.</param>
/// <param name="Remaining">Time left, s, if steps go on as so far; null before anything can be said.</param>
public sealed record StudyProgress(int Step, int Steps, string Part, string What, double? Remaining);
