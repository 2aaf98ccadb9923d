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
    /// <summary>The finding as users read it, over several lines, without a trailing newline.</summary>
    public override string ToString()
    {
        StringBuilder text = new(Severity == Severity.Error ? Message : $"{Severity}: {Message}");
        if (Place?.LineText is { } line)
            text.Append("\n    ").Append(Quote(line, Place));
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

    private static string Quote(string line, Place place)
    {
        int start = Math.Clamp(place.MarkStart, 0, line.Length);
        int end = Math.Clamp(start + place.MarkLength, start, line.Length);
        string marked = place.MarkLength == 0 ? line : $"{line[..start]}«{line[start..end]}»{line[end..]}";
        return marked.Trim();
    }
}
