namespace ResourceCheck.Reports;

/// <summary>Which rows of a curve people are shown; files for programs hold them all.</summary>
internal static class CurveRows
{
    private const int Most = 21;

    /// <summary>Evenly spaced ones and the last.</summary>
    public static IEnumerable<T> Shown<T>(IReadOnlyList<T> points)
    {
        int step = Math.Max(1, (points.Count - 1 + Most - 2) / (Most - 1));
        return points.Where((_, i) => i % step == 0 || i == points.Count - 1);
    }
}
