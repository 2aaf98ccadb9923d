using System.Globalization;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Looks for thresholds with which few copies hold the targets: at each number of copies a pattern search over the thresholds (R. Hooke and
/// T. A. Jeeves, J. ACM 8, 212 (1961)), in which the cheats' numbers follow from one trial to the next by short climbs. What it finds is a
/// proposal; the numbers shown are computed anew.
/// </summary>
internal sealed class ThresholdSearch
{
    /// <summary>Thresholds move in parts of this.</summary>
    private const int Grid = 1000;

    /// <summary>First step of the pattern search, in parts of the grid.</summary>
    private const int FirstStep = 32;

    /// <summary>Trials at each number of copies.</summary>
    private const int MostTrials = 600;

    /// <summary>Looks at all numbers of the cheats at each number of copies.</summary>
    private const int MostLooks = 4;

    /// <summary>Paths left out of a trial's honest failure, as a part of the target.</summary>
    private const double LeftOut = 1e-8;

    /// <summary>The number of copies is found to this part of itself.</summary>
    private const double Precision = 0.02;

    private readonly CopiesRequest _request;
    private readonly string _copies;
    private readonly IReadOnlyList<ParameterInfo> _thresholds;
    private readonly Rational[] _given;
    private readonly HarmClimbs _harms;
    private int _trials;

    private ThresholdSearch(CopiesRequest request, string copies, IReadOnlyList<ParameterInfo> thresholds, Rational[] given)
    {
        _request = request;
        _copies = copies;
        _thresholds = thresholds;
        _given = given;
        _harms = new HarmClimbs(request.Run, request.Harm);
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
        Trial good = Best(Math.Min(start, most), new int[_given.Length]);
        Trial? bad = null;
        while (!good.Holds)
        {
            if (good.Copies >= most)
                return null;
            bad = good;
            good = Best(Math.Min(most, (int)Math.Ceiling(good.Copies * good.Growth)), good.Moves);
        }

        int below = bad?.Copies ?? 0;
        while (good.Copies - below > 1 + (good.Copies * Precision))
        {
            Trial middle = Best((good.Copies + below) / 2, good.Moves);
            if (middle.Holds)
                good = middle;
            else
                below = middle.Copies;
        }

        return new Proposal(good.Copies, [.. Values(good.Moves).Zip(_thresholds, (v, t) => KeyValuePair.Create(t.Name, v))]);
    }

    /// <summary>
    /// The best thresholds that a pattern search finds for a number of copies; it ends where the targets hold. Attacks that the climbs missed
    /// are looked for there, and the search goes on with them.
    /// </summary>
    private Trial Best(int copies, int[] from)
    {
        _trials = 0;
        Trial best = Climbed(Tried(copies, from, double.PositiveInfinity), FirstStep);
        for (int look = 0; look < MostLooks && best.Holds && Missed(best); look++)
            best = Climbed(Tried(copies, best.Moves, double.PositiveInfinity), FirstStep / 2);

        _request.Progress?.Report(new CopiesStep(best.Copies, Estimate.AtLeast(best.Failure), Estimate.AtLeast(best.Harm)));
        return best;
    }

    private Trial Climbed(Trial best, int first)
    {
        for (int step = first; step >= 1 && Goes(best); step /= 2)
        {
            while (Improved(best, step) is { } better)
                best = better;
        }

        return best;
    }

    /// <summary>Whether a look at all numbers finds an attack that is worse than the target, which the climbs know from now on.</summary>
    private bool Missed(Trial trial) => _request.Harm < 1 && _harms.Tasks(Read(trial.Copies, trial.Moves)!).ToArray().Any(t => _harms.Look(t.Key, t.Task) > _request.Harm);

    private bool Goes(Trial best) => !best.Holds && _trials < MostTrials;

    /// <summary>Moves each threshold, and if none helps two against each other; then goes on the same way as long as that helps. Null where nothing does.</summary>
    private Trial? Improved(Trial start, int step)
    {
        Trial best = Explored(start, Single(step));
        if (best == start)
            best = Explored(start, Pairs(step));
        if (best == start)
            return null;
        int[] way = [.. best.Moves.Zip(start.Moves, (a, b) => a - b)];
        while (Goes(best) && Tried(best.Copies, Plus(best.Moves, way), best.Score) is var next && next.Score < best.Score)
            best = next;
        return best;
    }

    private Trial Explored(Trial best, IEnumerable<int[]> moves)
    {
        foreach (int[] move in moves)
        {
            if (!Goes(best))
                break;
            Trial next = Tried(best.Copies, Plus(best.Moves, move), best.Score);
            if (next.Score < best.Score)
                best = next;
        }

        return best;
    }

    private IEnumerable<int[]> Single(int step) =>
        from i in Enumerable.Range(0, _given.Length)
        from sign in new[] { -step, step }
        select Plus(new int[_given.Length], i, sign);

    private IEnumerable<int[]> Pairs(int step) =>
        from i in Enumerable.Range(0, _given.Length)
        from k in Enumerable.Range(0, i)
        from one in new[] { -step, step }
        from other in new[] { -step, step }
        select Plus(Plus(new int[_given.Length], i, one), k, other);

    private static int[] Plus(int[] moves, int[] more) => [.. moves.Zip(more, (a, b) => a + b)];

    private static int[] Plus(int[] moves, int index, int more) => [.. moves.Select((m, i) => i == index ? m + more : m)];

    private IEnumerable<Rational> Values(int[] moves) => _given.Zip(moves, (v, n) => v + Rational.From(n, Grid));

    /// <summary>Figures at some thresholds; what is left is not computed once the trial is no better than what is known.</summary>
    private Trial Tried(int copies, int[] moves, double known)
    {
        _trials++;
        Trial trial = Trial.At(copies, moves);
        if (Read(copies, moves) is not { } setting || setting.Protocol.Requirements.Any(r => !r.Holds))
            return trial.Refused();
        trial = trial.WithFailure(Failure(setting), _request.Failure);
        if (_request.Harm >= 1)
            return trial;
        foreach ((string key, ListTask task) in _harms.Tasks(setting))
        {
            if (trial.Score >= known)
                break;
            trial = trial.WithHarm(_harms.Of(key, task, Trial.Room(known, trial.Score) * _request.Harm), _request.Harm);
        }

        return trial;
    }

    private double Failure(Setting setting)
    {
        PreparedState state = Resource.Prepare(setting.World.Resource, setting.Protocol.Holders.Count).Value!; // was read with the request
        EngineChoice engine = Evaluator.Choose(setting, _request.Run).Value!;
        return setting.InputAssignments().ToArray().AsParallel().WithCancellation(_request.Run.Cancellation).Max(inputs =>
        {
            Evaluation copy = Evaluator.Copies(setting, setting.Plan, state, inputs, engine, _request.Run);
            ListTask task = new() { Protocol = setting.Protocol, Copies = copy.Copies, Inputs = inputs, Limits = new ListLimits(Negligible: _request.Failure * LeftOut) };
            return CountingEngine.Evaluate(task, _request.Run.Cancellation).Evaluation?.Failure.Value ?? 1;
        });
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

    /// <summary>
    /// Figures at some thresholds. The score adds up powers of how many times each figure is its target: nearly the greatest of them, but it also falls
    /// where one that is a little less gives way, which moves of one threshold need to get along a ridge.
    /// </summary>
    private sealed record Trial(int Copies, int[] Moves, double Failure, double Harm, double Score, bool Holds, double Growth)
    {
        private const double LeastGrowth = 1.03;
        private const double MostGrowth = 2;
        private const double Power = 4;

        /// <summary>How many times its target a further figure may be before the score is no better than one that is known.</summary>
        public static double Room(double known, double score) => Math.Pow(known - score, 1 / Power);

        public static Trial At(int copies, int[] moves) => new(copies, moves, 0, 0, 0, Holds: true, LeastGrowth);

        /// <summary>Outside what a threshold may be or what the script requires.</summary>
        public Trial Refused() => this with { Score = double.PositiveInfinity, Holds = false, Growth = MostGrowth };

        public Trial WithFailure(double value, double target) => With(value, target) with { Failure = value };

        public Trial WithHarm(double value, double target) => With(value, target) with { Harm = Math.Max(Harm, value) };

        /// <summary>Copies must grow as failures that fall exponentially say.</summary>
        private Trial With(double value, double target)
        {
            double growth = value >= 1 ? MostGrowth : value > target ? Math.Log(target) / Math.Log(value) : LeastGrowth;
            return this with { Score = Score + Math.Pow(value / target, Power), Holds = Holds && value <= target, Growth = Math.Clamp(growth, Growth, MostGrowth) };
        }
    }
}

/// <summary>A number of copies and thresholds that are worth a closer look.</summary>
/// <param name="Copies">Number of copies.</param>
/// <param name="Thresholds">Values by name.</param>
internal sealed record Proposal(int Copies, IReadOnlyList<KeyValuePair<string, Rational>> Thresholds);
