using MathNet.Numerics.RootFinding;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Finds where a goal stops being met: brackets from a scan of the range, then Brent's method (R. P. Brent, Algorithms for Minimization
/// without Derivatives, ch. 4 (1973)). Whole numbers are scanned one by one.
/// </summary>
internal sealed class ToleranceJudgement
{
    /// <summary>Brackets that a range is scanned for when no number of values is given; two crossings within one are not seen.</summary>
    private const int Brackets = 40;

    /// <summary>Relative to the range; Brent's method stops there.</summary>
    private const double Accuracy = 1e-13;

    private const int MostSteps = 200;

    private readonly RunRequest _request;
    private readonly Variation _varied;
    private readonly Goal _goal;
    private readonly Dictionary<double, Point> _known = [];

    private ToleranceJudgement(RunRequest request, Variation varied, Goal goal)
    {
        _request = request;
        _varied = varied;
        _goal = goal;
    }

    public static Outcome<ToleranceResult> Of(ToleranceRequest request)
    {
        Outcome<IReadOnlyList<Variation>> varied = SweepJudgement.Variations(request.Run, request.Vary, 1);
        RunRequest run = request.Goal is { } text ? request.Run with { Script = request.Run.Script with { Text = $"{request.Run.Script.Text.TrimEnd('\n')}\n\ngoal {text}\n" } } : request.Run;
        if (varied.Value is not [var variation])
            return Outcome<ToleranceResult>.Failed([.. varied.Findings, .. Setup.From(run).Findings.Where(f => f.Severity == Severity.Error)]);
        Outcome<Setup> setup = Setup.From(variation.Into(run, variation.From));
        if (setup.Value is not { } first)
            return Outcome<ToleranceResult>.Failed(setup.Findings);
        if (Chosen(first, request.Goal is not null) is not { } goal)
            return Outcome<ToleranceResult>.Failed([StudyMessages.NoGoal()]);
        if (goal.Metric.Kind == MetricKind.Harm)
            return Outcome<ToleranceResult>.Failed([StudyMessages.GoalOnHarm()]);
        try
        {
            ToleranceJudgement judgement = new(run, variation, goal);
            return judgement.WithBands(judgement.Conclude(first, request), first);
        }
        catch (PointFailedException failure)
        {
            return Outcome<ToleranceResult>.Failed(failure.Findings);
        }
    }

    /// <summary>The goal asked for, which stands last, or the script's tightest at the beginning of the range.</summary>
    private static Goal? Chosen(Setup setup, bool given)
    {
        IReadOnlyList<Goal> goals = setup.Settings[0].Protocol.Goals;
        if (given || goals.Count < 2)
            return goals.Count == 0 ? null : goals[^1];
        List<Evaluated> all = RunJudgement.All(setup, [], cheats: false);
        return all.Count == 0 ? goals[0] : GoalJudgement.Goals(all).MinBy(g => g.Result.Margin).Goal;
    }

    private ToleranceResult Conclude(Setup first, ToleranceRequest request)
    {
        double[] scan = _varied.WholeOnly || _varied.Count is not null ? [.. _varied.Values] : [.. Enumerable.Range(0, Brackets + 1).Select(i => _varied.At((double)i / Brackets))];
        List<Crossing> crossings = [];
        for (int i = 0; i + 1 < scan.Length; i++)
        {
            bool below = At(scan[i]).Met, above = At(scan[i + 1]).Met;
            if (below != above)
                crossings.Add(Crossing(scan[i], scan[i + 1], below));
        }

        TodaysValue? today = FindToday();
        return new ToleranceResult
        {
            Version = Provenance.Version,
            Protocol = new InputFile(request.Run.Script.Name, request.Run.Script.Sha256),
            Title = first.Settings[0].Protocol.Name,
            Conditions = Provenance.Conditions(first),
            Overrides = request.Run.Overrides,
            Varied = _varied,
            Goal = _goal.Text,
            Figure = PointFigures.Name(_goal.Metric),
            Threshold = _goal.Threshold,
            Scan = [.. _known.OrderBy(p => p.Key).Select(p => new ScanPoint(p.Key, p.Value.Figure))],
            Engine = At(scan[0]).Engine,
            Crossings = [.. crossings.Select(c => c with { FromToday = c.Value - today?.Value, Relative = today is { Value: not 0 } now ? (c.Value - now.Value) / Math.Abs(now.Value) : null })],
            Today = today,
            MetAt = (At(scan[0]).Met, At(scan[^1]).Met),
            Evaluations = _known.Count,
            Warnings = first.Notes,
        };
    }

    private Crossing Crossing(double from, double to, bool metBelow)
    {
        double value = _varied.WholeOnly ? (metBelow ? from : to) : Brent.FindRoot(v => At(v).Margin, from, to, Accuracy * Math.Abs(to - from), MostSteps);
        Point at = At(value);
        return new Crossing(value, metBelow, at.Figure, at.Flight);
    }

