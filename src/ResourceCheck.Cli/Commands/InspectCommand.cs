using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>inspect</c>.</summary>
internal static class InspectCommand
{
    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        Outcome<InspectResult> outcome = await Work.Compute(() => use.Session.Library.Inspect(request), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings);
    }
}
