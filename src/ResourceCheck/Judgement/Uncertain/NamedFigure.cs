using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>What a figure is called, the same at all values of the conditions.</summary>
internal readonly record struct FigureKey(FigureKind Kind, string Case, string Name);

/// <summary>A figure at one set of conditions.</summary>
/// <param name="Key">What it is called.</param>
/// <param name="Value">Value and label.</param>
/// <param name="Range">Where such a figure can lie at all.</param>
internal sealed record NamedFigure(FigureKey Key, Estimate Value, FigureRange Range);

/// <summary>Where a figure can lie.</summary>
internal readonly record struct FigureRange(double Low, double High)
{
    /// <summary>Probabilities and fidelities.</summary>
    public static FigureRange Probability { get; } = new(0, 1);

    /// <summary>Times.</summary>
    public static FigureRange NotNegative { get; } = new(0, double.PositiveInfinity);

    /// <summary>Everything else.</summary>
    public static FigureRange Any { get; } = new(double.NegativeInfinity, double.PositiveInfinity);
}

/// <summary>Figures of a setup; null when they cannot be had, which makes them undefined there.</summary>
internal delegate IReadOnlyList<NamedFigure>? FigureSource(Setup setup);
