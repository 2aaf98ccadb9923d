using ResourceCheck.Diagnostics;

namespace ResourceCheck.Scripts;

/// <summary>A script's text with its displayed name; turns spans into places.</summary>
/// <param name="Name">File name as the user gave it.</param>
/// <param name="Text">The whole text.</param>
public sealed record SourceText(string Name, string Text)
{
    private readonly int[] _lineStarts = FindLineStarts(Text);

    /// <summary>Line, from 1, that holds an offset.</summary>
    public int LineOf(int offset)
    {
        int index = Array.BinarySearch(_lineStarts, offset);
        return index >= 0 ? index + 1 : ~index;
    }

    /// <summary>The place of a span, with its line quoted; a span over several lines is marked to the end of its first.</summary>
    public Place PlaceOf(Span span)
    {
        int line = LineOf(Math.Clamp(span.Start, 0, Text.Length));
        int start = _lineStarts[line - 1];
        string content = LineContent(line);
        int column = Math.Min(span.Start - start, content.Length);
        int length = Math.Min(span.Length, content.Length - column);
        return new Place(Name, line, column + 1, content, column, length);
    }

    private string LineContent(int line)
    {
        int start = _lineStarts[line - 1];
        int end = line < _lineStarts.Length ? _lineStarts[line] : Text.Length;
        return Text[start..end].TrimEnd('\r', '\n');
    }

    private static int[] FindLineStarts(string text)
    {
        List<int> starts = [0];
        for (int i = 0; i < text.Length; i++)
        {
            if (text[i] == '\n')
                starts.Add(i + 1);
        }

        return [.. starts];
    }
}
