using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Reports;
using ResourceCheck.Resources;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>state</c>.</summary>
internal static class StateCommand
{
    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        string? file = use.Only("a file with a state");
        if (file is null || use.Findings.Count > 0)
            return Work.Refuse(use);
        bool mend = use.Has(o.Mend);
        Outcome<StateDescription> outcome = await Work.Compute(() => use.Session.Library.Describe(file, mend), token);
        return Work.Finish(
            use, target, outcome, (state, writer, colour) => ReportWriter.Write(state, CommandLineTool.Version, target.Format, writer, colour), _ => ExitCodes.Done, _ => []);
    }
}
