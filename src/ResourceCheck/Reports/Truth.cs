using ResourceCheck.Engines;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>Words and rounding that go with a truth label.</summary>
internal static class Truth
{
    /// <summary>The label's name in files: <c>exact</c>, <c>bound</c>, <c>sampled</c>.</summary>
    public static string Name(TruthLabel label) => label switch
    {
        TruthLabel.Exact => "exact",
        TruthLabel.Bound => "bound",
        _ => "sampled",
    };

    /// <summary>A bound's side: <c>at least</c>, <c>at most</c>, <c>between</c>; null for anything else.</summary>
    public static string? Side(Estimate estimate) => estimate.Label != TruthLabel.Bound ? null
        : (double.IsFinite(estimate.Low), double.IsFinite(estimate.High)) switch
        {
            (true, false) => "at least",
            (false, true) => "at most",
            (true, true) => "between",
            _ => null,
        };

    /// <summary>The label as people read it, with a bound's side or an interval.</summary>
    public static string Describe(Estimate estimate) => (estimate.Label, Side(estimate)) switch
    {
        _ when double.IsNaN(estimate.Value) => "",
        (TruthLabel.Bound, "between") => $"bound, {Interval(estimate)}",
        (TruthLabel.Bound, { } side) => $"bound, {side}",
        (TruthLabel.Sampled, _) => $"sampled, {Interval(estimate)} ({FigureText.Number(100 * estimate.Confidence)} %)",
        (var label, _) => Name(label),
    };

    /// <summary>A cell that never shows a bound as better than it is.</summary>
    public static Cell CellOf(Estimate estimate, string unit = FigureText.One) => Cell.Of(estimate.Value, unit, Side(estimate) switch
    {
        "at least" => Rounding.Down,
        "at most" => Rounding.Up,
        _ => Rounding.Nearest,
    });

    /// <summary>What a figure has more than something fixed.</summary>
    public static DifferenceCell MoreThan(Estimate estimate, double difference) => Difference(difference, Side(estimate));

    /// <summary>What something fixed has more than a figure: a bound changes its side.</summary>
    public static DifferenceCell LessThan(Estimate estimate, double difference) => Difference(difference, Side(estimate) switch
    {
        "at least" => "at most",
        "at most" => "at least",
        var side => side,
    });

    private static DifferenceCell Difference(double value, string? side) => side switch
    {
        "at least" => new(value, Rounding.Down, "at least "),
        "at most" => new(value, Rounding.Up, "at most "),
        _ => new(value, Rounding.Nearest, ""),
    };

    private static string Interval(Estimate estimate) => !double.IsFinite(estimate.Low) && !double.IsFinite(estimate.High)
        ? "no interval"
        : $"{FigureText.Number(estimate.Low, Rounding.Down)} to {FigureText.Number(estimate.High, Rounding.Up)}";
}
