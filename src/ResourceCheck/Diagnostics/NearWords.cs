namespace ResourceCheck.Diagnostics;

/// <summary>Which known word was probably meant. Distance: insertions, deletions, replacements and swaps of neighbours
/// (optimal string alignment; Damerau, Commun. ACM 7, 171 (1964)), letter case ignored.</summary>
public static class NearWords
{
    // Few words that people type are longer; the limit keeps the table small for garbage.
    private const int LongestWord = 64;

    /// <summary>The nearest candidate if it is near enough to be a slip: one change up to four letters, two up to seven, else three.</summary>
    /// <param name="word">The word as written.</param>
    /// <param name="candidates">The words that fit; of several as near the first is taken. The word itself is no suggestion.</param>
    /// <returns>The candidate, or null when none is near.</returns>
    public static string? Find(string word, IEnumerable<string> candidates)
    {
        ArgumentNullException.ThrowIfNull(word);
        if (word.Length > LongestWord)
            return null;
        (string? Word, int Distance) best = candidates.Where(c => c != word).Select(c => ((string?)c, Distance(word, c))).DefaultIfEmpty((null, int.MaxValue)).MinBy(c => c.Item2);
        return best.Word is not null && best.Distance <= Allowed(Math.Min(word.Length, best.Word.Length)) ? best.Word : null;
    }

    private static int Allowed(int length) => length switch
    {
        1 => 0,
        <= 4 => 1,
        <= 7 => 2,
        _ => 3,
    };

    private static int Distance(string first, string second)
    {
        string a = first.ToLowerInvariant(), b = second.ToLowerInvariant();
        int[,] d = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
            d[i, 0] = i;
        for (int j = 0; j <= b.Length; j++)
            d[0, j] = j;
        for (int i = 1; i <= a.Length; i++)
        {
            for (int j = 1; j <= b.Length; j++)
            {
                int replace = d[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                d[i, j] = Math.Min(replace, Math.Min(d[i - 1, j], d[i, j - 1]) + 1);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    d[i, j] = Math.Min(d[i, j], d[i - 2, j - 2] + 1);
            }
        }

        return d[a.Length, b.Length];
    }
}
