using System.Globalization;
using System.Text;

namespace ResourceCheck.Reports;

/// <summary>Text from inputs made safe to print: whatever could steer a terminal or reorder a line is spelled out.</summary>
public static class Visible
{
    /// <summary>The text with control and direction characters written as <c>\u{1b}</c>; tabs become a blank.</summary>
    public static string InLine(string text) => Escape(text, keepLines: false);

    /// <summary>Like <see cref="InLine"/>, but line ends stay.</summary>
    public static string InLines(string text) => Escape(text, keepLines: true);

    private static string Escape(string text, bool keepLines)
    {
        if (!text.Any(Steers))
            return text;
        StringBuilder safe = new();
        foreach (char c in text)
        {
            if (c == '\t')
                safe.Append(' ');
            else if (!Steers(c) || (keepLines && c == '\n'))
                safe.Append(c);
            else
                safe.Append(CultureInfo.InvariantCulture, $"\\u{{{(int)c:x}}}");
        }

        return safe.ToString();
    }

    // U+202A-202E and U+2066-2069 change the direction of what follows; U+2028 and U+2029 end lines in some viewers.
    private static bool Steers(char c) => char.IsControl(c) || c is >= '\u2028' and <= '\u202E' or >= '\u2066' and <= '\u2069';
}
