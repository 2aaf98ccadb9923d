using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Numbers of copies against failure probability and against one varied value.</summary>
public sealed record CopiesTable
{
    /// <summary>Program version.</summary>
    public required string Version { get; init; }

    /// <summary>The script.</summary>
    public required InputFile Protocol { get; init; }

    /// <summary>Name in the <c>protocol</c> line.</summary>
    public required string Title { get; init; }

    /// <summary>The conditions; null when ideal.</summary>
    public required InputFile? Conditions { get; init; }

    /// <summary>Overrides that hold in every row.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>Parameter behind <c>copies</c>.</summary>
    public required string Parameter { get; init; }

    /// <summary>What is varied; null when only the targets are.</summary>
    public required Variation? Varied { get; init; }

    /// <summary>The rows, varied values slowest, targets in the order given.</summary>
    public required IReadOnlyList<CopiesRow> Rows { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>A number of copies for one target at one value.</summary>
/// <param name="Value">Value varied, in its unit; null when nothing is.</param>
/// <param name="Targets">What honest failure and harms must not exceed; from 1 on harms are not searched.</param>
/// <param name="Copies">Least number found from which on the targets hold; null where there is none.</param>
/// <param name="Failure">Honest failure at that number; null where there is none.</param>
/// <param name="Harm">Worst harm at that number; null where there is none or harms are not searched.</param>
/// <param name="Seconds">Time until the copies are kept, s; null without a preparation rate.</param>
/// <param name="Refusal">Why there is no number, with its code; null when there is one.</param>
public sealed record CopiesRow(double? Value, (double Failure, double Harm) Targets, int? Copies, Estimate? Failure, Estimate? Harm, double? Seconds, string? Refusal)
{
    /// <summary>Thresholds used at the number found; empty where there is none.</summary>
    public IReadOnlyList<KeyValuePair<string, string>> Thresholds { get; init; } = [];
}

/// <summary>What a table of copies is asked.</summary>
/// <param name="Copies">What holds in every row; its targets are replaced by those of the row.</param>
/// <param name="Failures">Targets of honest failure.</param>
/// <param name="Harm">Target of harms in every row; null takes that of the failure.</param>
/// <param name="Vary">Path and range, at most one.</param>
public sealed record CopiesTableRequest(CopiesRequest Copies, IReadOnlyList<double> Failures, double? Harm, IReadOnlyList<KeyValuePair<string, string>> Vary);
