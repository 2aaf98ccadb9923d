using ResourceCheck.Diagnostics;

namespace ResourceCheck.Scripts;

/// <summary>A script's text with its displayed name; turns spans into places.</summary>
/// <param name="Name">File name as the user gave it.</param>
/// <param name="Text">The whole text.</param>
public sealed record SourceText(string Name, string Text)
{
    // A longer line is quoted around its marked words only; a terminal shows this much without wrapping twice.
    private const int LongestQuote = 160;

    private const char ByteOrderMark = '\uFEFF';

    private readonly int[] _lineStarts = FindLineStarts(Text);

    /// <summary>Line, from 1, that holds an offset.</summary>
    public int LineOf(int offset)
    {
        int index = Array.BinarySearch(_lineStarts, Math.Max(offset, _lineStarts[0]));
        return index >= 0 ? index + 1 : ~index;
    }

    /// <summary>Whether a line, from 1, holds nothing but blanks.</summary>
    internal bool IsBlank(int line) => LineContent(line).IsWhiteSpace();

    /// <summary>The place of a span, with its line quoted; a span over several lines is marked to the end of its first. A very long line
    /// is quoted in part, a blank one not at all.</summary>
    public Place PlaceOf(Span span)
    {
        int line = LineOf(Math.Clamp(span.Start, 0, Text.Length));
        int start = _lineStarts[line - 1];
        ReadOnlySpan<char> content = LineContent(line);
        int column = Math.Clamp(span.Start - start, 0, content.Length);
        int length = Math.Clamp(span.Length, 0, content.Length - column);
        if (content.IsWhiteSpace())
            return new Place(Name, line, column + 1, null, 0, 0);
        (string quoted, int mark) = Excerpt(content, column);
        return new Place(Name, line, column + 1, quoted, mark, Math.Min(length, quoted.Length - mark));
    }

    private static (string Quoted, int Mark) Excerpt(ReadOnlySpan<char> content, int column)
    {
        if (content.Length <= LongestQuote)
            return (Readable(content), column);
        int first = Math.Clamp(column - (LongestQuote / 2), 0, content.Length - LongestQuote);
        string before = first > 0 ? "…" : "";
        string after = first + LongestQuote < content.Length ? "…" : "";
        return (before + Readable(content.Slice(first, LongestQuote)) + after, column - first + before.Length);
    }

    /// <summary>Control characters, which would garble a terminal, become their one-character pictures.</summary>
    private static string Readable(ReadOnlySpan<char> content)
    {
        char[] shown = content.ToArray();
        for (int i = 0; i < shown.Length; i++)
        {
            if (char.IsControl(shown[i]))
                shown[i] = shown[i] == '\t' ? ' ' : shown[i] < ' ' ? (char)('\u2400' + shown[i]) : '\uFFFD';
        }

        return new string(shown);
    }

    private ReadOnlySpan<char> LineContent(int line)
    {
        int start = _lineStarts[line - 1];
        int end = line < _lineStarts.Length ? _lineStarts[line] : Text.Length;
        return Text.AsSpan(start, end - start).TrimEnd("\r\n");
    }

    private static int[] FindLineStarts(string text)
    {
        List<int> starts = [text.StartsWith(ByteOrderMark) ? 1 : 0];
        for (int i = 0; i < text.Length; i++)
        {
            if (text[i] == '\n')
                starts.Add(i + 1);
        }

        return [.. starts];
    }
}
