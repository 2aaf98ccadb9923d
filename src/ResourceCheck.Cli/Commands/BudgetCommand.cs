using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>budget</c>.</summary>
internal static class BudgetCommand
{
    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        UncertaintyRequest? uncertainty = Work.Uncertainty(use, o);
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        Outcome<BudgetResult> outcome = await Work.Compute(() => Judge.Budget(request with { Cancellation = token, Uncertainty = uncertainty }), token);
        return Work.Finish(use, target, outcome, (budget, writer, colour) => ReportWriter.Write(budget, target.Format, writer, colour), _ => ExitCodes.Done, budget => budget.Warnings, budget => FigureBuilder.Of(budget) is { } f ? [f] : []);
    }
}
