using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Uncertain;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>run</c>: verdict, figures, fidelity by outcome, goals.</summary>
internal static class RunReport
{
    private const int ShownBranches = 8;

    private const string HonestCase = "honest";

    /// <summary>Columns of the long table between quantity and note.</summary>
    private const int EmptyCells = 7;

    /// <summary>Branches closer than this are the same for anybody who would choose between them.</summary>
    private const double SameFidelity = 1e-4;

    /// <summary>Builds the report.</summary>
    public static Report From(RunResult run)
    {
        IReadOnlyList<Figure> figures = Figure.AllOf(run);
        return new Report(
            run.VerdictText,
            run.Verdict switch { Verdict.Met => true, Verdict.NotMet => false, _ => null },
            [
                new Section(null, Short(figures, run), Remarks(run)),
                .. Goals(run),
                .. Uncertainties(run),
                .. RateTable.Sections(run.Rates),
                .. Rest(run),
            ],
            Long(figures, run),
            Provenance.Of(run),
            run.Warnings);
    }

    /// <summary>Figures and goals, strategies, outcomes and what limits the result, for a page that shows uncertainties and rates elsewhere.</summary>
    public static IReadOnlyList<Section> Judged(RunResult run) => [new Section(null, Short(Figure.AllOf(run), run) with { Headed = true }, Remarks(run)), .. Goals(run), .. Rest(run)];

    /// <summary>What uncertain values do to the figures shown.</summary>
    public static IReadOnlyList<Section> Uncertainties(RunResult run) => UncertaintyReport.Sections(run.Uncertainty, f => IsShown(f, run));

    private static IEnumerable<Section> Rest(RunResult run) =>
    [
        .. Attacks(run.Attacks, a => Noticed(run, a), run.List is not null),
        .. Drift(run),
        .. Levels(run.Levels),
        .. run.Checkpoints.Where(c => !c.BuiltIn && Differ(c.Branches)).Select(Branches),
        .. run.Hint is { } hint ? [Section.Of(hint)] : Array.Empty<Section>(),
    ];

    /// <summary>Uncertainties are shown of what the short table shows; goals stand there under the name of their figure.</summary>
    private static bool IsShown(FigureBand band, RunResult run) => band.Kind switch
    {
        FigureKind.Goal => false,
        FigureKind.Checkpoint => run.Checkpoints.Any(c => !c.BuiltIn && c.Name == band.Name),
        FigureKind.Metric => band.Case == HonestCase || band.Name == "harm",
        _ => true,
    };

    private static Table Short(IReadOnlyList<Figure> figures, RunResult run) => new(
        [
            new("name", "Figure"),
            new("kind", "Kind"),
            new("value", "Value"),
            new("label", "Label"),
            new("ideal", "Ideal", Lead: "ideal "),
            new("lost", "Lost", Lead: "lost "),
            new("note", "Note"),
        ],
        [.. figures.Where(f => f.Prominent).Select(f => (IReadOnlyList<Cell>)
        [
            Cell.Of(f.Title),
            Cell.Of(f.Kind),
            Truth.CellOf(f.Estimate, f.Unit),
            Cell.Of(Truth.Describe(f.Estimate)),
            Cell.Of(f.Ideal),
            f.Lost is { } lost ? Truth.LessThan(f.Estimate, lost) : Cell.Empty,
            Cell.Of(ShortNote(f.Note, run)),
        ])],
        Headed: false);

    // Said once below the table, not in every row of it.
    private static string ShortNote(string note, RunResult run) =>
        run.Yield.OnlySeen ? string.Join("; ", note.Split("; ").Where(n => n != Figure.OnlySeen)) : note;

