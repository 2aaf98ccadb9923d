using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Tests.Lists;

/// <summary>Laws of one copy of three antisymmetric qutrits measured in the level basis.</summary>
internal static class Copies
{
    /// <summary>Each qutrit depolarised with its own probability: its level is replaced by a uniform one.</summary>
    public static IReadOnlyList<CopyType> Depolarised(params double[] p) =>
        Law((levels, sent) => Enumerable.Range(0, 3).Aggregate(1.0, (product, i) => product * ((sent[i] == levels[i] ? 1 - p[i] : 0) + (p[i] / 3))));

    /// <summary>Level <paramref name="value"/> decays into the two others with probability q.</summary>
    public static IReadOnlyList<CopyType> Decayed(double q, int value) =>
        Law((levels, sent) => Enumerable.Range(0, 3).Aggregate(1.0, (product, i) => product * Decay(sent[i], levels[i], q, value)));

    private static double Decay(int from, int to, double q, int value) =>
        from != value ? (from == to ? 1 : 0) : to == value ? 1 - q : q / 2;

    private static IReadOnlyList<CopyType> Law(Func<int[], int[], double> transition)
    {
        int[][] all = [.. from s in Enumerable.Range(0, 3) from a in Enumerable.Range(0, 3) from b in Enumerable.Range(0, 3) select new[] { s, a, b }];
        int[][] permutations = [.. all.Where(t => t.Distinct().Count() == 3)];
        return [.. all.Select(t => new CopyType([.. t.Select(Value.Of)], permutations.Sum(sent => transition(t, sent)) / 6)).Where(c => c.Probability > 0)];
    }
}
