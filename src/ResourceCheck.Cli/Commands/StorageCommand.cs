using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>storage</c>.</summary>
internal static class StorageCommand
{
    private const int FewestPoints = 2;
    private const int MostPoints = 100_000;
    private const int DefaultPoints = 41;
    private const int FewestEmitters = 2;
    private const int MostEmitters = 16;
    private const int DefaultEmitters = 3;

    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        Target target = Work.TargetOf(use, o);
        InputText? conditions = use.Read(use.Only("a conditions file"));
        IReadOnlyList<KeyValuePair<string, string>> overrides = use.Pairs(o.Set, "storage.spacing=\"0.1 wavelengths\"");
        (int emitters, int points, double? until) = Curve(use, o);
        if (conditions is null || use.Findings.Count > 0)
            return Work.Refuse(use);
        StorageRequest request = new(conditions, overrides, emitters, until, points);
        Outcome<StorageResult> outcome = await Work.Compute(() => Judge.Storage(request), token);
        return Work.Finish(use, target, outcome, (result, writer, colour) => ReportWriter.Write(result, target.Format, writer, colour), _ => ExitCodes.Done, result => result.Warnings, result => [FigureBuilder.Of(result)]);
    }

    /// <summary>Number of emitters, number of times and last time (s) of a curve.</summary>
    public static (int Emitters, int Points, double? Until) Curve(Invocation use, Options o) => (
        (int)use.Whole(o.Parties, FewestEmitters, MostEmitters, DefaultEmitters), (int)use.Whole(o.Points, FewestPoints, MostPoints, DefaultPoints), use.Time(o.Until));
}
