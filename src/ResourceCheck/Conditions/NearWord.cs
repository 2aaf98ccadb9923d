namespace ResourceCheck.Conditions;

/// <summary>Finds the word that was probably meant.</summary>
internal static class NearWord
{
    /// <summary>Longer words are not compared: the cost grows with the square.</summary>
    private const int Longest = 64;

    /// <summary>The nearest of several words, at most a third of the longer one's letters away; null when none is near.</summary>
    public static string? Of(string word, IEnumerable<string> words)
    {
        if (word.Length > Longest)
            return null;
        (string Word, int Distance)? best = words
            .Select(w => ((string Word, int Distance)?)(w, Distance(word.ToUpperInvariant(), w.ToUpperInvariant())))
            .Where(c => c!.Value.Distance < Math.Min(word.Length, c.Value.Word.Length) && c.Value.Distance <= Math.Max(1, Math.Max(word.Length, c.Value.Word.Length) / 3))
            .MinBy(c => c!.Value.Distance);
        return best?.Word;
    }

    /// <summary>Insertions, deletions, replacements and swaps of neighbours (Damerau, Commun. ACM 7, 171 (1964)).</summary>
    public static int Distance(string a, string b)
    {
        int[,] d = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
            d[i, 0] = i;
        for (int j = 0; j <= b.Length; j++)
            d[0, j] = j;
        for (int i = 1; i <= a.Length; i++)
        {
            for (int j = 1; j <= b.Length; j++)
            {
                int cost = a[i - 1] == b[j - 1] ? 0 : 1;
                d[i, j] = Math.Min(Math.Min(d[i - 1, j] + 1, d[i, j - 1] + 1), d[i - 1, j - 1] + cost);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    d[i, j] = Math.Min(d[i, j], d[i - 2, j - 2] + 1);
            }
        }

        return d[a.Length, b.Length];
    }
}
