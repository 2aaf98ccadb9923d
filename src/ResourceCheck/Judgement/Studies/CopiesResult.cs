using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Studies;

/// <summary>What <c>copies</c> tells: how many copies a failure probability costs.</summary>
public sealed record CopiesResult
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

    /// <summary>Parameters with the values used at the number found: the thresholds.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Thresholds { get; init; }

    /// <summary>Names of the thresholds that were chosen here; the others are as given.</summary>
    public IReadOnlyList<string> Optimised { get; init; } = [];

    /// <summary>Parameter behind <c>copies</c>.</summary>
    public required string Parameter { get; init; }

    /// <summary>What honest failure and harms must not exceed.</summary>
    public required (double Failure, double Harm) Targets { get; init; }

    /// <summary>Least number found from which on the targets hold.</summary>
    public required int Copies { get; init; }

    /// <summary>Greatest number up to which honest failure was checked at every number.</summary>
    public required int CheckedUpTo { get; init; }

    /// <summary>Numbers looked at, ascending, with honest failure and, where it was searched, the worst harm.</summary>
    public required IReadOnlyList<CopiesStep> Steps { get; init; }

    /// <summary>Worst of the listed strategies at the number found.</summary>
    public required IReadOnlyList<AttackResult> Attacks { get; init; }

    /// <summary>Time until the copies are kept, s; null when the conditions give no preparation rate.</summary>
    public required double? Seconds { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>One number of copies that was looked at.</summary>
/// <param name="Copies">The number.</param>
/// <param name="Failure">Failure of the honest case, the worst over inputs.</param>
/// <param name="Harm">Greatest harm over strategies and inputs; null where it was not searched.</param>
public sealed record CopiesStep(int Copies, Estimate Failure, Estimate? Harm);

/// <summary>What <c>copies</c> is asked.</summary>
/// <param name="Run">Script, conditions, thresholds.</param>
/// <param name="Failure">What honest failure must not exceed.</param>
/// <param name="Harm">What harms must not exceed; from 1 on none is searched.</param>
/// <param name="Progress">Told about every number looked at; null for nobody.</param>
public sealed record CopiesRequest(RunRequest Run, double Failure, double Harm, IProgress<CopiesStep>? Progress)
{
    /// <summary>Parameters that are chosen so that few copies suffice; <c>all</c> stands for all with a real range.</summary>
    public IReadOnlyList<string> Optimise { get; init; } = [];
}
