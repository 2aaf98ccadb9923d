using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement;

/// <summary>What <c>inspect</c> tells.</summary>
public sealed record InspectResult
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
    public IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; } = [];

    /// <summary>Parameters with the values used.</summary>
    public required IReadOnlyList<ParameterUse> Parameters { get; init; }

    /// <summary>Parties in order.</summary>
    public required IReadOnlyList<string> Parties { get; init; }

    /// <summary>Levels needed of each qudit.</summary>
    public required int Levels { get; init; }

    /// <summary>After each line that makes or moves a value: who knows what.</summary>
    public required IReadOnlyList<KnowledgeLine> Knowledge { get; init; }

    /// <summary>The schedule under the given conditions.</summary>
    public required IReadOnlyList<ScheduleLine> Timeline { get; init; }

    /// <summary>Time of one copy, s.</summary>
    public required double Duration { get; init; }

    /// <summary>Which engine would run, why, and what it would cost.</summary>
    public required EngineChoice Engine { get; init; }

    /// <summary>Whether that engine can take it.</summary>
    public required bool Fits { get; init; }

    /// <summary>The cost of each of several parameter assignments; empty when there is but one.</summary>
    public required IReadOnlyList<SettingCost> Costs { get; init; }

    /// <summary>Conditions on parameters and whether they hold.</summary>
    public required IReadOnlyList<RequirementLine> Requirements { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>What one parameter assignment would cost.</summary>
/// <param name="Parameters">The assignment in words, such as <c>n = 4</c>.</param>
/// <param name="Duration">Time of one copy, s.</param>
/// <param name="Engine">Engine, memory and work.</param>
/// <param name="Fits">Whether it would run.</param>
public sealed record SettingCost(string Parameters, double Duration, EngineChoice Engine, bool Fits);

/// <summary>A line of the script and what becomes known by it.</summary>
/// <param name="Line">Line of the script, from 1.</param>
/// <param name="Statement">The line as written, without comment and indentation.</param>
/// <param name="Learned">Who learns what: <c>Ada, Ben know Dov.k</c>.</param>
public sealed record KnowledgeLine(int Line, string Statement, string Learned);

/// <summary>A requirement and whether it holds.</summary>
/// <param name="Text">The condition as written.</param>
/// <param name="Reason">Why it is needed.</param>
/// <param name="Figures">Both sides with their values.</param>
/// <param name="Holds">Whether it holds.</param>
public sealed record RequirementLine(string Text, string Reason, string Figures, bool Holds);
