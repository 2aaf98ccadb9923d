namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Lower levels of |S_N⟩ gathered into groups whose transitions have the same couplings. Within a group the state stays antisymmetric
/// (or symmetric) for ever, so that only the places of the group matter. One group of N-1 levels leaves N amplitudes, groups of one
/// level each leave all N!.
/// </summary>
internal sealed class LevelGroups
{
    /// <summary>Relative difference up to which couplings count as equal: a few roundings of the same formula.</summary>
    private const double Same = 1e-14;

    private LevelGroups(int[][] groups) => Groups = groups;

    /// <summary>Levels of each group, ascending; groups by their lowest level.</summary>
    public int[][] Groups { get; }

    /// <summary>Letters of words: 1 for the excited level, then the size of each group.</summary>
    public int[] Counts => [1, .. Groups.Select(group => group.Length)];

    /// <summary>A transition of each group.</summary>
    public int[] Transitions => [.. Groups.Select(group => group[0])];

    /// <summary>Every lower level for itself.</summary>
    public static LevelGroups Single(int emitters) => new([.. Enumerable.Range(1, emitters - 1).Select(level => new[] { level })]);

    /// <summary>Levels 1 … N-1 gathered by equal couplings.</summary>
    public static LevelGroups Of(Couplings couplings)
    {
        List<List<int>> groups = [];
        for (int level = 1; level < couplings.Emitters; level++)
        {
            List<int>? alike = groups.Find(group => Alike(couplings, group[0], level));
            if (alike is null)
                groups.Add([level]);
            else
                alike.Add(level);
        }

        return new LevelGroups([.. groups.Select(group => group.ToArray())]);
    }

    /// <summary>Letter of a level: 0 for the excited one, else one more than its group.</summary>
    public int Letter(int level) => level == 0 ? 0 : 1 + Array.FindIndex(Groups, group => group.Contains(level));

    private static bool Alike(Couplings couplings, int a, int b) =>
        Alike(couplings.Decay[a - 1], couplings.Decay[b - 1]) && Alike(couplings.Shift[a - 1], couplings.Shift[b - 1]);

    private static bool Alike(double[,] a, double[,] b)
    {
        double largest = a.Cast<double>().Max(Math.Abs), difference = 0;
        for (int i = 0; i < a.GetLength(0); i++)
        {
            for (int k = 0; k < a.GetLength(1); k++)
                difference = Math.Max(difference, Math.Abs(a[i, k] - b[i, k]));
        }

        return difference <= Same * largest;
    }
}
