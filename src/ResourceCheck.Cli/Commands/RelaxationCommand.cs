using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>relaxation</c>.</summary>
internal static class RelaxationCommand
{
    private const int FewestSamples = 2;
    private const int MostSamples = 10_000_000;

    /// <summary>Enough to tell a hundredth from nothing within seconds.</summary>
    private const int DefaultSamples = 1000;

    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        InputText? conditions = use.Read(use.Only("a conditions file"));
        IReadOnlyList<KeyValuePair<string, string>> overrides = use.Pairs(o.Set, "resource.relaxed.spacing=\"0.1 wavelengths\"");
        (int emitters, int points, double? until) = StorageCommand.Curve(use, o);
        int samples = (int)use.Whole(o.Samples, FewestSamples, MostSamples, DefaultSamples);
        long seed = use.Whole(o.Seed, long.MinValue, long.MaxValue, otherwise: 1);
        if (conditions is null || use.Findings.Count > 0)
            return Work.Refuse(use);
        RelaxationRequest request = new(conditions, overrides, emitters, until, points, samples, seed, token);
        Outcome<RelaxationResult> outcome = await Work.Compute(() => Judge.Relaxation(request), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings, result => [FigureBuilder.Of(result)]);
    }
}
