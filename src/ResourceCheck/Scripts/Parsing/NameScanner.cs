using System.Buffers;
using System.Text;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Names: a letter of any script, then letters, digits and underscores.</summary>
internal static class NameScanner
{
    /// <summary>Whether a letter stands there.</summary>
    public static bool StartsAt(string text, int position) =>
        Rune.DecodeFromUtf16(text.AsSpan(position), out Rune rune, out _) == OperationStatus.Done && Rune.IsLetter(rune);

    /// <summary>Offset behind the last character of the name.</summary>
    public static int EndOf(string text, int start, int limit)
    {
        int i = start;
        while (i < limit && Rune.DecodeFromUtf16(text.AsSpan(i, limit - i), out Rune rune, out int length) == OperationStatus.Done
            && (Rune.IsLetterOrDigit(rune) || rune.Value == '_'))
        {
            i += length;
        }

        return i;
    }
}
