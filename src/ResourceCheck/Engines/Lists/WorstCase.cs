using System.Collections.Concurrent;
using System.Globalization;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Worst harm of a cheating strategy over the numbers left to the cheat.</summary>
public sealed class WorstCase
{
    /// <summary>Paths left out while points are compared, at first: of a harm above 1e-3 that hides less than a few parts in a thousand, alike for neighbours.</summary>
    private const double NegligibleInSearch = 1e-7;

    /// <summary>A harm less than this many times what is left out is not seen well, and the search is made again with less left out.</summary>
    private const double Visible = 1e4;

    /// <summary>The best points of a search, evaluated again with the task's own limit.</summary>
    private const int Finalists = 48;

    /// <summary>Paths left out of averages; they count as harmless.</summary>
    private const double NegligibleInAverage = 1e-12;

    /// <summary>A list that affords the worst attack this often leaves nothing to look for.</summary>
    private const double Affordable = 0.9;

    private readonly ListTask _task;
    private readonly ListProgram _program;
    private readonly ChoiceRange[] _ranges;
    private ListLimits _coarse;
    private readonly CancellationToken _cancellation;
    private readonly ConcurrentDictionary<string, Attack> _attacks = [];

    private WorstCase(ListTask task, DishonestCase cheat, CancellationToken cancellation)
    {
        _task = task with { HoldsEnough = true };
        _program = ListProgram.Of(_task);
        _ranges = [.. cheat.Choices.Select(c => new ChoiceRange(c, task.Lists.Copies, task.Protocol.Levels))];
        _coarse = task.Limits with { Negligible = Math.Max(task.Limits.Negligible, NegligibleInSearch) };
        _cancellation = cancellation;
    }

    /// <summary>
    /// Searches the choices for the largest harm. Each harm is conditional on the cheat's list holding enough positions, which bounds what the
    /// numbers achieve; the average over the cheat's own lists goes with it.
    /// </summary>
    /// <param name="task">The task; its choices are ignored.</param>
    /// <param name="options">How much to search.</param>
    /// <param name="progress">Told about every evaluation; null for nobody.</param>
    /// <param name="cancellation">Stops the search.</param>
    public static AttackOutcome Find(ListTask task, SearchOptions options, IProgress<SearchProgress>? progress, CancellationToken cancellation) =>
        Guarded(task, w => w.Find(options, progress), cancellation);

    /// <summary>Evaluates numbers that are given: conditional on holding enough positions, and on average over the cheat's own lists.</summary>
    /// <param name="task">The task with its choices.</param>
    /// <param name="cancellation">Stops the evaluation.</param>
    public static AttackOutcome At(ListTask task, CancellationToken cancellation) =>
        Guarded(task, w => new AttackOutcome(task.Choices, w._program.Evaluate(task.Choices, task.Limits, cancellation), null, null) { Average = w.Plain(task.Choices) }, cancellation);

    /// <summary>Climbs from points that were worst in much the same task, and from these with one number at its least; a quick look that a search of its own must follow.</summary>
    /// <param name="task">The task; its choices are ignored.</param>
    /// <param name="starts">Points as a search counts them.</param>
    /// <param name="options">How far to climb.</param>
    /// <param name="negligible">Paths left out.</param>
    /// <param name="cancellation">Stops the search.</param>
    internal static (int[] Point, double Harm) Near(ListTask task, IReadOnlyList<int[]> starts, NearbyOptions options, double negligible, CancellationToken cancellation)
    {
        WorstCase search = new(task, task.Case!, cancellation);
        search._coarse = task.Limits with { Negligible = negligible };
        int[][] from = [.. starts, .. starts.SelectMany(s => s.Select((_, i) => (int[])[.. s.Select((n, k) => k == i ? search._ranges[k].First : n)]))];
        return AttackSearch.Nearby([.. search._ranges.Select(r => (r.First, r.Last))], p => search.Of(p).Harm, from, options, cancellation);
    }

    /// <summary>The numbers that a search finds and their harm, without anything else.</summary>
    /// <param name="task">The task; its choices are ignored.</param>
    /// <param name="options">How much to search.</param>
    /// <param name="negligible">Paths left out.</param>
    /// <param name="cancellation">Stops the search.</param>
    internal static (int[] Point, double Harm) Look(ListTask task, SearchOptions options, double negligible, CancellationToken cancellation)
    {
        WorstCase search = new(task, task.Case!, cancellation);
        search._coarse = task.Limits with { Negligible = negligible };
        SearchResult found = AttackSearch.Maximise([.. search._ranges.Select(r => (r.First, r.Last))], p => search.Of(p).Harm, options, null, cancellation);
        return ([.. found.Choices], found.Value);
    }

