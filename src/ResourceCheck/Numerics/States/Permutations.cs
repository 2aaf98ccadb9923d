namespace ResourceCheck.Numerics.States;

/// <summary>All permutations of a few levels with their signs, and the basis state each stands for.</summary>
internal static class Permutations
{
    /// <summary>
    /// The permutations of 0 … n-1 in lexicographic order with the parity of their inversions; n = 8 gives 40320. Each array is fresh.
    /// </summary>
    public static IEnumerable<(int[] Levels, int Sign)> Of(int n)
    {
        int[] levels = [.. Enumerable.Range(0, n)];
        do
            yield return ([.. levels], Sign(levels));
        while (Advance(levels));
    }

    /// <summary>Index of a basis state; the first qudit is the most significant digit to base <paramref name="d"/>.</summary>
    public static int IndexOf(ReadOnlySpan<int> levels, int d)
    {
        int index = 0;
        foreach (int level in levels)
            index = index * d + level;
        return index;
    }

    /// <summary>Parity of the inversions: 1 or -1.</summary>
    public static int Sign(int[] levels)
    {
        int inversions = 0;
        for (int i = 0; i < levels.Length; i++)
        {
            for (int k = i + 1; k < levels.Length; k++)
                inversions += levels[i] > levels[k] ? 1 : 0;
        }

        return inversions % 2 == 0 ? 1 : -1;
    }

    private static bool Advance(int[] levels)
    {
        int pivot = levels.Length - 2;
        while (pivot >= 0 && levels[pivot] > levels[pivot + 1])
            pivot--;
        if (pivot < 0)
            return false;
        int next = Array.FindLastIndex(levels, level => level > levels[pivot]);
        (levels[pivot], levels[next]) = (levels[next], levels[pivot]);
        Array.Reverse(levels, pivot + 1, levels.Length - pivot - 1);
        return true;
    }
}
