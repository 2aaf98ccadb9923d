using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>Uncertainties of a loss and of its sources' parts, to first order.</summary>
internal static class BudgetUncertainty
{
    private const string Whole = "loss", Alone = "alone", Removed = "removed", Share = "share";

    /// <summary>The budget with uncertainties.</summary>
    public static Outcome<BudgetResult> Of(Setup setup, BudgetResult budget)
    {
        FigureKey whole = new(FigureKind.Loss, Whole, budget.Metric);
        Outcome<UncertaintyResult> found = UncertaintyJudgement.Of(setup, Figures(budget), whole, samples: 0, s => BudgetJudgement.Shared(s).Value is { } moved && moved.Metric == budget.Metric ? Figures(moved) : null);
        if (found.Value is not { } uncertainty)
            return Outcome<BudgetResult>.Failed(found.Findings);
        return Outcome<BudgetResult>.Of(budget with
        {
            Uncertainty = uncertainty with { Figures = [.. uncertainty.Figures.Where(f => f.Case == Whole)] },
            Shares = [.. budget.Shares.Select(s => s with { AloneUncertainty = Of(Alone, s), RemovedUncertainty = Of(Removed, s), ShareUncertainty = Of(Share, s) })],
            Warnings = [.. budget.Warnings, .. found.Findings],
        });

        double? Of(string part, SourceShare share) => uncertainty.Find(FigureKind.Loss, share.Source.ToString(), part)?.StandardUncertainty;
    }

    private static NamedFigure[] Figures(BudgetResult budget) =>
    [
        Figure(Whole, budget.Metric, budget.Loss),
        .. budget.Shares.SelectMany(s => new[] { Figure(Alone, s.Source.ToString(), s.Alone), Figure(Removed, s.Source.ToString(), s.Removed), Figure(Share, s.Source.ToString(), s.Share) }),
    ];

    private static NamedFigure Figure(string part, string name, double loss) => new(new(FigureKind.Loss, part, name), Estimate.Exact(loss), FigureRange.Any);
}
