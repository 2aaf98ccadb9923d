namespace ResourceCheck.Diagnostics;

/// <summary>Lists and near words for messages.</summary>
internal static class Words
{
    /// <summary><c>a, b or c</c>, without repeats.</summary>
    public static string Or(IEnumerable<string> words) => Join([.. words.Distinct()], "or");

    /// <summary><c>a, b and c</c>, without repeats.</summary>
    public static string And(IEnumerable<string> words) => Join([.. words.Distinct()], "and");

    /// <summary><c>did you mean x?</c> for the nearest known word; null when none is near.</summary>
    public static string? DidYouMean(string word, IEnumerable<string> known) => Nearest(word, known) is { } near ? $"did you mean {near}?" : null;

    /// <summary>The known word fewest slips away, at most a third of the length; null when none is.</summary>
    public static string? Nearest(string word, IEnumerable<string> known)
    {
        (string? best, int slips) = known.Select(k => ((string?)k, Slips(word.ToLowerInvariant(), k.ToLowerInvariant())))
            .DefaultIfEmpty((null, int.MaxValue)).MinBy(pair => pair.Item2);
        return slips <= Math.Max(1, word.Length / 3) ? best : null;
    }

    private static string Join(string[] words, string last) =>
        words.Length <= 1 ? string.Concat(words) : $"{string.Join(", ", words[..^1])} {last} {words[^1]}";

    /// <summary>Edit distance in which a swap of neighbours is one slip (optimal string alignment).</summary>
    private static int Slips(string a, string b)
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
                int change = d[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                d[i, j] = Math.Min(change, Math.Min(d[i - 1, j], d[i, j - 1]) + 1);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    d[i, j] = Math.Min(d[i, j], d[i - 2, j - 2] + 1);
            }
        }

        return d[a.Length, b.Length];
    }
}