    private static Table Long(IReadOnlyList<Figure> figures, RunResult run) => new(
        [
            new("case", "Case", Legend: "honest or the name of a dishonest block"),
            new("quantity", "Quantity", Legend: "metric or checkpoint"),
            new("unit", "Unit"),
            new("value", "Value"),
            new("label", "Label", Legend: "exact, bound or sampled"),
            new("low", "Low", Legend: "lower end; empty where there is none"),
            new("high", "High", Legend: "upper end; empty where there is none"),
            new("confidence", "Confidence"),
            new("ideal", "Ideal", Legend: "the same under ideal conditions"),
            new("note", "Note"),
        ],
        [
            .. figures.Select(LongRow),
            .. run.Checkpoints.SelectMany(c => c.Branches.Where(b => b.Outcomes.Count > 0).SelectMany(b => OfBranch(c, b))),
            .. run.Goals.SelectMany(OfGoal),
            .. (run.Uncertainty?.Figures ?? []).SelectMany(OfBand),
            .. (run.Rates?.Stages ?? []).SelectMany(OfStage),
            .. run.Parameters.Select(p => Row($"parameter {p.Name}", p.IsDefault ? $"{string.Join(", ", p.Values)} (default)" : string.Join(", ", p.Values))),
            Row("verdict", run.VerdictText),
        ]);

    private static IEnumerable<IReadOnlyList<Cell>> OfBranch(CheckpointResult checkpoint, BranchEvaluation branch)
    {
        string at = $"of {checkpoint.Name} at {BranchTable.Outcomes(branch)}";
        yield return Row($"probability {at}", "", Estimate.Exact(branch.Probability));
        if (branch.Fidelity is { } fidelity)
            yield return Row($"fidelity {at}", "", Estimate.Exact(fidelity));
    }

    private static IEnumerable<IReadOnlyList<Cell>> OfGoal(GoalResult goal)
    {
        yield return Row($"goal {goal.Text}", Standing(goal), goal.Value);
        yield return Row($"margin of goal {goal.Text}", "", goal.Value with { Value = goal.Margin, Low = double.NaN, High = double.NaN });
    }

    private static IEnumerable<IReadOnlyList<Cell>> OfStage(RateStage stage)
    {
        if (stage.Probability is { } probability)
            yield return Row($"probability of {stage.Name}", stage.Note, probability);
        if (stage.Rate is { } rate)
            yield return LongRow(new Figure(HonestCase, $"rate behind {stage.Name}", "", "", "1/s", (stage.Probability ?? Estimate.Exact(1)) with { Value = rate, Low = double.NaN, High = double.NaN }, null, null, "", false));
    }

    /// <summary>Whether a goal is met, in words.</summary>
    public static string Standing(GoalResult goal) => (goal.Undecided, goal.Met) switch
    {
        (true, true) => "undecided (met at the central values)",
        (true, false) => "undecided (not met at the central values)",
        (_, true) => "met",
        _ => "not met",
    };

    // The label column tells how the band was found.
    private static IEnumerable<IReadOnlyList<Cell>> OfBand(FigureBand band)
    {
        string unit = band.Kind == FigureKind.Time ? "s" : "", name = UncertaintyReport.Name(band);
        yield return BandRow(band, $"standard uncertainty of {name}", unit, band.StandardUncertainty, "linear", null, null);
        yield return BandRow(band, $"band of {name}", unit, band.Value.Value, "linear", band.Low, band.High);
        if (band.Sampled is { } sampled)
        {
            yield return BandRow(band, $"standard uncertainty of {name}", unit, sampled.StandardUncertainty, "sampled", null, null);
            yield return BandRow(band, $"band of {name}", unit, sampled.Mean, "sampled", sampled.Low, sampled.High);
        }

        foreach (Sensitivity s in band.Sensitivities)
            yield return BandRow(band, $"share of the variance of {name} from {s.Path}", "", s.Share, "linear", null, null);
    }

    private static IReadOnlyList<Cell> BandRow(FigureBand band, string quantity, string unit, double value, string method, double? low, double? high) =>
    [
        Cell.Of(band.Case), Cell.Of(quantity), Cell.Of(unit), Cell.Of(value, unit), Cell.Of(method), Cell.Of(low, unit), Cell.Of(high, unit),
        low is null ? Cell.Empty : Cell.Of(UncertaintyResult.Confidence), Cell.Empty, Cell.Empty,
    ];

