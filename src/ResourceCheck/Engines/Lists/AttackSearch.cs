using System.Globalization;
using ResourceCheck.Numerics.Randomness;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Largest value of a function of whole numbers: all points where they are few, else a grid, climbs from its best points and from
/// random ones with steps that halve, and sweeps. Thresholds on counts make the functions saw-toothed: a climb therefore also changes two
/// numbers at once, and a sweep walks one number through its range while the others follow, which crosses the teeth.
/// </summary>
public sealed class AttackSearch
{
    /// <summary>Values less than this part below the best lie on its plateau: teeth of a saw are that high.</summary>
    private const double Plateau = 0.05;

    /// <summary>Exchanges up to this size need not be even: one number may move more than the other.</summary>
    private const int Near = 6;

    private readonly IReadOnlyList<(int From, int To)> _ranges;
    private readonly SearchOptions _options;
    private readonly SearchMemory _memory;

    private AttackSearch(IReadOnlyList<(int From, int To)> ranges, SearchMemory memory, SearchOptions options)
    {
        _ranges = ranges;
        _memory = memory;
        _options = options;
    }

    /// <summary>Searches for the largest value.</summary>
    /// <param name="ranges">Least and greatest value of each number.</param>
    /// <param name="value">The function; called from several threads.</param>
    /// <param name="options">How much to search.</param>
    /// <param name="progress">Told about every evaluation; null for nobody.</param>
    /// <param name="cancellation">Stops the search.</param>
    public static SearchResult Maximise(
        IReadOnlyList<(int From, int To)> ranges, Func<IReadOnlyList<int>, double> value, SearchOptions options, IProgress<SearchProgress>? progress, CancellationToken cancellation)
    {
        if (ranges.Any(r => r.To < r.From))
            return new SearchResult([], 0, 0, true, "there is nothing to choose: a range is empty");
        double points = ranges.Aggregate(1.0, (product, r) => product * (r.To - (double)r.From + 1));
        SearchMemory memory = new(value, progress, cancellation);
        AttackSearch search = new(ranges, memory, options);
        return points <= options.ExhaustiveUpTo ? search.All() : search.Climb();
    }

    /// <summary>The best point that climbs from some points lead to; quick, and good where the starts were best for a question much like this one.</summary>
    /// <param name="ranges">Least and greatest value of each number.</param>
    /// <param name="value">The function; called from several threads.</param>
    /// <param name="starts">Where to begin; numbers outside their range are moved to its end.</param>
    /// <param name="options">Climbs, their first step, and the value that ends the search.</param>
    /// <param name="cancellation">Stops the search.</param>
    public static (int[] Point, double Value) Nearby(
        IReadOnlyList<(int From, int To)> ranges, Func<IReadOnlyList<int>, double> value, IEnumerable<int[]> starts, NearbyOptions options, CancellationToken cancellation)
    {
        SearchMemory memory = new(value, null, cancellation);
        AttackSearch search = new(ranges, memory, new SearchOptions());
        memory.EvaluateAll(starts.Select(start => (int[])[.. start.Select((n, i) => Math.Clamp(n, ranges[i].From, ranges[i].To))]));
        foreach (int[] start in memory.Top(options.Climbs).TakeWhile(_ => memory.Best().Value < options.Enough))
            search.Descend(start, options.Step, options.Enough);
        return memory.Best();
    }

    private SearchResult All()
    {
        _memory.EvaluateAll(Grid(_ranges.Select(r => r.To - r.From + 1).ToArray()));
        (int[] best, double value) = _memory.Best();
        return new SearchResult(best, value, _memory.Count, true, string.Create(CultureInfo.InvariantCulture, $"all {_memory.Count} choices were evaluated"));
    }

    private SearchResult Climb()
    {
        int points = Math.Max(2, (int)Math.Pow(_options.GridPoints, 1.0 / _ranges.Count));
        _memory.EvaluateAll(Grid([.. _ranges.Select(r => Math.Min(points, r.To - r.From + 1))]));
        int[][] starts = [.. _memory.Top(_options.Climbs), .. Enumerable.Range(0, _options.RandomClimbs).Select(Random)];
        Parallel.ForEach(starts, _memory.Parallel, start => Climb(start, points));
        int sweeps = 0;
        double before;
        do
        {
            before = _memory.Best().Value;
            Sweep(_memory.Best().Point);
            foreach (int[] corner in Corners(_memory.Best().Point))
                Exchange(corner);
            sweeps++;
        }
        while (_memory.Best().Value > before && sweeps < _options.Sweeps);
        (int[] found, double value) = _memory.Best();
        string ending = value > before ? "of which the last still found a larger value" : "of which the last found nothing larger";
        return new SearchResult(found, value, _memory.Count, false, string.Create(
            CultureInfo.InvariantCulture,
            $"a grid of {points} values for each choice, {starts.Length} climbs, then {sweeps} {(sweeps == 1 ? "round" : "rounds")} of sweeps of each choice through its range and of exchanges between two, {ending}; {_memory.Count} choices were evaluated in all"));
    }

    /// <summary>Walks each number up and down from a point while the others climb.</summary>
    private void Sweep(int[] from) => Parallel.For(0, 2 * from.Length, _memory.Parallel, way => Walk(from, way / 2, way % 2 == 0 ? 1 : -1));

