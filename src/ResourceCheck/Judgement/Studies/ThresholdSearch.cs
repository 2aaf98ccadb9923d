using System.Globalization;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Looks for thresholds with which few copies hold the targets: at each number of copies a pattern search over the thresholds, in which
/// the cheats' numbers follow from one trial to the next by short climbs. What it finds is a proposal; the numbers shown are computed anew.
/// </summary>
internal sealed class ThresholdSearch
{
    /// <summary>Thresholds move in parts of this.</summary>
    private const int Grid = 1000;

    /// <summary>First step of the pattern search, in parts of the grid.</summary>
    private const int FirstStep = 16;

    /// <summary>Trials at each number of copies.</summary>
    private const int MostTrials = 90;

    /// <summary>Paths left out of a trial, as a part of the target.</summary>
    private const double LeftOut = 1e-4;

    /// <summary>The number of copies is found to this part of itself.</summary>
    private const double Precision = 0.02;

    private readonly CopiesRequest _request;
    private readonly string _copies;
    private readonly IReadOnlyList<ParameterInfo> _thresholds;
    private readonly Rational[] _given;
    private readonly Dictionary<string, (int Copies, int[] Point)> _worst = [];

    private ThresholdSearch(CopiesRequest request, string copies, IReadOnlyList<ParameterInfo> thresholds, Rational[] given)
    {
        _request = request;
        _copies = copies;
        _thresholds = thresholds;
        _given = given;
    }

    /// <summary>Proposes a number of copies and thresholds; null where none up to the most holds the targets.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="copies">Parameter behind <c>copies</c>.</param>
    /// <param name="thresholds">Parameters that may move.</param>
    /// <param name="protocol">The protocol at the values given.</param>
    /// <param name="most">Most copies.</param>
    public static Proposal? Find(CopiesRequest request, string copies, IReadOnlyList<ParameterInfo> thresholds, Protocol protocol, int most)
    {
        Rational[] given = [.. thresholds.Select(t => protocol.Parameters.Single(p => p.Name == t.Name).Value)];
        return new ThresholdSearch(request, copies, thresholds, given).Least(protocol.Lists!.Copies, most);
    }

    private Proposal? Least(int start, int most)
    {
        Trial good = Best(Tried(Math.Min(start, most), new int[_given.Length]));
        Trial? bad = null;
        while (good.Excess > 0)
        {
            if (good.Copies >= most)
                return null;
            bad = good;
            good = Best(Tried(Math.Min(most, (int)Math.Ceiling(good.Copies * good.Factor)), good.Moves));
        }

        int below = bad?.Copies ?? 0;
        while (good.Copies - below > 1 + (good.Copies * Precision))
        {
            Trial middle = Best(Tried((good.Copies + below) / 2, good.Moves));
            if (middle.Excess <= 0)
                good = middle;
            else
                below = middle.Copies;
        }

        return new Proposal(good.Copies, [.. Values(good.Moves).Zip(_thresholds, (v, t) => KeyValuePair.Create(t.Name, v))]);
    }

    /// <summary>Moves one threshold, or two against each other, as long as that helps, in ever smaller steps, until the targets hold or no trial is left.</summary>
    private Trial Best(Trial start)
    {
        Trial best = start;
        int trials = 0;
        for (int step = FirstStep; step >= 1 && best.Excess > 0; step /= 2)
        {
            bool helped = true;
            while (helped && best.Excess > 0 && trials < MostTrials)
            {
                helped = false;
                foreach (int[] move in Moves(step))
                {
                    if (best.Excess <= 0 || trials++ >= MostTrials)
                        break;
                    Trial next = Tried(best.Copies, [.. best.Moves.Zip(move, (a, b) => a + b)], best.Excess);
                    (best, helped) = next.Excess < best.Excess ? (next, true) : (best, helped);
                }
            }
        }

        _request.Progress?.Report(new CopiesStep(best.Copies, Estimate.AtLeast(best.Failure), Estimate.AtLeast(best.Harm)));
        return best;
    }

    private IEnumerable<int[]> Moves(int step)
    {
        for (int i = 0; i < _given.Length; i++)
        {
            foreach (int sign in (int[])[-step, step])
                yield return [.. _given.Select((_, k) => k == i ? sign : 0)];
        }
    }

    private IEnumerable<Rational> Values(int[] moves) => _given.Zip(moves, (v, n) => v + Rational.From(n, Grid));

