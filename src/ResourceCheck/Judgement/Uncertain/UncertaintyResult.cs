using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>What the uncertainties of conditions make of the figures of a result.</summary>
public sealed record UncertaintyResult
{
    /// <summary>Values that carry an uncertainty, in the order of the conditions file.</summary>
    public required IReadOnlyList<UncertainInput> Inputs { get; init; }

    /// <summary>Every figure whose uncertainty was found.</summary>
    public required IReadOnlyList<FigureBand> Figures { get; init; }

    /// <summary>The figure that a reader looks at first: that of the goal with the least margin, else the last checkpoint, else success; null when it has no band.</summary>
    public required FigureBand? Leading { get; init; }

    /// <summary>Draws of the check; 0 when there was none.</summary>
    public required int Samples { get; init; }

    /// <summary>Draws outside what the conditions allow, which were drawn anew: the normal laws are truncated by so much.</summary>
    public required int Redrawn { get; init; }

    /// <summary>Seed of the draws.</summary>
    public required long Seed { get; init; }

    /// <summary>Figures left out, in words, with the reason; empty when there are none.</summary>
    public required IReadOnlyList<string> LeftOut { get; init; }

    /// <summary>Part of the law of a figure that its band holds.</summary>
    public const double Confidence = 0.95;

    /// <summary>The band of a figure; null when it has none.</summary>
    /// <param name="kind">What sort of figure.</param>
    /// <param name="name">Its name.</param>
    /// <param name="of">Its case.</param>
    public FigureBand? Find(FigureKind kind, string name, string of = FigureBand.Honest) => Figures.FirstOrDefault(f => f.Kind == kind && f.Name == name && f.Case == of);
}

/// <summary>A value of the conditions that carries a standard uncertainty. Everybody who uses the entry sees the same value, so what shares it moves together; entries are independent of each other.</summary>
/// <param name="Path">Its path, as <c>--set</c> takes it.</param>
/// <param name="Value">Value, in <paramref name="Unit"/>.</param>
/// <param name="StandardUncertainty">Standard uncertainty, in <paramref name="Unit"/>; above 0.</param>
/// <param name="Unit">Unit as written; empty for a plain number.</param>
public sealed record UncertainInput(string Path, double Value, double StandardUncertainty, string Unit)
{
    /// <summary>The value in its base unit, to the last bit as the conditions hold it.</summary>
    internal double Base { get; init; }

    /// <summary>The uncertainty in the base unit.</summary>
    internal double BaseUncertainty { get; init; }

    /// <summary>The base unit; empty for a plain number.</summary>
    internal string BaseUnit { get; init; } = "";
}

/// <summary>Sorts of figures.</summary>
public enum FigureKind
{
    /// <summary>A metric of the honest case or of a dishonest one.</summary>
    Metric,

    /// <summary>Fidelity at a checkpoint.</summary>
    Checkpoint,

    /// <summary>Kept fraction of prepared copies.</summary>
    Yield,

    /// <summary>A time, s.</summary>
    Time,

    /// <summary>The figure of a goal, where it comes off worst.</summary>
    Goal,

    /// <summary>A loss of a budget.</summary>
    Loss,

    /// <summary>A tolerated value, in the unit varied.</summary>
    Tolerance,
}

/// <summary>
/// A figure with what the uncertain values make of it. First order: u² = Σ (∂f/∂x)² u(x)², the law of propagation of uncertainty for
/// independent inputs (JCGM 100:2008, 5.1.2); the band is the figure ± 1.96 u, cut off where the figure cannot lie.
/// </summary>
/// <param name="Kind">What sort of figure.</param>
/// <param name="Case"><c>honest</c> or the name of a dishonest block.</param>
/// <param name="Name">Name of the metric, label of the checkpoint, text of the goal, or source of the loss.</param>
/// <param name="Value">The figure at the central values, with its label.</param>
/// <param name="StandardUncertainty">Standard uncertainty to first order; not a number where a derivative is not defined.</param>
/// <param name="Low">Lower end of the 95 % band, to first order.</param>
/// <param name="High">Upper end.</param>
/// <param name="Sampled">The same from draws; null where there were none.</param>
/// <param name="Sensitivities">What each uncertain value contributes, the greatest contribution first.</param>
public sealed record FigureBand(
    FigureKind Kind, string Case, string Name, Estimate Value, double StandardUncertainty, double Low, double High, SampledBand? Sampled, IReadOnlyList<Sensitivity> Sensitivities)
{
    /// <summary>Name of the case without cheats.</summary>
    public const string Honest = "honest";

    /// <summary>Uncertainties below this are round-off.</summary>
    private const double RoundOff = 1e-12;

    /// <summary>Whether the uncertain values move it at all, to first order or in the draws.</summary>
    public bool Moves => !(StandardUncertainty < RoundOff) || Sampled is { StandardUncertainty: >= RoundOff };

    /// <summary>Lowest value that the band to first order or that of the draws reaches.</summary>
    public double Least => Sampled is { Low: var low } && low < Low ? low : Low;

    /// <summary>Greatest value that either band reaches.</summary>
    public double Greatest => Sampled is { High: var high } && high > High ? high : High;
}

/// <summary>A figure's law from draws of the uncertain values: normal, truncated to what the conditions allow.</summary>
/// <param name="Mean">Mean.</param>
/// <param name="StandardUncertainty">Standard deviation.</param>
/// <param name="Low">2.5 % quantile.</param>
/// <param name="High">97.5 % quantile.</param>
/// <param name="Undefined">Draws at which the figure is not defined; they are left out.</param>
public sealed record SampledBand(double Mean, double StandardUncertainty, double Low, double High, int Undefined);

/// <summary>What one uncertain value does to a figure.</summary>
/// <param name="Path">Path of the value.</param>
/// <param name="Derivative">∂f/∂x, in the figure's unit per unit of the value as written.</param>
/// <param name="DerivativeError">Estimated error of the derivative, from two steps.</param>
/// <param name="OneSided">Whether the value stands so near to the end of what the conditions allow that only one side could be looked at.</param>
/// <param name="Moves">Derivative times standard uncertainty: what the figure moves with the value, with its sign.</param>
/// <param name="Share">Part of the figure's variance that is this value's; all shares of a figure add up to 1, or are 0 when it does not move at all.</param>
public sealed record Sensitivity(string Path, double Derivative, double DerivativeError, bool OneSided, double Moves, double Share);
