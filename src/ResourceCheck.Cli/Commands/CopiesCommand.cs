using System.Globalization;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
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
        IReadOnlyList<double> failures = use.Probabilities(o.Failure);
        double? harms = use.Probability(o.Harm);
        IReadOnlyList<KeyValuePair<string, string>> vary = use.Pairs(o.Vary, "flight.default.depolarising=0..0.05:6");
        double failure = failures.Count > 0 ? failures[0] : DefaultFailure, harm = harms ?? failure;
        if (Work.Request(use, o) is not { } request)
            return Work.Refuse(use);
        CopiesRequest copies = new(request with { Cancellation = token }, failure, harm, target.Quiet ? null : new Teller(use.Session.Terminal))
        {
            Optimise = use.Text(o.Optimise)?.Split(',', StringSplitOptions.TrimEntries) ?? [],
        };
        if (failures.Count > 1 || vary.Count > 0)
            return await Table(use, target, new CopiesTableRequest(copies, failures.Count > 0 ? failures : [DefaultFailure], harms, vary), token);
        Outcome<CopiesResult> outcome = await Work.Compute(() => Judge.Copies(copies), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings, result => [FigureBuilder.Of(result)]);
    }

    private static async Task<int> Table(Invocation use, Target target, CopiesTableRequest request, CancellationToken token)
    {
        Outcome<CopiesTable> outcome = await Work.Compute(() => Judge.Copies(request), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings, result => FigureBuilder.Of(result) is { } f ? [f] : []);
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
