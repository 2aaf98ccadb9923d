using System.Text;

namespace ResourceCheck.Diagnostics;

/// <summary>One finding about an input, in the project's own shape: sentence, quoted line, cure, place and stable code.</summary>
/// <param name="Code">Stable code, such as <c>S031</c>; <c>resourcecheck explain</c> tells cause and cure.</param>
/// <param name="Severity">How grave it is.</param>
/// <param name="Message">One sentence: what was found and what would fit.</param>
/// <param name="Cure">What to do, without the leading word; null when the message says it already.</param>
/// <param name="Place">Where; null when no place can be given.</param>
public sealed record Diagnostic(string Code, Severity Severity, string Message, string? Cure, Place? Place)
{
    /// <summary>No word that people read is as long; file names, which may be, stand in the place and stay whole.</summary>
    private const int LongestWord = 120;

    private const int ShownOfWord = 60;

    /// <summary>The finding as users read it, over several lines, without a trailing newline.</summary>
    public override string ToString()
    {
        StringBuilder text = new(Severity == Severity.Error ? Cut(Message) : $"{Severity}: {Cut(Message)}");
        if (Place?.LineText is { } line)
            text.Append("\n    ").Append(Cut(Quote(line, Place)));
        if (Cure is not null)
            text.Append("\n  Cure: ").Append(Cure);
        text.Append("\n  at ").Append(Location()).Append(" (").Append(Code).Append(')');
        return text.ToString();
    }

    private string Location() => Place switch
    {
        null => "the input",
        { Line: 0 } => Place.File,
        _ => $"{Place.File}:{Place.Line}:{Place.Column}",
    };

    // Hundreds of digits would bury the sentence around them; the signs behind a cut word, such as closing quotes, stay.
    private static string Cut(string text) => string.Join(' ', text.Split(' ').Select(word =>
    {
        int end = word.Length;
        while (end > 0 && !char.IsLetterOrDigit(word[end - 1]))
            end--;
        return end <= LongestWord ? word : $"{word[..ShownOfWord]}…{word[end..]}";
    }));

    private static string Quote(string line, Place place)
    {
        int start = Math.Clamp(place.MarkStart, 0, line.Length);
        int end = Math.Clamp(start + place.MarkLength, start, line.Length);
        string marked = place.MarkLength == 0 ? line : $"{line[..start]}«{line[start..end]}»{line[end..]}";
        return marked.Trim();
    }
}
