using MathNet.Numerics.Distributions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>Carries the uncertainties of conditions through to figures: to first order, and by draws as a check.</summary>
internal static class UncertaintyJudgement
{
    /// <summary>Standard uncertainties that a 95 % band of a normal law reaches to each side: 1.96.</summary>
    private static readonly double Coverage = Normal.InvCDF(0, 1, (1 + UncertaintyResult.Confidence) / 2);

    /// <summary>Part of the uncertainty by which draws may differ, or that two steps may leave open, before a reader is warned.</summary>
    private const double Noticeable = 0.1;

    /// <summary>Standard deviations of the drawn uncertainty itself that are put down to chance.</summary>
    private const double Chance = 4;

    /// <summary>The uncertainties of figures.</summary>
    /// <param name="setup">The setup at the central values.</param>
    /// <param name="centre">Figures there.</param>
    /// <param name="leading">The figure that is looked at first.</param>
    /// <param name="samples">Draws; 0 for none.</param>
    /// <param name="source">Gives the figures elsewhere.</param>
    public static Outcome<UncertaintyResult> Of(Setup setup, IReadOnlyList<NamedFigure> centre, FigureKey? leading, int samples, FigureSource source)
    {
        IReadOnlyList<UncertainInput> inputs = UncertainInputs.Of(setup.Document);
        NamedFigure[] exact = [.. centre.Where(f => f.Value.Label != TruthLabel.Sampled && double.IsFinite(f.Value.Value))];
        Outcome<IReadOnlyList<InputDerivatives>> linear = LinearPropagation.Of(setup.Request, inputs, exact, source);
        if (linear.Value is not { } derivatives)
            return Outcome<UncertaintyResult>.Failed(linear.Findings);
        SampledPropagation? sampled = samples > 0 && inputs.Count > 0 ? SampledPropagation.Of(setup.Request, inputs, samples, source) : null;
        FigureBand[] figures = [.. exact.Select(f => Band(f, derivatives, sampled?.Band(f.Key)))];
        UncertaintyResult result = new()
        {
            Inputs = inputs,
            Figures = figures,
            Leading = leading is { } key ? figures.FirstOrDefault(f => f.Kind == key.Kind && f.Case == key.Case && f.Name == key.Name) : null,
            Samples = sampled is null ? 0 : samples,
            Redrawn = sampled?.Redrawn ?? 0,
            Seed = setup.Request.Seed,
            LeftOut = [.. centre.Where(f => f.Value.Label == TruthLabel.Sampled).Select(f => $"{f.Key.Name}: sampled itself, so that differences of it are mostly chance")],
        };
        return new Outcome<UncertaintyResult>(result, inputs.Count == 0 ? [UncertaintyMessages.NothingUncertain()] : [.. Warnings(result)]);
    }

    /// <summary>A figure's band to first order.</summary>
    public static FigureBand Band(NamedFigure figure, IReadOnlyList<InputDerivatives> derivatives, SampledBand? sampled)
    {
        double[] moves = [.. derivatives.Select(d => d.Of[figure.Key].Value * d.Input.BaseUncertainty)];
        double uncertainty = Math.Sqrt(moves.Sum(m => m * m)), variance = uncertainty * uncertainty;
        Sensitivity[] sensitivities = [.. derivatives.Zip(moves, (d, move) => new Sensitivity(
            d.Input.Path, d.Of[figure.Key].Value * Scale(d.Input), d.Of[figure.Key].Error * Scale(d.Input), d.OneSided, move, variance > 0 ? move * move / variance : 0))];
        return new FigureBand(
            figure.Key.Kind,
            figure.Key.Case,
            figure.Key.Name,
            figure.Value,
            uncertainty,
            Math.Max(Math.Min(figure.Range.Low, figure.Value.Value), figure.Value.Value - (Coverage * uncertainty)),
            Math.Min(Math.Max(figure.Range.High, figure.Value.Value), figure.Value.Value + (Coverage * uncertainty)),
            sampled,
            [.. sensitivities.OrderByDescending(s => s.Share)]);
    }

    private static double Scale(UncertainInput input) => input.BaseUncertainty / input.StandardUncertainty;

    /// <summary>What a reader must know before relying on first order, for the figures of goals and the one looked at first.</summary>
    private static IEnumerable<Diagnostic> Warnings(UncertaintyResult result)
    {
        foreach (FigureBand figure in result.Figures.Where(f => f.Moves && (f.Kind == FigureKind.Goal || ReferenceEquals(f, result.Leading))))
        {
            if (figure.Sampled is { } sampled && Bends(figure, sampled, result.Samples))
                yield return UncertaintyMessages.NotLinear(figure, UncertaintyMessages.OtherLaw(figure, sampled));
            else if (figure.Sensitivities.FirstOrDefault(s => s.DerivativeError * Math.Abs(s.Moves) > Noticeable * figure.StandardUncertainty * Math.Abs(s.Derivative)) is { } rough)
                yield return UncertaintyMessages.NotLinear(figure, UncertaintyMessages.TwoSteps(rough.Path));
        }
    }

    /// <summary>Whether draws give another uncertainty or centre than first order does, by more than chance.</summary>
    private static bool Bends(FigureBand figure, SampledBand sampled, int samples)
    {
        double spread = Math.Max(figure.StandardUncertainty, sampled.StandardUncertainty);
        return Math.Abs(sampled.StandardUncertainty - figure.StandardUncertainty) > spread * (Noticeable + (Chance / Math.Sqrt(2.0 * samples)))
            || Math.Abs(sampled.Mean - figure.Value.Value) > spread * (Noticeable + (Chance / Math.Sqrt(samples)));
    }
}