    /// <summary>Today's value with its figure, evaluated as the conditions stand; null when there is none, or an inherited one that does not act.</summary>
    private TodaysValue? FindToday()
    {
        if (Setup.From(_request).Value is not { } setup || Today.Of(setup, _varied) is not { } today || PointOf(setup, []) is not { } now)
            return null;
        bool acts = today.Own || (TryAt(today.Value) is { } put && Math.Abs(put.Margin - now.Margin) < SameMargin);
        return acts ? new TodaysValue(today.Value, now.Met, now.Figure) : null;
    }

    private Outcome<ToleranceResult> WithBands(ToleranceResult result, Setup first)
    {
        if (_request.Uncertainty is null)
            return Outcome<ToleranceResult>.Of(result);
        IReadOnlyList<UncertainInput> inputs = UncertainInputs.Of(first.Document);
        Crossing[] smooth = [.. result.Crossings.Where(c => !_varied.WholeOnly && c.Figure.Label != TruthLabel.Sampled)];
        Outcome<FigureBand>[] found = [.. smooth.Select(c => CrossingUncertainty.Of(
            _varied.Into(_request, c.Value), inputs, _varied, c.Value, s => PointOf(s, [])?.Margin, v => TryAt(v)?.Margin))];
        if (found.Any(f => !f.Succeeded))
            return Outcome<ToleranceResult>.Failed([.. found.SelectMany(f => f.Findings).Distinct()]);
        FigureBand[] bands = [.. found.Select(f => f.Value!)];
        return Outcome<ToleranceResult>.Of(result with
        {
            Crossings = [.. result.Crossings.Select(c => c with { Band = bands.ElementAtOrDefault(Array.IndexOf(smooth, c)) })],
            Uncertainty = new UncertaintyResult
            {
                Inputs = inputs,
                Figures = bands,
                Leading = bands.FirstOrDefault(),
                Samples = 0,
                Redrawn = 0,
                Seed = _request.Seed,
                LeftOut = smooth.Length == result.Crossings.Count ? [] : [_varied.WholeOnly ? "tolerated whole numbers, which do not move smoothly" : "crossings of sampled figures"],
            },
            Warnings = inputs.Count == 0 ? [.. result.Warnings, UncertaintyMessages.NothingUncertain()] : result.Warnings,
        });
    }

    /// <summary>Margins closer than this are of the same conditions.</summary>
    private const double SameMargin = 1e-12;

    /// <summary>One value evaluated.</summary>
    private sealed record Point(double Margin, bool Met, Estimate Figure, EngineChoice Engine, (double Metres, double Seconds)? Flight);

    private Point At(double value)
    {
        if (!_known.TryGetValue(value, out Point? point))
            _known[value] = point = Evaluate(value);
        return point;
    }

    private Point Evaluate(double value)
    {
        List<Diagnostic> findings = [];
        Outcome<Setup> setup = Setup.From(_varied.Into(_request, value));
        Point? point = setup.Value is { } read ? PointOf(read, findings) : null;
        Diagnostic[] errors = [.. setup.Findings.Concat(findings).Where(f => f.Severity == Severity.Error).Distinct()];
        return errors.Length > 0 ? throw new PointFailedException(errors)
            : point ?? throw new PointFailedException([StudyMessages.UndefinedGoal(_varied.Path, _varied.Text(value))]);
    }

    /// <summary>A value evaluated, wherever it lies; null where that cannot be done.</summary>
    private Point? TryAt(double value) => Setup.From(_varied.Into(_request, value)).Value is { } setup ? PointOf(setup, []) : null;

    /// <summary>A setup evaluated; null where the goal's figure is not defined.</summary>
    private Point? PointOf(Setup setup, List<Diagnostic> findings)
    {
        List<Evaluated> all = RunJudgement.All(setup, findings, cheats: false, besideIdeal: false);
        if (findings.Any(f => f.Severity == Severity.Error))
            return null;
        GoalResult result = GoalJudgement.Goals(all).Single(g => g.Goal.Text == _goal.Text).Result;
        if (double.IsNaN(result.Margin))
            return null;
        Setting setting = all[0].Setting;
        var flights = setting.Protocol.Holders.Select(p => setting.World.Parties[p].Flight).Select(f => (Metres: f.Length.Metres, f.Time.Seconds)).Where(f => f.Metres > 0 && f.Seconds > 0).ToArray();
        return new Point(result.Margin, result.Met, result.Value, all[0].Actual.Engine, flights.Length == 0 ? null : flights.MaxBy(f => f.Seconds));
    }

    private sealed class PointFailedException(IReadOnlyList<Diagnostic> findings) : Exception
    {
        public IReadOnlyList<Diagnostic> Findings { get; } = findings;
    }
}
