using System.Globalization;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;
using ResourceCheck.Reports;

namespace ResourceCheck.Studies;

/// <summary>Orders the results of a study as a referee reads them: verdicts first, methods and cautions last.</summary>
internal sealed class StudyPageBuilder
{
    private const double Percent = 100;

    private readonly StudyResult _result;
    private readonly (StudyPartResult Result, string Id)[] _parts;

    private StudyPageBuilder(StudyResult result)
    {
        _result = result;
        _parts = [.. result.Parts.Select((p, i) => (p, string.Create(CultureInfo.InvariantCulture, $"part-{i + 1}")))];
    }

    /// <summary>Builds the page.</summary>
    public static StudyPage Of(StudyResult result) => new StudyPageBuilder(result).Build();

    private StudyPage Build()
    {
        PageSection[] sections =
        [
            new("verdicts", "Verdicts", [Overview(), .. _parts.SelectMany(p => Verdict(p.Result, p.Id))]),
            new("tolerances", "What is tolerated", [.. Required(), .. _parts.SelectMany(p => Tolerances(p.Result, p.Id))]),
            new("budget", "Where it is lost", [.. _parts.SelectMany(p => Budget(p.Result, p.Id))]),
            new("sensitivity", "Uncertain values", [.. _parts.SelectMany(p => Uncertain(p.Result, p.Id))]),
            new("rates", "Rates", [.. _parts.SelectMany(p => Rates(p.Result, p.Id))]),
            new("copies", "Copies", [.. _parts.SelectMany(p => Copies(p.Result, p.Id))]),
            new("scaling", "Scaling", [.. _parts.SelectMany(p => Sweeps(p.Result, p.Id, scaling: true))]),
            new("curves", "Curves and maps", [.. _parts.SelectMany(p => Sweeps(p.Result, p.Id, scaling: false))]),
            new("timeline", "Timeline", [.. _parts.SelectMany(p => Timeline(p.Result, p.Id))]),
            new("failures", "Not computed", [.. _parts.SelectMany(p => Failures(p.Result))]),
            new("assumptions", "Assumptions", StudyTexts.Assumptions(_result)),
            new("method", "Method and cautions", StudyTexts.Method(_result)),
            new("references", "References", StudyTexts.References(_result)),
            new("provenance", "Provenance", [.. _parts.SelectMany(p => Origin(p.Result))]),
        ];
        return new StudyPage(_result.Study.Title, _result.Study.About, [.. sections.Where(s => s.Items.Count > 0)]);
    }

    private PageItem Overview()
    {
        Table table = new(
            [new("part", "Protocol"), new("verdict", "Verdict"), new("goal", "Goal"), new("value", "Figure"), new("label", "Label"), new("margin", "Margin")],
            [.. _parts.SelectMany(p => OverviewRows(p.Result))]);
        return new PageItem(null, "verdicts", null, null, [new Section(null, table, [])], table, []);
    }

    private static IEnumerable<IReadOnlyList<Cell>> OverviewRows(StudyPartResult part)
    {
        if (part.Run is not { } run)
            return [[Cell.Of(part.Part.Title), Cell.Of("not computed"), Cell.Empty, Cell.Empty, Cell.Empty, Cell.Empty]];
        if (run.Goals.Count == 0)
            return [[Cell.Of(part.Part.Title), Cell.Of("no goal is set"), Cell.Empty, Cell.Empty, Cell.Empty, Cell.Empty]];
        return run.Goals.Select(g => (IReadOnlyList<Cell>)
            [Cell.Of(part.Part.Title), Cell.Of(RunReport.Standing(g)), Cell.Of(g.Text), Truth.CellOf(g.Value), Cell.Of(Truth.Describe(g.Value)), new DifferenceCell(g.Margin, Rounding.Nearest, "")]);
    }

    private static IEnumerable<PageItem> Verdict(StudyPartResult part, string id) => part.Run is not { } run ? [] :
        [ItemOf(part.Part.Title, $"{id}-run", RunReport.From(run) with { Sections = [.. About(part), .. RunReport.Judged(run)] }, [])];

