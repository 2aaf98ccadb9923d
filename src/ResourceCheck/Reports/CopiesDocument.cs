using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>copies</c>; docs/schema/copies.schema.json describes it.</summary>
internal static class CopiesDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(CopiesResult copies, TextWriter writer) => JsonParts.WriteDocument(writer, "copies", copies.Version, json =>
    {
        JsonParts.Protocol(json, copies.Protocol, copies.Title);
        JsonParts.Conditions(json, copies.Conditions, copies.Overrides);
        JsonParts.Objects(json, "thresholds", copies.Thresholds, t =>
        {
            json.WriteString("name", t.Key);
            json.WriteString("value", t.Value);
        });
        JsonParts.Array(json, "optimised", copies.Optimised, json.WriteStringValue);
        json.WriteString("parameter", copies.Parameter);
        JsonParts.Number(json, "failureTarget", copies.Targets.Failure);
        JsonParts.Number(json, "harmTarget", copies.Targets.Harm);
        json.WriteNumber("copies", copies.Copies);
        json.WriteNumber("checkedUpTo", copies.CheckedUpTo);
        JsonParts.Number(json, "seconds", copies.Seconds);
        JsonParts.Objects(json, "steps", copies.Steps, s =>
        {
            json.WriteNumber("copies", s.Copies);
            JsonParts.Object(json, "failure", () => JsonParts.EstimateFields(json, s.Failure));
            if (s.Harm is { } harm)
                JsonParts.Object(json, "harm", () => JsonParts.EstimateFields(json, harm));
            else
                json.WriteNull("harm");
        });
        JsonParts.Objects(json, "attacks", copies.Attacks, a => RunDocument.Attack(json, a));
        JsonParts.Warnings(json, copies.Warnings);
    });
}
