using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts;

namespace ResourceCheck.Conditions.Json;

/// <summary>Tells, from the characters where reading stopped, what is wrong with a text that is not JSON.</summary>
internal static class JsonMistake
{
    /// <summary>The finding for a text that could not be read beyond an offset.</summary>
    public static Diagnostic Explain(SourceText source, bool isOption, int offset, bool rootRead)
    {
        string text = source.Text;
        int before = LastVisible(text, Math.Min(offset, text.Length) - 1);
        if (offset >= text.Length || before < 0 && string.IsNullOrWhiteSpace(text))
            return ConditionsMessages.EndsTooEarly(SpotAt(source, isOption, Math.Max(before, 0), 1));
        Spot spot = SpotAt(source, isOption, offset, WordLength(text, offset));
        char found = text[offset];
        char previous = before < 0 ? '\0' : text[before];
        if (found is '/' or '#' || previous == '/')
            return ConditionsMessages.Comment(SpotAt(source, isOption, previous == '/' ? before : offset, 2));
        if (rootRead)
            return ConditionsMessages.TrailingContent(spot);
        if (found is '}' or ']' && previous == ',')
            return ConditionsMessages.TrailingComma(SpotAt(source, isOption, before, 1));
        if (char.IsAsciiDigit(found) && previous == ',' && before > 0 && char.IsAsciiDigit(text[before - 1]))
            return ConditionsMessages.DecimalComma(spot);
        if (found is '"' or '{' or '[' && !(previous is ',' or ':' or '{' or '[' or '\0'))
            return ConditionsMessages.MissingComma(spot);
        return ConditionsMessages.NotJson(spot, text.Substring(offset, Math.Min(spot.Span.Length, 40)));
    }

    private static Spot SpotAt(SourceText source, bool isOption, int offset, int length) => new(source, new Span(offset, length), isOption);

    private static int LastVisible(string text, int offset)
    {
        while (offset >= 0 && char.IsWhiteSpace(text[offset]))
            offset--;
        return offset;
    }

    private static int WordLength(string text, int offset)
    {
        if (text[offset] is '"' or '\'' && text.IndexOf(text[offset], offset + 1) is > 0 and int close && text.IndexOf('\n', offset) is int line && (line < 0 || line > close))
            return close + 1 - offset;
        int end = offset;
        while (end < text.Length && end - offset < 20 && (char.IsLetterOrDigit(text[end]) || text[end] is '_' or '.' or '-' or '+'))
            end++;
        return Math.Max(1, end - offset);
    }
}
