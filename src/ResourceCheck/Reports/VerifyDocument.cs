using System.Text.Json;
using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>verify</c>; docs/schema/verification.schema.json describes it.</summary>
internal static class VerifyDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(VerifyResult verification, TextWriter writer) => JsonParts.WriteDocument(writer, "verification", verification.Version, json =>
    {
        json.WriteString("verdict", VerifyReport.Name(verification.Verdict));
        JsonParts.Protocol(json, verification.Protocol, verification.Title);
        JsonParts.Objects(json, "claims", verification.Claims, c => Claim(json, c));
        JsonParts.Warnings(json, verification.Warnings);
    });

    private static void Claim(Utf8JsonWriter json, ClaimResult claim)
    {
        json.WriteString("text", claim.Text);
        json.WriteString("parameters", claim.Parameters);
        json.WriteString("verdict", VerifyReport.Name(claim.Verdict));
        JsonParts.Number(json, "left", claim.Left);
        JsonParts.Number(json, "right", claim.Right);
        json.WriteString("label", claim.Left is null && claim.Right is null ? null : Truth.Name(claim.Label));
        JsonParts.Branches(json, "breaking", claim.Breaking);
        json.WriteString("reason", claim.Reason);
    }
}
