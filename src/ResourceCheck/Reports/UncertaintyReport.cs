using System.Globalization;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Tables of what uncertain values do: bands of figures, and which value moves the first figure most.</summary>
internal static class UncertaintyReport
{
    private const double Hundred = 100;

    /// <summary>The two tables for people; none where nothing is uncertain.</summary>
    /// <param name="uncertainty">What was found; null where it was not asked for.</param>
    /// <param name="shown">Whether a figure is shown.</param>
    public static IReadOnlyList<Section> Sections(UncertaintyResult? uncertainty, Func<FigureBand, bool> shown) => uncertainty is not { Inputs.Count: > 0 } ? [] :
    [
        new Section("From uncertain values", Bands([.. uncertainty.Figures.Where(f => shown(f) && f.Moves)]), Remarks(uncertainty)),
        .. uncertainty.Leading is { Moves: true } leading ? [Ranking(leading, uncertainty)] : Array.Empty<Section>(),
    ];

    /// <summary>The ranked table of one figure.</summary>
    public static Section Ranking(FigureBand figure, UncertaintyResult uncertainty) => new(
        $"What moves {Name(figure)}",
        new Table(
            [
                new("path", "Value"), new("given", "Given as"), new("derivative", "Change per unit"), new("per", "Unit"), new("moves", "Moves it by"), new("share", "Of the variance, %", "%"), new("note", "Note"),
            ],
            [.. figure.Sensitivities.Select(s => Row(s, uncertainty.Inputs.Single(i => i.Path == s.Path)))]),
        ["Derivatives by differences, to first order. An entry that several parties share moves for all of them together; entries are independent of each other."]);

    /// <summary>A figure as tables name it.</summary>
    public static string Name(FigureBand figure) => figure.Kind switch
    {
        FigureKind.Checkpoint => $"fidelity {figure.Name}",
        FigureKind.Goal => $"the figure of {figure.Name}",
        FigureKind.Time => figure.Name == "duration" ? "time per copy" : "time until the next kept copy",
        FigureKind.Yield => "copies kept",
        FigureKind.Loss => $"the loss of {figure.Name}",
        FigureKind.Tolerance => $"the tolerated {figure.Name}",
        _ => figure.Case == FigureBand.Honest ? figure.Name : $"{figure.Name} \"{figure.Case}\"",
    };

    private static string UnitOf(FigureBand figure) => figure.Kind == FigureKind.Time ? "s" : FigureText.One;

    private static Table Bands(IReadOnlyList<FigureBand> figures) => new(
        [
            new("figure", "Figure"), new("value", "Value"), new("uncertainty", "±"), new("low", "95 % from"), new("high", "to"), new("sampledUncertainty", "Sampled ±"), new("sampledLow", "95 % from"), new("sampledHigh", "to"),
        ],
        [.. figures.Select(f => (IReadOnlyList<Cell>)
        [
            Cell.Of(Name(f)), Truth.CellOf(f.Value, UnitOf(f)), Spread(f.StandardUncertainty, f), Cell.Of(f.Low, UnitOf(f)), Cell.Of(f.High, UnitOf(f)),
            f.Sampled is { } s ? Spread(s.StandardUncertainty, f) : Cell.Empty, Cell.Of(f.Sampled?.Low, UnitOf(f)), Cell.Of(f.Sampled?.High, UnitOf(f)),
        ])]);

    private static Cell Spread(double uncertainty, FigureBand figure) =>
        figure.Kind == FigureKind.Time ? Cell.Of(FigureText.AboutTime(uncertainty)) : Cell.Of(FigureText.Uncertainty(uncertainty));

    private static IReadOnlyList<Cell> Row(Sensitivity s, UncertainInput input) =>
    [
        Cell.Of(s.Path),
        Cell.Of($"{FigureText.Number(input.Value)} ± {FigureText.Uncertainty(input.StandardUncertainty)}{(input.Unit.Length == 0 ? "" : $" {input.Unit}")}"),
        Cell.Of(s.Derivative),
        Cell.Of(input.Unit.Length == 0 ? "" : input.Unit.Contains('/', StringComparison.Ordinal) ? $"1/({input.Unit})" : $"1/{input.Unit}"),
        Cell.Of(s.Moves),
        Cell.Of(Math.Round(Hundred * s.Share, 1), ""),
        Cell.Of(s.OneSided ? "from one side" : ""),
    ];

    private static List<string> Remarks(UncertaintyResult uncertainty)
    {
        List<string> remarks = ["± is the standard uncertainty to first order (linear), its band reaches 1.96 times as far and is cut off where the figure cannot lie. Figures that do not move are left out."];
        if (uncertainty.Samples > 0)
        {
            string truncated = uncertainty.Redrawn == 0 ? "none of which the conditions refused"
                : $"truncated to what the conditions allow ({uncertainty.Redrawn.ToString(CultureInfo.InvariantCulture)} were drawn anew)";
            remarks.Add(string.Create(CultureInfo.InvariantCulture, $"Sampled: standard deviation and 95 % band of {uncertainty.Samples} draws of the values from normal laws, {truncated}; seed {uncertainty.Seed}."));
        }

        remarks.AddRange(uncertainty.LeftOut.Select(l => $"Left out: {l}."));
        return remarks;
    }
}
