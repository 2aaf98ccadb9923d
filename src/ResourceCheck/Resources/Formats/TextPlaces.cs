using System.Text;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources.Formats;

/// <summary>Places within text files whose lines may hold millions of numbers: only the surroundings of the marked words are quoted.</summary>
internal static class TextPlaces
{
    private const int Around = 40;

    /// <summary>The place of some words of a line.</summary>
    /// <param name="file">File name.</param>
    /// <param name="line">Line number, from 1.</param>
    /// <param name="text">The whole line.</param>
    /// <param name="start">Zero-based start of the words.</param>
    /// <param name="length">Their length.</param>
    public static Place InLine(string file, int line, string text, int start, int length)
    {
        int from = Math.Max(0, start - Around);
        int shown = Math.Min(length, 2 * Around);
        int to = Math.Min(text.Length, start + shown + Around);
        return new(file, line, start + 1, text[from..to], start - from, shown);
    }

    /// <summary>The place of some bytes of a UTF-8 text.</summary>
    public static Place InBytes(string file, ReadOnlySpan<byte> text, int start, int length)
    {
        start = Math.Min(start, text.Length);
        ReadOnlySpan<byte> before = text[..start];
        int lineStart = before.LastIndexOf((byte)'\n') + 1;
        int lineLength = text[lineStart..].IndexOf((byte)'\n') is var end and >= 0 ? end : text.Length - lineStart;
        // A byte takes at most one column, so that this window holds all that is quoted.
        int from = Math.Max(lineStart, start - 4 * Around);
        int to = Math.Min(lineStart + lineLength, Math.Min(start + length, start + 8 * Around) + 4 * Around);
        int column = Encoding.UTF8.GetCharCount(text[lineStart..start]);
        int offset = Encoding.UTF8.GetCharCount(text[from..start]);
        string window = Encoding.UTF8.GetString(text[from..Math.Max(from, to)]);
        int marked = Math.Min(length, Math.Max(0, window.Length - offset));
        Place place = InLine(file, before.Count((byte)'\n') + 1, window, Math.Min(offset, window.Length), marked);
        return place with { Column = column + 1 };
    }
}