    private static IReadOnlyList<Cell> Row(string quantity, string note, Estimate? value = null) => value is null
        ? [Cell.Of(HonestCase), Cell.Of(quantity), .. Enumerable.Repeat(Cell.Empty, EmptyCells), Cell.Of(note)]
        : LongRow(new Figure(HonestCase, quantity, "", "", Quantities.FigureText.One, value, null, null, note, false));

    private static IReadOnlyList<Cell> LongRow(Figure f) =>
    [
        Cell.Of(f.Case),
        Cell.Of(f.Quantity),
        Cell.Of(f.Unit),
        Cell.Of(f.Estimate.Value, f.Unit),
        Cell.Of(Truth.Name(f.Estimate.Label)),
        Cell.Of(f.Estimate.Low, f.Unit),
        Cell.Of(f.Estimate.High, f.Unit),
        Cell.Of(f.Estimate.Confidence),
        Cell.Of(f.Ideal),
        Cell.Of(string.Join("; ", new[] { f.Kind == "fidelity" ? "" : f.Kind, Truth.Side(f.Estimate) ?? "", NotFinite(f.Estimate), f.Note }.Where(n => n.Length > 0))),
    ];

    private static string NotFinite(Estimate estimate) =>
        double.IsFinite(estimate.Value) ? "" : Quantities.FigureText.NonFinite(estimate.Value);

    private static List<string> Remarks(RunResult run)
    {
        List<string> remarks = [];
        CheckpointResult[] way = [.. run.Checkpoints.Where(c => c.BuiltIn)];
        if (way.Length > 0)
            remarks.Add($"Fidelity on the way: {string.Join(", ", way.Select(OnTheWay))}.");
        if (run.ListMethod is { } method)
            remarks.Add($"Verdicts on lists of {run.List!.Value.Copies} copies: {method}.");
        if (run.Yield.OnlySeen)
            remarks.Add($"Figures are {Figure.OnlySeen}: copies in which a measurement did not click are dropped by announcement, from that measurement on.");
        return remarks;
    }

    private static string OnTheWay(CheckpointResult checkpoint)
    {
        string value = Truth.CellOf(checkpoint.Fidelity) is NumberCell cell ? Quantities.FigureText.Of(cell.Value, cell.Unit, cell.Rounding) : "";
        return $"{checkpoint.Name} {value} ({Truth.Describe(checkpoint.Fidelity)})";
    }

    private static Section[] Goals(RunResult run) => run.Goals.Count == 0 ? [] :
    [
        new Section("Goals", new Table(
            [new("goal", "Goal"), new("met", "Met"), new("value", "Value"), new("label", "Label"), new("margin", "Margin", Lead: "margin ")],
            [.. run.Goals.Select(g => (IReadOnlyList<Cell>)
            [
                Cell.Of(g.Text), Cell.Of(Standing(g)), Truth.CellOf(g.Value), Cell.Of(Truth.Describe(g.Value)), Margin(g),
            ])],
            Headed: false), []),
    ];

    private static Section[] Drift(RunResult run) => run.Drift is not { } drift ? [] :
    [
        new Section($"With {Quantities.FigureText.Number(100 * drift.Fraction)} % of runs under {drift.Conditions.Name}", new Table(
            [new("case", "Case"), new("figure", "Figure"), new("whole", "Value"), new("floor", "Floor"), new("label", "Label")],
            [.. drift.Figures.Select(f => (IReadOnlyList<Cell>)[Cell.Of(f.Case), Cell.Of(f.Name), Truth.CellOf(f.Whole), Truth.CellOf(f.Floor), Cell.Of(Truth.Describe(f.Whole))])]),
            ["The floor is what the drifting runs alone give: nothing that improves the others brings the value below it."]),
    ];

