using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Finds numbers of copies for every target and value. A row without a number is told with its reason; the others stand.</summary>
internal static class CopiesTableJudgement
{
    public static Outcome<CopiesTable> Of(CopiesTableRequest request)
    {
        Outcome<IReadOnlyList<Variation>> varied = request.Vary.Count == 0 ? Outcome<IReadOnlyList<Variation>>.Of([]) : SweepJudgement.Variations(request.Copies.Run, request.Vary, 1);
        if (varied.Value is not { } variations)
            return Outcome<CopiesTable>.Failed(varied.Findings);
        Variation? variation = variations.Count > 0 ? variations[0] : null;
        double?[] values = variation is null ? [null] : [.. variation.Values.Select(v => (double?)v)];
        (double? Value, double Failure, Outcome<CopiesResult> Found)[] found =
            [.. values.SelectMany(v => request.Failures.Select(f => (v, f, Judge.Copies(At(request, variation, v, f)))))];
        // What stands against every row stands against the table, unless it is only that targets are not reached.
        return found.All(f => f.Found.Findings.Any(d => d.Severity == Severity.Error && !d.Code.StartsWith('E')))
            ? Outcome<CopiesTable>.Failed([.. found.SelectMany(f => f.Found.Findings).Distinct()])
            : Outcome<CopiesTable>.Of(Conclude(request, variation, found));
    }

    private static CopiesRequest At(CopiesTableRequest request, Variation? variation, double? value, double failure) => request.Copies with
    {
        Run = value is { } put ? variation!.Into(request.Copies.Run, put) : request.Copies.Run,
        Failure = failure,
        Harm = request.Harm ?? failure,
    };

    private static CopiesTable Conclude(CopiesTableRequest request, Variation? variation, IReadOnlyList<(double? Value, double Failure, Outcome<CopiesResult> Found)> found)
    {
        CopiesResult? any = found.Select(f => f.Found.Value).FirstOrDefault(r => r is not null);
        Setup setup = found.Select(f => Setup.From(At(request, variation, f.Value, f.Failure).Run).Value).OfType<Setup>().First();
        return new CopiesTable
        {
            Version = Provenance.Version,
            Protocol = new InputFile(request.Copies.Run.Script.Name, request.Copies.Run.Script.Sha256),
            Title = setup.Settings[0].Protocol.Name,
            Conditions = Provenance.Conditions(setup),
            Overrides = request.Copies.Run.Overrides,
            Parameter = any?.Parameter ?? "",
            Varied = variation,
            Rows = [.. found.Select(f => Row(f.Value, (f.Failure, request.Harm ?? f.Failure), f.Found))],
            Warnings = any?.Warnings ?? setup.Notes,
        };
    }

    private static CopiesRow Row(double? value, (double, double) targets, Outcome<CopiesResult> found)
    {
        if (found.Value is not { } copies)
            return new CopiesRow(value, targets, null, null, null, null, found.Findings.Where(f => f.Severity == Severity.Error).Select(f => $"{f.Message} ({f.Code})").First());
        CopiesStep step = copies.Steps.Single(s => s.Copies == copies.Copies);
        return new CopiesRow(value, targets, copies.Copies, step.Failure, step.Harm, copies.Seconds, null) { Thresholds = copies.Thresholds };
    }
}
