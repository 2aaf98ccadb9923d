using System.Globalization;
using System.Text;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Words of a script as they stand in one turn of its loops.</summary>
internal static class TurnText
{
    /// <summary>The words with counters, whose names nothing else may bear, replaced by their values; texts in quotes stay.</summary>
    public static string Of(string text, IReadOnlyDictionary<string, int> counters)
    {
        if (counters.Count == 0)
            return text;
        StringBuilder filled = new();
        bool quoted = false;
        for (int at = 0, end; at < text.Length; at = end)
        {
            end = at + 1;
            while (IsPart(text[at]) && end < text.Length && IsPart(text[end]))
                end++;
            string word = text[at..end];
            quoted ^= word == "\"";
            filled.Append(!quoted && counters.TryGetValue(word, out int value) ? value.ToString(CultureInfo.InvariantCulture) : word);
        }

        return filled.ToString();
    }

    private static bool IsPart(char c) => char.IsLetterOrDigit(c) || c == '_';
}
