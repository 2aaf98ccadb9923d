using System.Diagnostics;
using System.Globalization;
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
        RunRequest request = asked with { Drift = drift, Uncertainty = uncertainty, Choose = use.Texts(o.Choose), TryLevels = use.Has(o.TryLevels), Cancellation = token, Progress = target.Quiet ? null : new Teller(use.Session.Terminal) };
        Outcome<RunResult> outcome = await Work.Compute(() => use.Session.Library.Run(request), token);
        return Work.Finish(use, target, outcome, (run, writer, colour) => ReportWriter.Write(run, target.Format, writer, colour), CodeOf, run => run.Warnings, run => FigureBuilder.Of(run) is { } f ? [f] : []);
    }

    /// <summary>Tells of searches that take long.</summary>
    private sealed class Teller(Terminal terminal) : IProgress<SearchNote>
    {
        private static readonly TimeSpan _between = TimeSpan.FromSeconds(3);

        private readonly Stopwatch _silence = Stopwatch.StartNew();
        private readonly Lock _lock = new();

        public void Report(SearchNote value)
        {
            lock (_lock)
            {
                if (_silence.Elapsed < _between)
                    return;
                _silence.Restart();
            }

            string at = value.At.Length == 0 ? "" : $" at {value.At}";
            terminal.Progress(string.Create(CultureInfo.InvariantCulture, $"Searching \"{value.Case}\"{at}: {value.Evaluations} choices so far, greatest harm {value.Best:G4}"));
        }
    }

    private static int CodeOf(RunResult run) => run.Verdict is Verdict.NotMet or Verdict.Undecided ? ExitCodes.NotMet : ExitCodes.Done;
}
