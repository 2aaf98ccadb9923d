using System.Text.Json;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>state</c>; docs/schema/state.schema.json describes it.</summary>
internal static class StateDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(StateDescription state, string version, TextWriter writer) => JsonParts.WriteDocument(writer, "state", version, json =>
    {
        json.WriteString("file", state.File);
        json.WriteString("sha256", state.Sha256);
        json.WriteNumber("parties", state.Parties);
        json.WriteNumber("levels", state.Levels);
        json.WriteBoolean("vector", state.IsVector);
        JsonParts.Object(json, "validity", () =>
        {
            JsonParts.Number(json, "hermitian", state.Validity.Hermitian);
            JsonParts.Number(json, "trace", state.Validity.Trace);
            JsonParts.Number(json, "lowestEigenvalue", state.Validity.LowestEigenvalue);
        });
        JsonParts.Number(json, "mendedBy", state.MendedBy);
        JsonParts.Objects(json, "figures", state.Figures, f => Figure(json, f));
        JsonParts.Objects(json, "populations", state.Populations, p =>
        {
            json.WriteString("levels", p.Levels);
            JsonParts.Number(json, "population", p.Value);
            JsonParts.Number(json, "mended", p.Mended);
        });
    });

    private static void Figure(Utf8JsonWriter json, StateFigure figure)
    {
        json.WriteString("name", figure.Name);
        JsonParts.Number(json, "value", figure.Value);
        if (!double.IsFinite(figure.Value))
            json.WriteString("reason", FigureText.NonFinite(figure.Value));
        JsonParts.Number(json, "mended", figure.Mended);
        json.WriteString("label", Truth.Name(figure.Label));
    }
}
