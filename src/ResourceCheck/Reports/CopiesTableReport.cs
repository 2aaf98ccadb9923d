using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>copies</c> for several targets or values: a row each.</summary>
internal static class CopiesTableReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(CopiesTable copies)
    {
        Table rows = Rows(copies);
        return new Report(Headline(copies), null, [new Section(null, rows, Remarks(copies))], rows, Provenance.Of(copies), copies.Warnings);
    }

    private static string Headline(CopiesTable copies)
    {
        CopiesRow[] found = [.. copies.Rows.Where(r => r.Copies is not null)];
        string against = copies.Varied is { } varied ? $"failure probability and {varied.Path}" : "failure probability";
        return found.Length == 0 ? $"Copies against {against}: no number of copies holds any of the {copies.Rows.Count} targets."
            : $"Copies against {against}: from {found.Min(r => r.Copies)} to {found.Max(r => r.Copies)}{(found.Length == copies.Rows.Count ? "" : $"; {copies.Rows.Count - found.Length} of {copies.Rows.Count} targets are not reached")}.";
    }

    private static Table Rows(CopiesTable copies) => new(
        [
            new(copies.Varied?.Path ?? "value", copies.Varied is not { } varied ? "" : varied.Unit.Length == 0 ? varied.Path : $"{varied.Path}, {varied.Unit}", copies.Varied?.Unit ?? ""),
            new("failureTarget", "Failure at most"),
            new("harmTarget", "Harms at most"),
            new("copies", "Copies"),
            new("failure", "Honest failure"),
            new("label", "Label"),
            new("harm", "Worst harm"),
            new("harmLabel", "Label"),
            new("time", "Time"),
            new("refusal", "Not reached"),
        ],
        [.. copies.Rows.Select(r => (IReadOnlyList<Cell>)
        [
            Cell.Of(r.Value, ""),
            Cell.Of(r.Targets.Failure),
            r.Targets.Harm >= 1 ? Cell.Empty : Cell.Of(r.Targets.Harm),
            Cell.Of(r.Copies, ""),
            r.Failure is { } failure ? Truth.CellOf(failure) : Cell.Empty,
            Cell.Of(r.Failure is { } told ? Truth.Describe(told) : null),
            r.Harm is { } harm ? Truth.CellOf(harm) : Cell.Empty,
            Cell.Of(r.Harm is { } known ? Truth.Describe(known) : null),
            Cell.Of(r.Seconds, "s"),
            Cell.Of(r.Refusal),
        ])]);

    private static IReadOnlyList<string> Remarks(CopiesTable copies) =>
    [
        "Each number is the least found from which on honest failure holds as far as larger numbers were checked; `copies` with a single target shows the strategies and the numbers looked at.",
        .. copies.Rows.All(r => r.Targets.Harm >= 1) ? ["Harms are not looked at."] : Array.Empty<string>(),
        .. copies.Rows.All(r => r.Seconds is null) ? [] : new[] { "Time is that until the copies are kept, at the preparation rate." },
    ];
}
