using System.Collections.Concurrent;

namespace ResourceCheck.Engines.Lists;

/// <summary>Values already found in a search, by point.</summary>
internal sealed class SearchMemory(Func<IReadOnlyList<int>, double> value, IProgress<SearchProgress>? progress, CancellationToken cancellation)
{
    private readonly ConcurrentDictionary<string, (int[] Point, double Value)> _known = [];
    private readonly Lock _lock = new();
    private double _best = double.NegativeInfinity;

    public int Count => _known.Count;

    public ParallelOptions Parallel { get; } = new() { CancellationToken = cancellation };

    public void EvaluateAll(IEnumerable<int[]> points) => System.Threading.Tasks.Parallel.ForEach(points, Parallel, p => Value(p));

    public double Value(int[] point)
    {
        string key = string.Join(',', point);
        if (_known.TryGetValue(key, out (int[] Point, double Value) known))
            return known.Value;
        cancellation.ThrowIfCancellationRequested();
        double found = value(point);
        if (_known.TryAdd(key, (point, found)))
            Tell(found);
        return found;
    }

    /// <summary>Best points first; among equals the one with the smallest numbers, so that the answer does not depend on threads.</summary>
    public int[][] Top(int count) => [.. Ordered().Take(count).Select(k => k.Point)];

    public (int[] Point, double Value) Best() => Ordered().First();

    private IEnumerable<(int[] Point, double Value)> Ordered() =>
        _known.Values.OrderByDescending(k => k.Value).ThenBy(k => string.Join(',', k.Point.Select(c => c.ToString("D6", System.Globalization.CultureInfo.InvariantCulture))), StringComparer.Ordinal);

    private void Tell(double found)
    {
        lock (_lock)
        {
            _best = Math.Max(_best, found);
            progress?.Report(new SearchProgress(_known.Count, _best));
        }
    }
}
