namespace ResourceCheck.Diagnostics;

/// <summary>Lists and near words for messages.</summary>
public static class Words
{
    /// <summary><c>a, b or c</c>, without repeats.</summary>
    public static string Or(IEnumerable<string> words) => Join([.. words.Distinct()], "or");

    /// <summary><c>a, b and c</c>, without repeats.</summary>
    public static string And(IEnumerable<string> words) => Join([.. words.Distinct()], "and");

    /// <summary><c>did you mean x?</c> for the nearest known word; null when none is near.</summary>
    public static string? DidYouMean(string word, IEnumerable<string> known) => NearWords.Find(word, known) is { } near ? $"did you mean {near}?" : null;

    /// <summary>A verb that follows a list: the first form for one, the second for several.</summary>
    public static string Verb(int count, string one, string several) => count == 1 ? one : several;

    private static string Join(string[] words, string last) =>
        words.Length <= 1 ? string.Concat(words) : $"{string.Join(", ", words[..^1])} {last} {words[^1]}";
}