    /// <summary>How far the greatest figure is above its target; the rest is left out once one is no better than what is known.</summary>
    private Trial Tried(int copies, int[] moves, double known = double.PositiveInfinity)
    {
        Trial trial = new(copies, moves, 0, 0, double.PositiveInfinity, 2);
        if (Read(copies, moves) is not { } setting || setting.Protocol.Requirements.Any(r => !r.Holds))
            return trial;
        PreparedState state = Resource.Prepare(setting.World.Resource, setting.Protocol.Holders.Count).Value!; // was read with the request
        EngineChoice engine = Evaluator.Choose(setting, _request.Run).Value!;
        Value[][] inputs = [.. setting.InputAssignments().Select(i => i.ToArray())];
        double failure = inputs.Max(i => Failure(setting, state, i, engine));
        trial = trial.With(failure, _request.Failure, isHarm: false);
        foreach (DishonestCase cheat in setting.Protocol.Dishonest.Where(_ => _request.Harm < 1))
        {
            for (int i = 0; i < (cheat.Asks(setting.Protocol.Inputs) ? inputs.Length : 1) && trial.Excess < known; i++)
            {
                if (CheatEvaluator.ListTaskOf(setting, cheat, state, inputs[i], engine, _request.Run) is { } task)
                    trial = trial.With(Harm(task, string.Create(CultureInfo.InvariantCulture, $"{cheat.Name}:{i}")), _request.Harm, isHarm: true);
            }
        }

        return trial;
    }

    private double Failure(Setting setting, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine)
    {
        Evaluation copy = Evaluator.Copies(setting, setting.Plan, state, inputs, engine, _request.Run);
        ListTask task = new() { Protocol = setting.Protocol, Copies = copy.Copies, Inputs = inputs, Limits = new ListLimits(Negligible: _request.Failure * LeftOut * LeftOut) };
        return CountingEngine.Evaluate(task, _request.Run.Cancellation).Evaluation?.Failure.Value ?? 1;
    }

    /// <summary>The first time a search, later climbs from the worst numbers of the last trial, brought to this number of copies.</summary>
    private double Harm(ListTask task, string key)
    {
        if (task.Case!.Choices.Count == 0)
            return CountingEngine.Evaluate(task, _request.Run.Cancellation).Evaluation?.Harm.Value ?? 1;
        int copies = task.Protocol.Lists!.Copies;
        if (!_worst.TryGetValue(key, out (int Copies, int[] Point) last))
        {
            AttackOutcome found = WorstCase.Find(task, new SearchOptions(), null, _request.Run.Cancellation);
            if (found is not { Search: { } search, Evaluation: { } evaluation })
                return 1;
            _worst[key] = (copies, [.. search.Choices]);
            return evaluation.Harm.Value;
        }

        int[] scaled = [.. last.Point.Select((n, i) => task.Case.Choices[i].Whole ? (int)((long)n * copies / last.Copies) : n)];
        (int[] point, double harm) = WorstCase.Near(task, [scaled, last.Point], Math.Min(_request.Harm * LeftOut, 1e-7), _request.Run.Cancellation);
        if (harm > 0)
            _worst[key] = (copies, point);
        return harm;
    }

    private Setting? Read(int copies, int[] moves)
    {
        Rational[] values = [.. Values(moves)];
        if (_thresholds.Zip(values).Any(p => !p.First.Allows(p.Second)))
            return null;
        IEnumerable<KeyValuePair<string, string>> kept = _request.Run.Parameters.Where(p => p.Key != _copies && _thresholds.All(t => t.Name != p.Key));
        RunRequest at = _request.Run with
        {
            Parameters = [.. kept, new(_copies, copies.ToString(CultureInfo.InvariantCulture)), .. _thresholds.Zip(values, (t, v) => KeyValuePair.Create(t.Name, v.ToString()))],
        };
        return Setup.From(at).Value?.Settings.Single();
    }

    /// <summary>Figures at some thresholds, of which the greatest was computed last.</summary>
    private sealed record Trial(int Copies, int[] Moves, double Failure, double Harm, double Excess, double Factor)
    {
        /// <summary>With one more figure; the excess is in factors of e, and copies must grow as failures that fall exponentially say.</summary>
        public Trial With(double value, double target, bool isHarm)
        {
            double excess = value > 0 ? Math.Log(value / target) : double.NegativeInfinity;
            Trial told = isHarm ? this with { Harm = Math.Max(Harm, value) } : this with { Failure = value };
            if (!double.IsPositiveInfinity(Excess) && excess <= Excess)
                return told;
            double factor = value is > 0 and < 1 ? Math.Log(target) / Math.Log(value) : 2;
            return told with { Excess = excess, Factor = Math.Clamp(factor, 1.03, 2) };
        }
    }
}

/// <summary>A number of copies and thresholds that are worth a closer look.</summary>
/// <param name="Copies">Number of copies.</param>
/// <param name="Thresholds">Values by name.</param>
internal sealed record Proposal(int Copies, IReadOnlyList<KeyValuePair<string, Rational>> Thresholds);
