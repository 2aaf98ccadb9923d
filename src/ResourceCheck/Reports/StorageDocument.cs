using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>storage</c>; docs/schema/storage.schema.json describes it.</summary>
internal static class StorageDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(StorageResult storage, TextWriter writer) => JsonParts.WriteDocument(writer, "storage", storage.Version, json =>
    {
        JsonParts.Conditions(json, storage.Conditions, storage.Overrides);
        json.WriteNumber("emitters", storage.Emitters);
        json.WriteBoolean("heralded", storage.Heralded);
        json.WriteBoolean("withoutShifts", storage.WithoutShifts);
        json.WriteString("label", "exact");
        JsonParts.Number(json, "errorEstimate", storage.ErrorEstimate);
        JsonParts.Object(json, "initialRates", () =>
        {
            JsonParts.Number(json, "antisymmetric", storage.InitialRates.Antisymmetric);
            JsonParts.Number(json, "symmetric", storage.InitialRates.Symmetric);
            JsonParts.Number(json, "independent", storage.InitialRates.Independent);
        });
        JsonParts.Objects(json, "points", storage.Points, p =>
        {
            JsonParts.Number(json, "time", p.Time);
            JsonParts.Number(json, "noPhoton", p.NoPhoton);
            JsonParts.Number(json, "fidelity", p.Fidelity);
            JsonParts.Number(json, "photonFreeFidelity", p.PhotonFreeFidelity);
            JsonParts.Number(json, "symmetricNoPhoton", p.SymmetricNoPhoton);
            JsonParts.Number(json, "symmetricFidelity", p.SymmetricFidelity);
            JsonParts.Number(json, "independent", p.Independent);
        });
        JsonParts.Warnings(json, storage.Warnings);
    });
}
