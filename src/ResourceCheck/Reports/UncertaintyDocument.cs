using System.Text.Json;
using ResourceCheck.Judgement.Uncertain;

namespace ResourceCheck.Reports;

/// <summary>The part of result documents that tells what uncertain values do.</summary>
internal static class UncertaintyDocument
{
    /// <summary>Writes the field <c>uncertainty</c>; null where it was not asked for.</summary>
    public static void Write(Utf8JsonWriter json, UncertaintyResult? uncertainty)
    {
        if (uncertainty is null)
        {
            json.WriteNull("uncertainty");
            return;
        }

        JsonParts.Object(json, "uncertainty", () =>
        {
            JsonParts.Number(json, "confidence", UncertaintyResult.Confidence);
            JsonParts.Number(json, "samples", uncertainty.Samples);
            JsonParts.Number(json, "redrawn", uncertainty.Redrawn);
            json.WriteNumber("seed", uncertainty.Seed);
            JsonParts.Objects(json, "inputs", uncertainty.Inputs, i => Input(json, i));
            JsonParts.Objects(json, "figures", uncertainty.Figures, f => Figure(json, f));
            JsonParts.Array(json, "leftOut", uncertainty.LeftOut, json.WriteStringValue);
        });
    }

    /// <summary>A kind's name.</summary>
    public static string Name(FigureKind kind) => kind switch
    {
        FigureKind.Metric => "metric",
        FigureKind.Checkpoint => "checkpoint",
        FigureKind.Yield => "yield",
        FigureKind.Time => "time",
        FigureKind.Goal => "goal",
        FigureKind.Tolerance => "tolerance",
        _ => "loss",
    };

    /// <summary>What each value contributes.</summary>
    public static void Sensitivities(Utf8JsonWriter json, IReadOnlyList<Sensitivity> sensitivities) => JsonParts.Objects(json, "sensitivities", sensitivities, s =>
    {
        json.WriteString("path", s.Path);
        JsonParts.Number(json, "derivative", s.Derivative);
        JsonParts.Number(json, "derivativeError", s.DerivativeError);
        json.WriteBoolean("oneSided", s.OneSided);
        JsonParts.Number(json, "moves", s.Moves);
        JsonParts.Number(json, "share", s.Share);
    });

    private static void Input(Utf8JsonWriter json, UncertainInput input)
    {
        json.WriteString("path", input.Path);
        JsonParts.Number(json, "value", input.Value);
        JsonParts.Number(json, "standardUncertainty", input.StandardUncertainty);
        json.WriteString("unit", input.Unit);
    }

    private static void Figure(Utf8JsonWriter json, FigureBand figure)
    {
        json.WriteString("kind", Name(figure.Kind));
        json.WriteString("case", figure.Case);
        json.WriteString("name", figure.Name);
        JsonParts.Number(json, "value", figure.Value.Value);
        json.WriteString("label", Truth.Name(figure.Value.Label));
        JsonParts.Number(json, "standardUncertainty", figure.StandardUncertainty);
        JsonParts.Number(json, "low", figure.Low);
        JsonParts.Number(json, "high", figure.High);
        if (figure.Sampled is { } sampled)
            JsonParts.Object(json, "sampled", () => Sampled(json, sampled));
        else
            json.WriteNull("sampled");
        Sensitivities(json, figure.Sensitivities);
    }

    private static void Sampled(Utf8JsonWriter json, SampledBand sampled)
    {
        JsonParts.Number(json, "mean", sampled.Mean);
        JsonParts.Number(json, "standardUncertainty", sampled.StandardUncertainty);
        JsonParts.Number(json, "low", sampled.Low);
        JsonParts.Number(json, "high", sampled.High);
        JsonParts.Number(json, "undefined", sampled.Undefined);
    }
}
