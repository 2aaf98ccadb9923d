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
                PointBand? band = p.Bands.FirstOrDefault(b => b.Name == f.Key);
                JsonParts.Number(json, "standardUncertainty", band?.StandardUncertainty);
                JsonParts.Number(json, "bandLow", band?.Low);
                JsonParts.Number(json, "bandHigh", band?.High);
            });
            if (p.GoalsMet is { } met)
                json.WriteBoolean("goalsMet", met);
            else
                json.WriteNull("goalsMet");
            json.WriteBoolean("undecided", p.Undecided);
            json.WriteString("failure", p.Failure);
        });
        JsonParts.Warnings(json, sweep.Warnings);
    });
}
