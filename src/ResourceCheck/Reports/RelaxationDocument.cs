using System.Text.Json;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>relaxation</c>; docs/schema/relaxation.schema.json describes it.</summary>
internal static class RelaxationDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(RelaxationResult relaxation, TextWriter writer) => JsonParts.WriteDocument(writer, "relaxation", relaxation.Version, json =>
    {
        JsonParts.Conditions(json, relaxation.Conditions, relaxation.Overrides);
        json.WriteNumber("emitters", relaxation.Emitters);
        json.WriteString("start", relaxation.Start);
        json.WriteBoolean("heralded", relaxation.Heralded);
        json.WriteBoolean("withoutShifts", relaxation.WithoutShifts);
        json.WriteString("method", relaxation.Method);
        JsonParts.Number(json, "seed", relaxation.Seed);
        JsonParts.Number(json, "samples", relaxation.Samples);
        JsonParts.Number(json, "integrationError", relaxation.ErrorEstimate);
        JsonParts.Objects(json, "points", relaxation.Points, p =>
        {
            JsonParts.Number(json, "time", p.Time);
            Figure(json, "antisymmetric", p.Antisymmetric);
            Figure(json, "symmetric", p.Symmetric);
            Figure(json, "independent", p.Independent);
            Figure(json, "noPhoton", Estimate.Exact(p.NoPhoton));
            Figure(json, "photonFreeFidelity", Estimate.Exact(p.PhotonFreeFidelity));
            Figure(json, "excited", p.Excited);
        });
        JsonParts.Warnings(json, relaxation.Warnings);
    });

    private static void Figure(Utf8JsonWriter json, string name, Estimate estimate) => JsonParts.Object(json, name, () => JsonParts.EstimateFields(json, estimate));
}