    private static Section[] Levels(IReadOnlyList<LevelsResult> levels) => levels.Count == 0 ? [] :
    [
        new Section("Which physical level plays which value", new Table(
            [new("levels", "Levels of values 0, 1, …"), .. levels[0].Figures.SelectMany(f => new Column[] { new(f.Case, $"{f.Name} {f.Case}"), new($"{f.Case} label", "Label") }), new("today", "")],
            [.. levels.Select(l => (IReadOnlyList<Cell>)
            [
                Cell.Of(string.Join(", ", l.Levels)), .. l.Figures.SelectMany(f => new[] { Truth.CellOf(f.Value), Cell.Of(Truth.Describe(f.Value)) }), Cell.Of(l.Today ? "as in the conditions" : null),
            ])]),
            ["Ordered by the greatest figure of a row; set resource.levels in the conditions to choose."]),
    ];

    /// <summary>The worst of the listed strategies, with what is supposed.</summary>
    internal static Section[] Attacks(IReadOnlyList<AttackResult> attacks, Func<AttackResult, string> noticed, bool ofLists) => attacks.Count == 0 ? [] :
    [
        new Section("Worst of the listed strategies", new Table(
            [new("case", "Case"), new("at", "At"), new("choices", "Choices"), new("harm", "Harm"), new("label", "Label"), new("average", "On average"), new("averageLabel", "Label")],
            [.. attacks.Select(a => (IReadOnlyList<Cell>)
            [
                Cell.Of(a.Case),
                Cell.Of(a.At),
                Cell.Of(string.Join(", ", a.Choices.Select(c => $"{c.Key} = {c.Value}"))),
                Truth.CellOf(a.Value),
                Cell.Of(Truth.Describe(a.Value)),
                a.Average is { } average ? Truth.CellOf(average) : Cell.Empty,
                Cell.Of(a.Average is { } known ? Truth.Describe(known) : null),
            ])]), [.. attacks.Select(a => $"{a.Case}: {a.Method}{noticed(a)}."), .. Assumptions(ofLists && attacks.Any(a => a.Choices.Count > 0))]),
    ];

    /// <summary>What others see of a cheat on single copies.</summary>
    private static string Noticed(RunResult run, AttackResult attack)
    {
        string[] seen = [.. run.Cases.Single(c => c.Case == attack.Case).Metrics.Where(m => !m.Name.StartsWith("harm", StringComparison.Ordinal))
            .Select(m => $"{m.Name} {Quantities.FigureText.Number(m.Estimate.Value)}")];
        return seen.Length == 0 ? "" : $"; with it {string.Join(", ", seen)} (exact)";
    }

    // What the harms say and what they leave open, said wherever they are shown.
    private static IEnumerable<string> Assumptions(bool conditional)
    {
        if (conditional)
        {
            yield return "Harm at chosen numbers supposes that the cheat's own list holds enough positions for them, so it bounds what these numbers achieve; "
                + "the average is of a cheat that looks at its own list first, so the best such cheat does at least that.";
        }

        yield return "Harms are of the strategies listed in the script, under this model: the source and its calibration are trusted, copies are independent and alike, "
            + "messages are authenticated, and what anybody announces reaches all alike, a dishonest party's announcements included. Other strategies may do more harm.";
    }

    // A margin is the figure less the threshold for >= and the reverse for <=; which of the two tells a bound's side.
    private static DifferenceCell Margin(GoalResult goal)
    {
        double above = goal.Value.Value - goal.Threshold;
        return Math.Abs(above - goal.Margin) <= Math.Abs(above + goal.Margin) ? Truth.MoreThan(goal.Value, goal.Margin) : Truth.LessThan(goal.Value, goal.Margin);
    }

    private static bool Differ(IReadOnlyList<BranchEvaluation> branches)
    {
        double[] fidelities = [.. branches.Where(b => b is { Fidelity: not null, Probability: > 0 }).Select(b => b.Fidelity!.Value)];
        return fidelities.Length > 1 && fidelities.Max() - fidelities.Min() > SameFidelity;
    }

    private static Section Branches(CheckpointResult checkpoint)
    {
        int hidden = checkpoint.Branches.Count - ShownBranches;
        return new Section(
            $"Fidelity \"{checkpoint.Name}\" by outcome",
            BranchTable.Of(checkpoint.Branches.Take(ShownBranches)),
            hidden > 0 ? [$"{hidden} more in the JSON document."] : []);
    }
}
