using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Timeline;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>budget</c>: what each source of loss costs.</summary>
internal static class BudgetReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(BudgetResult budget)
    {
        Table shares = Shares(budget);
        return new Report(
            Headline(budget),
            null,
            [new Section(null, shares, [
                "Alone: lost when this source acts by itself. Removed: regained when it alone goes. Share: its Shapley share, the mean of what it adds over all orders of adding sources; shares add up to the whole loss.",
                .. budget.Uncertainty is { Inputs.Count: > 0 } ? ["± is the standard uncertainty of a share from the uncertain values, to first order (linear)."] : Array.Empty<string>(),
                .. budget.Advice is { } advice ? [advice] : Array.Empty<string>()]),
                .. budget.Uncertainty is { Leading: { Moves: true } leading } uncertainty ? [UncertaintyReport.Ranking(leading, uncertainty)] : Array.Empty<Section>()],
            shares,
            Provenance.Of(budget),
            budget.Warnings);
    }

    /// <summary>A source's name in every format.</summary>
    public static string Name(Source source) => source switch
    {
        Source.Preparation => "preparation",
        Source.Storage => "storage",
        Source.Interface => "interface",
        Source.FlightDecay => "decay in flight",
        Source.FlightNoise => "noise in flight",
        Source.Loss => "loss in flight",
        Source.Waiting => "waiting",
        Source.Operations => "operations",
        _ => "detection",
    };

    private static string Headline(BudgetResult budget)
    {
        string at = budget.At.Length == 0 ? "" : $" at {budget.At}";
        return budget.Shares.Count == 0
            ? $"Nothing is lost: {budget.Metric} is {FigureText.Number(budget.Figures.Value)} (exact), as without any source of loss{at}."
            : $"{char.ToUpperInvariant(budget.Metric[0])}{budget.Metric[1..]} is {FigureText.Number(budget.Figures.Value)}{at}, without any source of loss {FigureText.Number(budget.Figures.Ideal)}: {FigureText.Difference(budget.Loss)} is lost, most of it by {Name(budget.Shares[0].Source)} (all exact).";
    }

    private static Table Shares(BudgetResult budget) => new(
        [new("source", "Source"), new("alone", "Alone"), new("removed", "Removed"), new("share", "Share"), new("shareUncertainty", "±"), new("label", "Label")],
        [
            .. budget.Shares.Select(s => (IReadOnlyList<Cell>)[Cell.Of(Name(s.Source)), Lost(s.Alone), Lost(s.Removed), Lost(s.Share), Cell.Of(s.ShareUncertainty), Cell.Of("exact")]),
            .. budget.Shares.Count == 0 ? [] : new[] { (IReadOnlyList<Cell>)[Cell.Of("together"), Cell.Empty, Cell.Empty, Lost(budget.Loss), Cell.Of(budget.Uncertainty?.Leading?.StandardUncertainty), Cell.Of("exact")] },
        ]);

    private static DifferenceCell Lost(double value) => new(value, Rounding.Nearest, "");
}
