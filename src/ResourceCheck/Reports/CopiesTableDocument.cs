using System.Text.Json;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>copies</c> for several targets or values; docs/schema/copies-table.schema.json describes it.</summary>
internal static class CopiesTableDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(CopiesTable copies, TextWriter writer) => JsonParts.WriteDocument(writer, "copies-table", copies.Version, json =>
    {
        JsonParts.Protocol(json, copies.Protocol, copies.Title);
        JsonParts.Conditions(json, copies.Conditions, copies.Overrides);
        json.WriteString("parameter", copies.Parameter);
        if (copies.Varied is { } varied)
            JsonParts.Object(json, "varied", () => JsonParts.Varied(json, varied));
        else
            json.WriteNull("varied");
        JsonParts.Objects(json, "rows", copies.Rows, r => Row(json, r));
        JsonParts.Warnings(json, copies.Warnings);
    });

    private static void Row(Utf8JsonWriter json, CopiesRow row)
    {
        JsonParts.Number(json, "value", row.Value);
        JsonParts.Number(json, "failureTarget", row.Targets.Failure);
        JsonParts.Number(json, "harmTarget", row.Targets.Harm);
        JsonParts.Number(json, "copies", row.Copies);
        Figure(json, "failure", row.Failure);
        Figure(json, "harm", row.Harm);
        JsonParts.Number(json, "seconds", row.Seconds);
        JsonParts.Objects(json, "thresholds", row.Thresholds, t =>
        {
            json.WriteString("name", t.Key);
            json.WriteString("value", t.Value);
        });
        json.WriteString("refusal", row.Refusal);
    }

    private static void Figure(Utf8JsonWriter json, string name, Estimate? estimate)
    {
        if (estimate is null)
            json.WriteNull(name);
        else
            JsonParts.Object(json, name, () => JsonParts.EstimateFields(json, estimate));
    }
}
