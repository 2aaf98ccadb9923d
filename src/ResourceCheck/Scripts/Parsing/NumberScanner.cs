namespace ResourceCheck.Scripts.Parsing;

/// <summary>Finds the end of what was meant as a number; <c>2..12</c> ends before its dots.</summary>
internal static class NumberScanner
{
    /// <summary>Offset behind the last character that belongs to the number, well formed or not.</summary>
    public static int EndOf(string text, int start, int limit)
    {
        int i = start;
        while (i < limit && (IsBody(text[i]) || IsPoint(text, i, limit) || IsExponent(text, i, limit)))
            i += IsExponent(text, i, limit) ? 2 : 1;
        return i;
    }

    /// <summary>Digits, at most one point with digits on both sides, an optional exponent.</summary>
    public static bool IsWellFormed(string text)
    {
        int e = text.IndexOfAny(['e', 'E']);
        string[] mantissa = (e < 0 ? text : text[..e]).Split('.');
        return mantissa.Length <= 2 && mantissa.All(IsDigits) && (e < 0 || IsDigits(text[(e + 1)..].TrimStart('+', '-')));
    }

    private static bool IsDigits(string text) => text.Length > 0 && text.All(char.IsAsciiDigit);

    private static bool IsBody(char c) => char.IsAsciiDigit(c) || c == '_';

    private static bool IsPoint(string text, int i, int limit) =>
        text[i] == '.' && (i + 1 >= limit || text[i + 1] != '.') && (i == 0 || text[i - 1] != '.');

    private static bool IsExponent(string text, int i, int limit) =>
        text[i] is 'e' or 'E' && i + 1 < limit
        && (char.IsAsciiDigit(text[i + 1]) || (text[i + 1] is '+' or '-' && i + 2 < limit && char.IsAsciiDigit(text[i + 2])));
}
