using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Uncertainty of a tolerated value from all other uncertain values: where the margin m(x, y) of a goal is 0, ∂x/∂y = -(∂m/∂y)/(∂m/∂x),
/// by the implicit function theorem.
/// </summary>
internal static class CrossingUncertainty
{
    /// <summary>Steps for the slope by the tolerated value itself, as parts of the range: the first that the conditions allow is taken.</summary>
    private static readonly double[] SlopeSteps = [1e-4, 1e-5, 1e-6];

    /// <summary>The band of one crossing.</summary>
    /// <param name="at">The request at the crossing.</param>
    /// <param name="inputs">What is uncertain there.</param>
    /// <param name="varied">What is varied.</param>
    /// <param name="value">Where the crossing is.</param>
    /// <param name="margin">The goal's margin at a setup; null where it cannot be had.</param>
    /// <param name="marginAt">The goal's margin at a value; null where it cannot be had.</param>
    public static Outcome<FigureBand> Of(RunRequest at, IReadOnlyList<UncertainInput> inputs, Variation varied, double value, Func<Setup, double?> margin, Func<double, double?> marginAt)
    {
        FigureKey key = new(FigureKind.Tolerance, FigureBand.Honest, varied.Path);
        Outcome<IReadOnlyList<InputDerivatives>> linear = LinearPropagation.Of(
            at, inputs, [Figure(0)], setup => margin(setup) is { } found ? [Figure(found)] : null);
        if (linear.Value is not { } derivatives)
            return Outcome<FigureBand>.Failed(linear.Findings);
        double slope = Slope(varied, value, marginAt);
        InputDerivatives[] moved = [.. derivatives.Select(d => d with { Of = new Dictionary<FigureKey, (double, double)> { [key] = (-d.Of[key].Value / slope, Math.Abs(d.Of[key].Error / slope)) } })];
        return Outcome<FigureBand>.Of(UncertaintyJudgement.Band(Figure(value), moved, null));

        NamedFigure Figure(double of) => new(key, Estimate.Exact(of), FigureRange.Any);
    }

    private static double Slope(Variation varied, double value, Func<double, double?> marginAt)
    {
        foreach ((double part, Stencil stencil) in SlopeSteps.SelectMany(p => Stencil.All.Select(s => (p, s))))
        {
            double step = part * (varied.To - varied.From);
            double?[] margins = [.. stencil.Points.Select(p => p.Place == 0 ? marginAt(value) : marginAt(value + (p.Place * step)))];
            if (margins.All(m => m is not null))
                return stencil.Derive([.. margins.Select(m => m!.Value)], step).Derivative;
        }

        return double.NaN;
    }
}
