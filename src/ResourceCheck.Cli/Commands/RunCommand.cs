using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>run</c>.</summary>
internal static class RunCommand
{
    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        Drift? drift = use.Drift(o.Drift);
        UncertaintyRequest? uncertainty = Work.Uncertainty(use, o);
        if (Work.Request(use, o) is not { } asked)
            return Work.Refuse(use);
        RunRequest request = asked with { Drift = drift, Uncertainty = uncertainty };
        Outcome<RunResult> outcome = await Work.Compute(() => use.Session.Library.Run(request), token);
        return Work.Finish(use, target, outcome, (run, writer, colour) => ReportWriter.Write(run, target.Format, writer, colour), CodeOf, run => run.Warnings, run => FigureBuilder.Of(run) is { } f ? [f] : []);
    }

    private static int CodeOf(RunResult run) => run.Verdict is Verdict.NotMet or Verdict.Undecided ? ExitCodes.NotMet : ExitCodes.Done;
}
