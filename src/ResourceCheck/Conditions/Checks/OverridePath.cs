using System.Globalization;

namespace ResourceCheck.Conditions.Checks;

/// <summary>A part of a path: <c>decay[0]</c> is the name <c>decay</c> and the index 0; in a section per party <c>P[3]</c> is taken as written.</summary>
/// <param name="Text">As written.</param>
/// <param name="Name">What stands before the first bracket.</param>
/// <param name="Indices">Whole numbers in brackets; null when the brackets hold something else.</param>
internal sealed record PathPart(string Text, string Name, IReadOnlyList<int>? Indices);

/// <summary>Reads paths such as <c>flight.P[2..5].length</c>.</summary>
internal static class OverridePath
{
    /// <summary>The parts; null when the path is malformed.</summary>
    public static IReadOnlyList<PathPart>? Parse(string path)
    {
        List<PathPart> parts = [];
        int start = 0, depth = 0;
        for (int i = 0; i <= path.Length; i++)
        {
            char c = i < path.Length ? path[i] : '.';
            depth += c == '[' ? 1 : c == ']' ? -1 : 0;
            if (depth is < 0 or > 1 || (i == path.Length && depth != 0))
                return null;
            if (c != '.' || depth != 0)
                continue;
            if (PartOf(path[start..i]) is not { } part)
                return null;
            parts.Add(part);
            start = i + 1;
        }

        return parts;
    }

    private static PathPart? PartOf(string text)
    {
        int bracket = text.IndexOf('[', StringComparison.Ordinal);
        string name = bracket < 0 ? text : text[..bracket];
        if (name.Length == 0 || (bracket >= 0 && text[^1] != ']'))
            return null;
        return new PathPart(text, name, bracket < 0 ? [] : IndicesOf(text[bracket..]));
    }

    private static List<int>? IndicesOf(string brackets)
    {
        List<int> indices = [];
        foreach (string inside in brackets[1..^1].Split("]["))
        {
            if (!int.TryParse(inside, NumberStyles.None, CultureInfo.InvariantCulture, out int index))
                return null;
            indices.Add(index);
        }

        return indices;
    }
}