    private static AttackOutcome Guarded(ListTask task, Func<WorstCase, AttackOutcome> find, CancellationToken cancellation)
    {
        DishonestCase cheat = task.Case ?? throw new ArgumentException("There is no cheat in this task.", nameof(task));
        try
        {
            return find(new WorstCase(task, cheat, cancellation));
        }
        catch (ListRefusalException refusal)
        {
            return new AttackOutcome(null, null, null, refusal.Message);
        }
        catch (AggregateException several) when (several.InnerExceptions.OfType<ListRefusalException>().FirstOrDefault() is { } refusal)
        {
            return new AttackOutcome(null, null, null, refusal.Message);
        }
    }

    private AttackOutcome Find(SearchOptions options, IProgress<SearchProgress>? progress)
    {
        (int, int)[] bounds = [.. _ranges.Select(r => (r.First, r.Last))];
        SearchResult found = Searched(bounds, options, progress);
        if (found.Choices.Count < _ranges.Length)
            throw new ListRefusalException("There is nothing to choose: a range is empty.");
        (Attack worst, ListEvaluation evaluation) = Worst();
        SearchResult fine = found with { Choices = worst.Point, Value = evaluation.Harm.Value };
        return new AttackOutcome(Values(worst.Point), evaluation, fine, null) { Average = Average(worst, bounds, options) };
    }

    private SearchResult Searched((int, int)[] bounds, SearchOptions options, IProgress<SearchProgress>? progress)
    {
        SearchResult found = AttackSearch.Maximise(bounds, p => Of(p).Harm, options, progress, _cancellation);
        while (found.Choices.Count == _ranges.Length && found.Value < _coarse.Negligible * Visible && _coarse.Negligible > _task.Limits.Negligible)
        {
            _coarse = _coarse with { Negligible = Math.Max(_task.Limits.Negligible, _coarse.Negligible / Visible) };
            _attacks.Clear();
            found = AttackSearch.Maximise(bounds, p => Of(p).Harm, options, progress, _cancellation);
        }

        return found;
    }

    /// <summary>The best points again without what their comparison left out; among equals the one with the smallest numbers.</summary>
    private (Attack Attack, ListEvaluation Evaluation) Worst() => _attacks.Values
        .OrderByDescending(a => a.Harm).ThenBy(a => Key(a.Point), StringComparer.Ordinal).Take(Finalists).AsParallel().AsOrdered().WithCancellation(_cancellation)
        .Select(a => (Attack: a, Evaluation: _program.Evaluate(Values(a.Point), _task.Limits, _cancellation))).AsEnumerable()
        .MaxBy(pair => pair.Evaluation.Harm.Value);

    private AverageHarm Average(Attack worst, (int, int)[] bounds, SearchOptions options)
    {
        AverageHarm plain = Plain(Values(worst.Point));
        if (worst.Needs is not { } needs || OwnList.Of(_program.Context, _task.Lists.Copies, needs.Keys) is not { } own)
            return plain;
        if (own.Affords(worst) < Affordable)
            AttackSearch.Maximise(bounds, p => Of(p) is { } attack ? attack.Harm * own.Affords(attack) : 0, options.Milder(), null, _cancellation);
        double harm = own.Average(_attacks.Values);
        return harm <= plain.Harm.Value ? plain : new AverageHarm(Estimate.AtLeast(harm), string.Create(
            CultureInfo.InvariantCulture, $"it takes, for each list, the best of {_attacks.Count} choices that the list has enough positions for"));
    }

    /// <summary>The numbers as they are, with all positions where there are fewer than they ask for.</summary>
    private AverageHarm Plain(IReadOnlyList<Value> choices)
    {
        ListTask plain = _task with { HoldsEnough = false };
        double harm = ListProgram.Of(plain).Evaluate(choices, plain.Limits with { Negligible = NegligibleInAverage }, _cancellation).Harm.Value;
        return new AverageHarm(Estimate.AtLeast(harm), "it keeps to these numbers, and takes all it holds where that is fewer");
    }

    /// <summary>Numbers outside a range that depends on the others are no attack.</summary>
    private Attack Of(IReadOnlyList<int> point)
    {
        string key = Key(point);
        if (_attacks.TryGetValue(key, out Attack? known))
            return known;
        Value[] choices = Values(point);
        bool allowed = _ranges.Select((r, i) => r.Allows(choices[i], choices)).All(a => a);
        Attack found = allowed ? _program.Attack([.. point], choices, _coarse, _cancellation) : new Attack([.. point], 0, null);
        return allowed ? _attacks.GetOrAdd(key, found) : found;
    }

    private static string Key(IReadOnlyList<int> point) => string.Join(',', point.Select(p => p.ToString("D6", CultureInfo.InvariantCulture)));

    private Value[] Values(IReadOnlyList<int> point) => [.. _ranges.Zip(point, (r, i) => r.At(i))];
}
