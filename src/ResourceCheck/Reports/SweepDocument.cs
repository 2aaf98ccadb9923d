using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>sweep</c>; docs/schema/sweep.schema.json describes it.</summary>
internal static class SweepDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(SweepResult sweep, TextWriter writer) => JsonParts.WriteDocument(writer, "sweep", sweep.Version, json =>
    {
        JsonParts.Protocol(json, sweep.Protocol, sweep.Title);
        JsonParts.Conditions(json, sweep.Conditions, sweep.Overrides);
        JsonParts.Objects(json, "varied", sweep.Varied, v => JsonParts.Varied(json, v));
        JsonParts.Objects(json, "points", sweep.Points, p =>
        {
            JsonParts.Array(json, "values", p.Values, json.WriteNumberValue);
            JsonParts.Objects(json, "figures", p.Figures, f =>
            {
                json.WriteString("name", f.Key);
                JsonParts.EstimateFields(json, f.Value);
            });
            if (p.GoalsMet is { } met)
                json.WriteBoolean("goalsMet", met);
            else
                json.WriteNull("goalsMet");
            json.WriteString("failure", p.Failure);
        });
        JsonParts.Warnings(json, sweep.Warnings);
    });
}
