using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>sweep</c>. With <c>--out</c>, finished points are kept beside the file until it is written, and used again after an interruption.</summary>
internal static class SweepCommand
{
    private const string JournalEnding = ".points";

    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        IReadOnlyList<KeyValuePair<string, string>> vary = use.Pairs(o.Vary, "flight.default.length=\"1 km..20 km:20\"");
        UncertaintyRequest? uncertainty = Work.Uncertainty(use, o);
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        string? journal = target.File is { } file ? file + JournalEnding : null;
        SweepRequest sweep = new(request with { Cancellation = token, Uncertainty = uncertainty }, vary, journal, target.Quiet ? null : new Teller(use.Session.Terminal));
        Outcome<SweepResult> outcome = await Work.Compute(() => Judge.Sweep(sweep), token);
        int code = Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings, result => FigureBuilder.Of(result));
        if (journal is not null && outcome.Succeeded && code == ExitCodes.Done)
            File.Delete(journal);
        return code;
    }

    /// <summary>Tells now and then how far a sweep is; short ones end untold.</summary>
    private sealed class Teller(Terminal terminal) : IProgress<SweepProgress>
    {
        private static readonly TimeSpan Pause = TimeSpan.FromSeconds(5);

        private readonly Lock _lock = new();
        private long _last = System.Diagnostics.Stopwatch.GetTimestamp();

        public void Report(SweepProgress value)
        {
            lock (_lock)
            {
                if (System.Diagnostics.Stopwatch.GetElapsedTime(_last) < Pause || value.Remaining is not { } remaining)
                    return;
                _last = System.Diagnostics.Stopwatch.GetTimestamp();
                terminal.Note($"{value.Done} of {value.Total} points done, about {Math.Ceiling(remaining)} s left");
            }
        }
    }
}
