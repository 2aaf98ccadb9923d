using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>copies</c>: the number found, what was looked at, the strategies.</summary>
internal static class CopiesReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(CopiesResult copies)
    {
        Table steps = Steps(copies);
        return new Report(
            Headline(copies),
            true,
            [new Section("Numbers looked at", steps, Remarks(copies)), .. RunReport.Attacks(copies.Attacks, _ => "", ofLists: true)],
            steps,
            Provenance.Of(copies),
            copies.Warnings);
    }

    private static string Headline(CopiesResult copies)
    {
        string harm = copies.Targets.Harm >= 1 ? "harms not looked at" : $"every harm of the listed strategies at most {FigureText.Number(copies.Targets.Harm)}";
        string time = copies.Seconds is { } seconds ? $"; at the preparation rate they are kept after {FigureText.Time(seconds)}" : "";
        return $"{copies.Copies} copies: honest failure is at most {FigureText.Number(copies.Targets.Failure)}, {harm}{time}.";
    }

    private static Table Steps(CopiesResult copies) => new(
        [new("copies", copies.Parameter), new("failure", "Honest failure"), new("label", "Label"), new("harm", "Worst harm"), new("harmLabel", "Label")],
        [.. copies.Steps.Select(s => (IReadOnlyList<Cell>)
        [
            Cell.Of(s.Copies, ""),
            Truth.CellOf(s.Failure),
            Cell.Of(Truth.Describe(s.Failure)),
            s.Harm is { } harm ? Truth.CellOf(harm) : Cell.Empty,
            Cell.Of(s.Harm is { } known ? Truth.Describe(known) : null),
        ])]);

    private static IReadOnlyList<string> Remarks(CopiesResult copies) =>
    [
        $"Honest failure holds at every number from {copies.Copies} to {copies.CheckedUpTo}; it does not fall evenly, since thresholds are whole numbers of copies.",
        .. copies.Targets.Harm >= 1 ? [] : new[] { "Harms were searched at the numbers shown only; between them a harm may lie a little above." },
        $"Thresholds{(copies.Optimised.Count == 0 ? " as given, not optimised" : $", {string.Join(", ", copies.Optimised)} chosen so that few copies suffice (the best found, not proved)")}: {string.Join(", ", copies.Thresholds.Select(t => $"{t.Key} = {t.Value}"))}.",
    ];
}
