using System.Globalization;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>copies</c>.</summary>
internal static class CopiesCommand
{
    private const double DefaultFailure = 1e-3;

    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        double failure = use.Probability(o.Failure) ?? DefaultFailure, harm = use.Probability(o.Harm) ?? failure;
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        CopiesRequest copies = new(request with { Cancellation = token }, failure, harm, target.Quiet ? null : new Teller(use.Session.Terminal))
        {
            Optimise = use.Text(o.Optimise)?.Split(',', StringSplitOptions.TrimEntries) ?? [],
        };
        Outcome<CopiesResult> outcome = await Work.Compute(() => Judge.Copies(copies), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings);
    }

    /// <summary>Tells each number whose harms were searched, which takes seconds to minutes.</summary>
    private sealed class Teller(Terminal terminal) : IProgress<CopiesStep>
    {
        public void Report(CopiesStep value)
        {
            if (value.Harm is { } harm)
                terminal.Note(string.Create(CultureInfo.InvariantCulture, $"{value.Copies} copies: honest failure {value.Failure.Value:G4}, worst harm {harm.Value:G4}"));
        }
    }
}
