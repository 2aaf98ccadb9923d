using System.Text.Json;
using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>tolerance</c>; docs/schema/tolerance.schema.json describes it.</summary>
internal static class ToleranceDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(ToleranceResult tolerance, TextWriter writer) => JsonParts.WriteDocument(writer, "tolerance", tolerance.Version, json =>
    {
        JsonParts.Protocol(json, tolerance.Protocol, tolerance.Title);
        JsonParts.Conditions(json, tolerance.Conditions, tolerance.Overrides);
        JsonParts.Engine(json, tolerance.Engine);
        JsonParts.Object(json, "varied", () => JsonParts.Varied(json, tolerance.Varied));
        json.WriteString("goal", tolerance.Goal);
        json.WriteBoolean("metAtFrom", tolerance.MetAt.From);
        json.WriteBoolean("metAtTo", tolerance.MetAt.To);
        json.WriteNumber("evaluations", tolerance.Evaluations);
        if (tolerance.Today is { } today)
            JsonParts.Object(json, "today", () => Today(json, today));
        else
            json.WriteNull("today");
        JsonParts.Objects(json, "crossings", tolerance.Crossings, c =>
        {
            JsonParts.Number(json, "at", c.Value);
            json.WriteBoolean("metBelow", c.MetBelow);
            JsonParts.Object(json, "figure", () => JsonParts.EstimateFields(json, c.Figure));
            JsonParts.Number(json, "metres", c.Flight?.Metres);
            JsonParts.Number(json, "seconds", c.Flight?.Seconds);
            JsonParts.Number(json, "fromToday", c.FromToday);
            JsonParts.Number(json, "relative", c.Relative);
            JsonParts.Number(json, "standardUncertainty", c.Band?.StandardUncertainty);
            JsonParts.Number(json, "bandLow", c.Band?.Low);
            JsonParts.Number(json, "bandHigh", c.Band?.High);
        });
        UncertaintyDocument.Write(json, tolerance.Uncertainty);
        JsonParts.Warnings(json, tolerance.Warnings);
    });

    private static void Today(Utf8JsonWriter json, TodaysValue today)
    {
        JsonParts.Number(json, "value", today.Value);
        json.WriteBoolean("met", today.Met);
        JsonParts.Object(json, "figure", () => JsonParts.EstimateFields(json, today.Figure));
    }
}
