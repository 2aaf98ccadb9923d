using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>Texts about uncertain values (P045 to P047).</summary>
internal static class UncertaintyMessages
{
    public static Diagnostic CannotMove(UncertainInput input, Diagnostic refusal) => new(
        "P045",
        Severity.Error,
        $"`{input.Path}` carries an uncertainty, but cannot be moved by a part of it while all other values stay: {refusal.Message.TrimEnd('.')} ({refusal.Code}).",
        "give the uncertainty to a value that others do not depend on, such as one number of confusion in place of a matrix, or leave it out",
        Place.Of(input.Path));

    public static Diagnostic NotLinear(FigureBand figure, string reason) => new(
        "P046",
        Severity.Warning,
        $"{Name(figure)} bends within the uncertainties: {reason}.",
        "go by the sampled band; a sweep over the value shows the bend",
        Place.Of("--uncertainty"));

    public static Diagnostic NothingUncertain() => new(
        "P047",
        Severity.Warning,
        "No value of the conditions carries an uncertainty, so there is none to carry through: values such as \"80(10) us\" fit here.",
        "write the standard uncertainty behind a value, in units of its last digits",
        Place.Of("--uncertainty"));

    /// <summary>A figure as sentences name it.</summary>
    public static string Name(FigureBand figure) => figure.Kind switch
    {
        FigureKind.Checkpoint => $"Fidelity \"{figure.Name}\"",
        FigureKind.Goal => $"The figure of the goal {figure.Name}",
        FigureKind.Tolerance => $"The tolerated {figure.Name}",
        _ => figure.Name,
    };

    public static string OtherLaw(FigureBand figure, SampledBand sampled) =>
        $"to first order it is {FigureText.Number(figure.Value.Value)} ± {FigureText.Uncertainty(figure.StandardUncertainty)}, from draws {FigureText.Number(sampled.Mean)} ± {FigureText.Uncertainty(sampled.StandardUncertainty)}";

    public static string TwoSteps(string path) => $"its derivative by {path} differs from one step to the next";
}
