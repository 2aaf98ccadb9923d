using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>verify</c>.</summary>
internal static class VerifyCommand
{
    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        Outcome<VerifyResult> outcome = await Work.Compute(() => use.Session.Library.Verify(request), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), CodeOf, result => result.Warnings);
    }

    // One refuted claim is a result, whatever else stayed open; without claims there was nothing to prove.
    private static int CodeOf(VerifyResult result) => result switch
    {
        { Claims.Count: 0 } => ExitCodes.Done,
        { Verdict: ClaimVerdict.Refuted } => ExitCodes.NotMet,
        { Verdict: ClaimVerdict.Proved } => ExitCodes.Done,
        _ => ExitCodes.NoResult,
    };
}
