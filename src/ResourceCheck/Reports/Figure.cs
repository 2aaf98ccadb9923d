using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>One figure of a run: a row of every table that shows it.</summary>
/// <param name="Case">Case it belongs to.</param>
/// <param name="Quantity">Its name in files.</param>
/// <param name="Title">Its name for people.</param>
/// <param name="Kind">What sort of figure, where the name does not say it.</param>
/// <param name="Unit">Its unit.</param>
/// <param name="Estimate">Value, label and interval.</param>
/// <param name="Ideal">The same under ideal conditions; null where that says nothing.</param>
/// <param name="Lost">Ideal minus value; null where that says nothing.</param>
/// <param name="Note">What must be known with it.</param>
/// <param name="Prominent">Whether the short table for people shows it.</param>
internal sealed record Figure(
    string Case, string Quantity, string Title, string Kind, string Unit, Estimate Estimate, double? Ideal, double? Lost, string Note, bool Prominent)
{
    private const string Honest = "honest";

    /// <summary>A fraction this near to 1 is 1.</summary>
    private const double RoundOff = 1e-12;

    /// <summary>All figures of a run: fidelities on the way, metrics of each case, kept copies, times.</summary>
    public static IReadOnlyList<Figure> AllOf(RunResult run) =>
    [
        .. run.Checkpoints.Select(c => OfCheckpoint(c, run)),
        .. run.Cases.SelectMany(c => c.Metrics.Select(m => OfMetric(c, m, run))),
        OfYield(run.Yield),
        OfTime("duration", "time per copy", run.Duration, run.DurationRange),
        .. run.SecondsPerKeptCopy is { } seconds ? [OfTime("seconds per kept copy", "time until the next kept copy", seconds, run.SecondsPerKeptCopyRange)] : Array.Empty<Figure>(),
        .. run.List is { Seconds: { } whole } list ? [OfTime("seconds per list", $"time until {list.Copies} copies are kept", whole, null)] : Array.Empty<Figure>(),
    ];

    private static Figure OfCheckpoint(CheckpointResult checkpoint, RunResult run) => new(
        Honest, checkpoint.Name, checkpoint.Name, "fidelity", FigureText.One, checkpoint.Fidelity, checkpoint.Ideal, checkpoint.Loss,
        Join(ReachedNote(checkpoint), RangeNote(checkpoint.Range, checkpoint.Fidelity.Label), KeptNote(checkpoint, run.Yield.Value.Value), checkpoint.BuiltIn ? "" : SeenNote(run)), !checkpoint.BuiltIn);

    private static Figure OfMetric(CaseResult of, MetricResult metric, RunResult run) => new(
        of.Case, metric.Name, of.Case == Honest ? metric.Name : $"{metric.Name} \"{of.Case}\"", of.Dishonest.Count == 0 ? "" : $"by {string.Join(", ", of.Dishonest)}",
        FigureText.One, metric.Estimate, metric.Ideal, null, Join(RangeNote(metric), PresentNote(metric.Estimate), SeenNote(run)),
        !IsIdleAbort(metric) && (of.Case == Honest || metric.Name.StartsWith("harm", StringComparison.Ordinal)));

    private static Figure OfYield(YieldResult yield) =>
        new(Honest, "yield", "copies kept", "", FigureText.One, yield.Value, null, null, FactorNote(yield), true);

    private static Figure OfTime(string quantity, string title, double seconds, (double Low, double High)? range) =>
        new(Honest, quantity, title, "", "s", Estimate.Exact(seconds), null, null, range is { } ends ? $"from {FigureText.Time(ends.Low)} to {FigureText.Time(ends.High)}" : "", true);

    // A protocol in which nobody can give up needs no line that says so.
    private static bool IsIdleAbort(MetricResult metric) => metric is { Name: "abort", Estimate: { Label: TruthLabel.Exact, Value: 0 } };

    private static string RangeNote(MetricResult metric) => Join(
        metric.WorstAt is { Length: > 0 } at ? $"worst at {at}" : "",
        RangeNote(metric.Range, metric.Estimate.Label));

    // Bounds are rounded to their side, so the ends of a range of them are rounded outwards: none lies outside.
    private static string RangeNote((double Low, double High)? range, TruthLabel label)
    {
        (Rounding low, Rounding high) = label == TruthLabel.Bound ? (Rounding.Down, Rounding.Up) : (Rounding.Nearest, Rounding.Nearest);
        return range is { } ends ? $"from {FigureText.Number(ends.Low, low)} to {FigureText.Number(ends.High, high)}" : "";
    }

    private static string PresentNote(Estimate estimate) => estimate.Present < 1 ? $"present in {FigureText.Number(estimate.Present)} of copies" : "";

    private static string ReachedNote(CheckpointResult checkpoint) => (double.IsNaN(checkpoint.Fidelity.Value), checkpoint.Ideal is null) switch
    {
        (true, true) => "never reached, under ideal conditions neither",
        (true, false) => "never reached",
        (false, true) => "never reached under ideal conditions",
        _ => "",
    };

    private static string KeptNote(CheckpointResult checkpoint, double yield) =>
        !double.IsNaN(checkpoint.Fidelity.Value) && checkpoint.Kept < 1 && Math.Abs(checkpoint.Kept - yield) > RoundOff ? $"{FigureText.Number(checkpoint.Kept)} of copies kept so far" : "";

    private static string FactorNote(YieldResult yield) => Join(
        RangeNote(yield.Range, yield.Value.Label),
        yield.Heralded < 1 - RoundOff ? $"{FigureText.Number(yield.Heralded)} arrive" : "",
        yield.Seen < 1 - RoundOff ? $"{FigureText.Number(yield.Seen)} not dropped for a missing click" : "",
        yield.Kept < 1 - RoundOff ? $"{FigureText.Number(yield.Kept)} are kept by the script" : "");

    private static string SeenNote(RunResult run) => run.Yield.OnlySeen ? OnlySeen : "";

    /// <summary>The note on figures from which copies without a click were dropped.</summary>
    public const string OnlySeen = "of the copies that all saw";

    private static string Join(params IEnumerable<string> notes) => string.Join("; ", notes.Where(n => n.Length > 0));
}
