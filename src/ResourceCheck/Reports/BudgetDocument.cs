using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The JSON document of <c>budget</c>; docs/schema/budget.schema.json describes it.</summary>
internal static class BudgetDocument
{
    /// <summary>Writes the document.</summary>
    public static void Write(BudgetResult budget, TextWriter writer) => JsonParts.WriteDocument(writer, "budget", budget.Version, json =>
    {
        JsonParts.Protocol(json, budget.Protocol, budget.Title);
        JsonParts.Conditions(json, budget.Conditions, budget.Overrides);
        JsonParts.Engine(json, budget.Engine);
        JsonParts.Parameters(json, budget.Parameters);
        json.WriteString("metric", budget.Metric);
        json.WriteString("at", budget.At);
        JsonParts.Number(json, "value", budget.Figures.Value);
        JsonParts.Number(json, "ideal", budget.Figures.Ideal);
        JsonParts.Number(json, "loss", budget.Loss);
        json.WriteString("label", "exact");
        JsonParts.Objects(json, "shares", budget.Shares, s =>
        {
            json.WriteString("source", BudgetReport.Name(s.Source));
            JsonParts.Number(json, "alone", s.Alone);
            JsonParts.Number(json, "removed", s.Removed);
            JsonParts.Number(json, "share", s.Share);
            JsonParts.Number(json, "aloneUncertainty", s.AloneUncertainty);
            JsonParts.Number(json, "removedUncertainty", s.RemovedUncertainty);
            JsonParts.Number(json, "shareUncertainty", s.ShareUncertainty);
        });
        UncertaintyDocument.Write(json, budget.Uncertainty);
        json.WriteString("advice", budget.Advice);
        JsonParts.Warnings(json, budget.Warnings);
    });
}