    private static Section[] About(StudyPartResult part) => part.Part.About is { } about ? [Section.Of(about)] : [];

    /// <summary>Today's values beside those required.</summary>
    private IEnumerable<PageItem> Required()
    {
        (StudyPartResult Part, ToleranceResult Found)[] all = [.. _parts.SelectMany(p => p.Result.Tolerances.Select(t => (p.Result, t)))];
        if (all.Length == 0)
            return [];
        Table table = new(
            [new("part", "Protocol"), new("value", "Value"), new("goal", "Goal"), new("today", "Today"), new("required", "Required"), new("margin", "Margin, %", "%"), new("label", "Label")],
            [.. all.SelectMany(t => RequiredRows(t.Part, t.Found))]);
        return [new PageItem("Today's values and those required", "required", null, null, [new Section(null, table, ["Margin: how far today's value may move before the goal is just met, as a part of itself; negative where the goal is missed today."])], table, [])];
    }

    private static IEnumerable<IReadOnlyList<Cell>> RequiredRows(StudyPartResult part, ToleranceResult found)
    {
        IReadOnlyList<Cell> Row(string required, double? margin, string label) =>
        [
            Cell.Of(part.Part.Title),
            Cell.Of(found.Varied.Path),
            Cell.Of(found.Goal),
            Cell.Of(found.Today is { } today ? SweepFigures.Value(found.Varied, today.Value) : null),
            Cell.Of(required),
            Cell.Of(margin, ""),
            Cell.Of(label),
        ];
        if (found.Crossings.Count == 0)
            return [Row(found.MetAt.From ? "any in the range" : "none in the range", null, Truth.Name(found.Scan[0].Figure.Label))];
        return found.Crossings.Select(c => Row($"{(c.MetBelow ? "at most" : "at least")} {SweepFigures.Value(found.Varied, c.Value)}", c.Relative is { } r ? Percent * (c.MetBelow ? r : -r) : null, Truth.Name(c.Figure.Label)));
    }

    private static IEnumerable<PageItem> Tolerances(StudyPartResult part, string id) => part.Tolerances.Select((t, i) =>
        ItemOf($"{part.Part.Title}: {t.Varied.Path}", Name(id, "tolerance", i), ToleranceReport.From(t), [FigureBuilder.Of(t, Name(id, "tolerance", i))]));

    private static IEnumerable<PageItem> Budget(StudyPartResult part, string id) => part.Budget is not { } budget ? [] :
        [ItemOf(part.Part.Title, $"{id}-budget", BudgetReport.From(budget), FigureBuilder.Of(budget, $"{id}-budget") is { } figure ? [figure] : [])];

    private static IEnumerable<PageItem> Uncertain(StudyPartResult part, string id) => part.Run is { } run && RunReport.Uncertainties(run) is { Count: > 0 } sections
        ? [new PageItem(part.Part.Title, $"{id}-uncertainty", null, null, sections, sections[^1].Table, [])]
        : [];

    private static IEnumerable<PageItem> Rates(StudyPartResult part, string id) => part.Run is { } run && RateTable.Sections(run.Rates) is { Count: > 0 } sections
        ? [new PageItem(part.Part.Title, $"{id}-rates", null, null, sections, sections[0].Table, [])]
        : [];

    private static IEnumerable<PageItem> Copies(StudyPartResult part, string id)
    {
        PageItem[] tables = [.. part.CopiesTables.Select((t, i) => ItemOf(
            $"{part.Part.Title}: copies against {t.Varied!.Path}", Name(id, "copies-against", i), CopiesTableReport.From(t), FigureBuilder.Of(t, Name(id, "copies-against", i)) is { } figure ? [figure] : []))];
        return [.. Prices(part, id), .. tables];
    }

