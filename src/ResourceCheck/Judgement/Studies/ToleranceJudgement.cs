using MathNet.Numerics.RootFinding;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
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
            return Outcome<ToleranceResult>.Of(new ToleranceJudgement(run, variation, goal).Conclude(first, request));
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
            Crossings = crossings,
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
        List<Evaluated> all = setup.Value is { } read ? RunJudgement.All(read, findings, cheats: false) : [];
        Diagnostic[] errors = [.. setup.Findings.Concat(findings).Where(f => f.Severity == Severity.Error).Distinct()];
        if (errors.Length > 0)
            throw new PointFailedException(errors);
        GoalResult result = GoalJudgement.Goals(all).Single(g => g.Goal.Text == _goal.Text).Result;
        if (double.IsNaN(result.Margin))
            throw new PointFailedException([StudyMessages.UndefinedGoal(_varied.Path, _varied.Text(value))]);
        Setting setting = all[0].Setting;
        var flights = setting.Protocol.Holders.Select(p => setting.World.Parties[p].Flight).Select(f => (Metres: f.Length.Metres, f.Time.Seconds)).Where(f => f.Metres > 0 && f.Seconds > 0).ToArray();
        return new Point(result.Margin, result.Met, result.Value, all[0].Actual.Engine, flights.Length == 0 ? null : flights.MaxBy(f => f.Seconds));
    }

    private sealed class PointFailedException(IReadOnlyList<Diagnostic> findings) : Exception
    {
        public IReadOnlyList<Diagnostic> Findings { get; } = findings;
    }
}
