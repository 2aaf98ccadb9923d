using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>tolerance</c>.</summary>
internal static class ToleranceCommand
{
    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        IReadOnlyList<KeyValuePair<string, string>> vary = use.Pairs(o.Vary, "flight.default.length=\"1 km..20 km\"");
        UncertaintyRequest? uncertainty = Work.Uncertainty(use, o);
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        Outcome<ToleranceResult> outcome = await Work.Compute(() => Judge.Tolerance(new ToleranceRequest(request with { Cancellation = token, Uncertainty = uncertainty }, vary, use.Text(o.Goal))), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings, result => [FigureBuilder.Of(result)]);
    }
}
