using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>What <c>budget</c> tells: how much each source of loss costs.</summary>
public sealed record BudgetResult
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

    /// <summary>Parameters with the values used.</summary>
    public required IReadOnlyList<ParameterUse> Parameters { get; init; }

    /// <summary>Which engine and why.</summary>
    public required EngineChoice Engine { get; init; }

    /// <summary>Name of the figure whose loss is shared out.</summary>
    public required string Metric { get; init; }

    /// <summary>Parameter and input values at which it comes off worst; empty when there is but one assignment.</summary>
    public required string At { get; init; }

    /// <summary>The figure with all sources and with none.</summary>
    public required (double Value, double Ideal) Figures { get; init; }

    /// <summary>What is lost in all: positive where the figure is worse than ideal.</summary>
    public required double Loss { get; init; }

    /// <summary>One entry per source present, greatest share first.</summary>
    public required IReadOnlyList<SourceShare> Shares { get; init; }

    /// <summary>What the uncertain values make of the whole loss; null when that was not asked for.</summary>
    public UncertaintyResult? Uncertainty { get; init; }

    /// <summary>What to improve first, in words; null when nothing is lost.</summary>
    public required string? Advice { get; init; }

    /// <summary>Warnings and notes.</summary>
    public required IReadOnlyList<Diagnostic> Warnings { get; init; }
}

/// <summary>One source's part of a loss. All exact.</summary>
/// <param name="Source">The source.</param>
/// <param name="Alone">Loss with this source only.</param>
/// <param name="Removed">Loss that goes away when this source alone is removed.</param>
/// <param name="Share">Shapley share: the mean, over all orders of adding sources, of what this one adds (L. S. Shapley, in Contributions to the Theory of Games II, 307 (1953)). Shares add up to the whole loss.</param>
public sealed record SourceShare(Source Source, double Alone, double Removed, double Share)
{
    /// <summary>Standard uncertainty of <see cref="Alone"/> from the uncertain values, to first order; null when uncertainties are not carried through.</summary>
    public double? AloneUncertainty { get; init; }

    /// <summary>Standard uncertainty of <see cref="Removed"/>.</summary>
    public double? RemovedUncertainty { get; init; }

    /// <summary>Standard uncertainty of <see cref="Share"/>.</summary>
    public double? ShareUncertainty { get; init; }
}
