namespace ResourceCheck.Cli.Usage;

/// <summary>Finds the word that a mistyped one was meant to be.</summary>
internal static class Nearest
{
    /// <summary>The closest candidate, or null when none is close. A third of the letters may differ, but always one and never more than three.</summary>
    public static string? To(string word, IEnumerable<string> candidates)
    {
        int most = Math.Clamp(word.Length / 3, 1, 3);
        return candidates.Select(c => (Word: c, Distance: Distance(word, c)))
            .Where(c => c.Distance <= most)
            .OrderBy(c => c.Distance)
            .ThenBy(c => c.Word, StringComparer.Ordinal)
            .Select(c => c.Word)
            .FirstOrDefault();
    }

    // Edit distance with neighbours swapped, over two kept rows: Lowrance and Wagner, J. ACM 22, 177 (1975), restricted to adjacent letters.
    private static int Distance(string a, string b)
    {
        int[] before = new int[b.Length + 1], last = [.. Enumerable.Range(0, b.Length + 1)];
        for (int i = 1; i <= a.Length; i++)
        {
            int[] row = new int[b.Length + 1];
            row[0] = i;
            for (int j = 1; j <= b.Length; j++)
            {
                row[j] = Math.Min(Math.Min(row[j - 1], last[j]) + 1, last[j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1));
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    row[j] = Math.Min(row[j], before[j - 2] + 1);
            }

            (before, last) = (last, row);
        }

        return last[b.Length];
    }
}
