using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>inspect</c>; docs/schema/inspection.schema.json describes it.</summary>
internal static class InspectDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(InspectResult inspection, TextWriter writer) => JsonParts.WriteDocument(writer, "inspection", inspection.Version, json =>
    {
        JsonParts.Protocol(json, inspection.Protocol, inspection.Title);
        JsonParts.Conditions(json, inspection.Conditions, inspection.Overrides);
        JsonParts.Parameters(json, inspection.Parameters);
        JsonParts.Array(json, "parties", inspection.Parties, json.WriteStringValue);
        json.WriteNumber("levels", inspection.Levels);
        JsonParts.Number(json, "duration", inspection.Duration);
        JsonParts.Engine(json, inspection.Engine);
        json.WriteBoolean("fits", inspection.Fits);
        JsonParts.Objects(json, "costs", inspection.Costs, c =>
        {
            json.WriteString("parameters", c.Parameters);
            JsonParts.Number(json, "duration", c.Duration);
            JsonParts.Engine(json, c.Engine);
            json.WriteBoolean("fits", c.Fits);
        });
        JsonParts.Objects(json, "requirements", inspection.Requirements, r =>
        {
            json.WriteString("text", r.Text);
            json.WriteString("reason", r.Reason);
            json.WriteString("figures", r.Figures);
            json.WriteBoolean("holds", r.Holds);
        });
        JsonParts.Objects(json, "knowledge", inspection.Knowledge, k =>
        {
            json.WriteNumber("line", k.Line);
            json.WriteString("statement", k.Statement);
            json.WriteString("learned", k.Learned);
        });
        JsonParts.Timeline(json, inspection.Timeline);
        JsonParts.Warnings(json, inspection.Warnings);
    });
}