    private static IEnumerable<PageItem> Prices(StudyPartResult part, string id)
    {
        if (part.Copies.Count == 0)
            return [];
        Table table = new(
            [new("failure", "Failure at most"), new("harm", "Harm at most"), new("copies", "Copies"), new("time", "Time until they are kept", "s")],
            [.. part.Copies.Select(c => (IReadOnlyList<Cell>)
                [Cell.Of(c.Targets.Failure), c.Targets.Harm >= 1 ? Cell.Of("not looked at") : Cell.Of(c.Targets.Harm), Cell.Of(c.Copies, ""), Cell.Of(c.Seconds, "s")])]);
        PageItem against = new($"{part.Part.Title}: copies against failure probability", $"{id}-copies", null, null, [new Section(null, table, [])], table, PriceOf(part, id) is { } figure ? [figure] : []);
        return [against, .. part.Copies.Select((c, i) => ItemOf($"{part.Part.Title}: failure at most {FigureText.Number(c.Targets.Failure)}", Name(id, "copies", i), CopiesReport.From(c), [FigureBuilder.Of(c, Name(id, "copies", i))]))];
    }

    /// <summary>What failure probabilities cost, when there are several.</summary>
    private static FigureImage? PriceOf(StudyPartResult part, string id)
    {
        CopiesResult[] ordered = [.. part.Copies.DistinctBy(c => c.Targets.Failure).OrderBy(c => c.Targets.Failure)];
        return ordered.Length < 2 ? null : ChartPlot.Of(new Chart(
            $"{id}-price",
            $"{part.Part.Title}: copies against failure probability",
            $"A failure of at most {string.Join("; ", ordered.Select(c => $"{FigureText.Number(c.Targets.Failure)} takes {c.Copies} copies"))}.",
            new ChartAxis("failure probability at most", IsLogarithmic: true),
            new ChartAxis("copies kept", WholeOnly: true),
            [new ChartSeries("copies", [.. ordered.Select(c => new ChartPoint(c.Targets.Failure, c.Copies))])],
            []));
    }

    private static IEnumerable<PageItem> Sweeps(StudyPartResult part, string id, bool scaling) => part.Sweeps.Select((s, i) => (Sweep: s, Name: Name(id, "sweep", i)))
        .Where(s => IsScaling(s.Sweep) == scaling)
        .Select(s => ItemOf($"{part.Part.Title}: {string.Join(" and ", s.Sweep.Varied.Select(v => v.Path))}", s.Name, SweepReport.From(s.Sweep), FigureBuilder.Of(s.Sweep, s.Name, ToleratedOf(part, s.Sweep))));

    private static bool IsScaling(SweepResult sweep) => sweep.Varied is [{ IsParameter: true }];

    /// <summary>The only crossing that this part found along the path of a curve, in the same unit.</summary>
    private static double? ToleratedOf(StudyPartResult part, SweepResult sweep) =>
        part.Tolerances.Where(t => sweep.Varied is [var v] && v.Path == t.Varied.Path && v.Unit == t.Varied.Unit && t.Crossings.Count == 1).Select(t => (double?)t.Crossings[0].Value).FirstOrDefault();

    private static IEnumerable<PageItem> Timeline(StudyPartResult part, string id) => part.Run is { } run && FigureBuilder.Of(run, $"{id}-timeline") is { } figure
        ? [new PageItem(part.Part.Title, $"{id}-timeline", null, null, [], InspectReport.Schedule(run.Timeline), [figure])]
        : [];

    private static IEnumerable<PageItem> Failures(StudyPartResult part) => part.Failures.Select(f => PageItem.Of($"{part.Part.Title}: {f.What}", [.. f.Findings.Select(d => $"{d.Message} ({d.Code})")]));

    private static IEnumerable<PageItem> Origin(StudyPartResult part) => part.Run is not { } run ? [] :
        [PageItem.Of(part.Part.Title, [.. Reports.Provenance.Of(run), .. run.Warnings.Select(w => $"{w.Severity}: {w.Message} ({w.Code})")])];

    private static PageItem ItemOf(string title, string file, Report report, IReadOnlyList<FigureImage> figures) =>
        new(title, file, report.Headline, report.Standing, report.Sections, report.Data, figures);

    private static string Name(string id, string kind, int index) => string.Create(CultureInfo.InvariantCulture, $"{id}-{kind}-{index + 1}");
}