    /// <summary>
    /// Moves two numbers at once, by every size alike and by small ones that differ, and climbs from the best of each kind of move: what one number gives up another may take
    /// over, far away and with worse points in between.
    /// </summary>
    private void Exchange(int[] from)
    {
        int[][][] kinds = [.. Enumerable.Range(0, from.Length).SelectMany(i => Enumerable.Range(0, i).SelectMany(k =>
            new[] { (1, 1), (1, -1), (-1, 1), (-1, -1) }.Select(s => Exchanges(from, (i, s.Item1), (k, s.Item2)).ToArray())))];
        _memory.EvaluateAll(kinds.SelectMany(k => k));
        int[][] starts = [.. kinds.Where(k => k.Length > 0).Select(k => k.MaxBy(_memory.Value)!).OrderByDescending(_memory.Value).Take(_options.Exchanges)];
        Parallel.ForEach(starts, _memory.Parallel, start =>
        {
            int[] at = start;
            while (Improved(at, -1) is { } better)
                at = better;
        });
    }

    /// <summary>A point and the corners of the plateau that it lies on: from there other hills are near that from its middle are not.</summary>
    private IEnumerable<int[]> Corners(int[] from)
    {
        double level = _memory.Value(from) * (1 - Plateau);
        IEnumerable<int[]> corners = [from];
        for (int index = 0; index < from.Length; index++)
        {
            int along = index;
            corners = [.. corners.SelectMany(at => new[] { Slid(at, along, -1, level), Slid(at, along, 1, level) })];
        }

        return corners.Prepend(from).DistinctBy(p => string.Join(',', p)).Take(_options.Corners);
    }

    private int[] Slid(int[] at, int index, int move, double level)
    {
        while (Moved(at, index, move) is { } next && _memory.Value(next) >= level)
            at = next;
        return at;
    }

    private IEnumerable<int[]> Exchanges(int[] from, (int Index, int Sign) first, (int Index, int Sign) second)
    {
        int most = Math.Max(_ranges[first.Index].To - _ranges[first.Index].From, _ranges[second.Index].To - _ranges[second.Index].From);
        int stride = Math.Max(1, most / _options.ExchangeSizes);
        IEnumerable<(int, int)> sizes = Enumerable.Range(1, most / stride).Select(k => (k * stride, k * stride))
            .Concat(Enumerable.Range(1, Near).SelectMany(a => Enumerable.Range(1, Near).Select(b => (a, b)))).Distinct();
        foreach ((int a, int b) in sizes)
        {
            if (Moved(from, first.Index, a * first.Sign) is { } moved && Moved(moved, second.Index, b * second.Sign) is { } both)
                yield return both;
        }
    }

    private void Walk(int[] from, int index, int direction)
    {
        int[] at = from;
        double least = _memory.Value(from) * _options.Hopeless;
        while (Moved(at, index, direction) is { } next)
        {
            at = next;
            while (Improved(at, index) is { } better)
                at = better;
            if (_memory.Value(at) <= least)
                return;
        }
    }

    /// <summary>The first better neighbour, changes of one number first; null when there is none.</summary>
    private int[]? Improved(int[] at, int held)
    {
        double value = _memory.Value(at);
        return Neighbours(at, 1, held).FirstOrDefault(next => _memory.Value(next) > value);
    }

    private void Climb(int[] start, int points) => Descend(start, Math.Max(1, _ranges.Max(r => r.To - r.From) / points));

    /// <summary>Climbs with steps that are halved down to 1, until nothing near is better or enough is found.</summary>
    private void Descend(int[] start, int first, double enough = double.PositiveInfinity)
    {
        int[] at = start;
        for (int step = first; step >= 1; step /= 2)
        {
            while (_memory.Value(at) < enough && Better(at, step) is { } next)
                at = next;
        }
    }

    /// <summary>The best of the points that differ by a step in one number or two; null when none is better.</summary>
    private int[]? Better(int[] at, int step)
    {
        int[][] neighbours = [.. Neighbours(at, step)];
        _memory.EvaluateAll(neighbours);
        double value = _memory.Value(at);
        int[]? best = null;
        foreach (int[] next in neighbours)
        {
            double found = _memory.Value(next);
            if (found > value)
                (best, value) = (next, found);
        }

        return best;
    }

    /// <summary>Points that differ by a step in one number, then those that differ in two; one number may be held.</summary>
    private IEnumerable<int[]> Neighbours(int[] at, int step, int held = -1)
    {
        int[] free = [.. Enumerable.Range(0, at.Length).Where(i => i != held)];
        int[] moves = [-step, step];
        IEnumerable<int[]?> one = free.SelectMany(i => moves.Select(move => Moved(at, i, move)));
        IEnumerable<int[]?> two = free.SelectMany(i => free.Where(k => k < i).SelectMany(k =>
            moves.SelectMany(move => moves.Select(other => Moved(at, i, move) is { } moved ? Moved(moved, k, other) : null))));
        return one.Concat(two).OfType<int[]>();
    }

    private int[]? Moved(int[] at, int index, int move)
    {
        int to = Math.Clamp(at[index] + move, _ranges[index].From, _ranges[index].To);
        if (to == at[index])
            return null;
        int[] moved = [.. at];
        moved[index] = to;
        return moved;
    }

    private int[] Random(int index)
    {
        Xoshiro256 stream = Xoshiro256.Stream(_options.Seed, (ulong)index);
        return [.. _ranges.Select(r => r.From + (int)(stream.NextUnit() * (r.To - r.From + 1)))];
    }

    /// <summary>Points evenly spread over the ranges, ends included.</summary>
    private IEnumerable<int[]> Grid(int[] counts)
    {
        int[] index = new int[counts.Length];
        while (true)
        {
            yield return [.. index.Select((i, d) => Spread(_ranges[d], i, counts[d]))];
            int digit = 0;
            while (digit < index.Length && ++index[digit] == counts[digit])
                index[digit++] = 0;
            if (digit == index.Length)
                yield break;
        }
    }

    private static int Spread((int From, int To) range, int index, int count) =>
        count == 1 ? range.From : range.From + (int)Math.Round((double)index * (range.To - range.From) / (count - 1));
}
