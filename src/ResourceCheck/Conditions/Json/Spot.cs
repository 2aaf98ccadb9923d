using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts;

namespace ResourceCheck.Conditions.Json;

/// <summary>Where a piece of JSON stands: in a file, or in an option of the command line, which has no lines.</summary>
/// <param name="Source">The text it stands in.</param>
/// <param name="Span">The characters it takes.</param>
/// <param name="IsOption">Whether the text is an option's value.</param>
internal sealed record Spot(SourceText Source, Span Span, bool IsOption)
{
    /// <summary>Machine-made files may hold everything in one line; only this much of it is quoted around the mark.</summary>
    private const int LongestQuote = 120;

    /// <summary>The place for a finding.</summary>
    public Place ToPlace()
    {
        if (IsOption)
            return Place.Of(Source.Name);
        Place place = Source.PlaceOf(Span);
        return place.LineText is { Length: > LongestQuote } line ? Shorten(place, line) : place;
    }

    /// <summary>The file and line in words, for a finding that refers to a second place.</summary>
    public string InWords() => IsOption ? $"in {Source.Name}" : $"in line {Source.LineOf(Span.Start)}";

    private static Place Shorten(Place place, string line)
    {
        int start = Math.Max(0, Math.Min(place.MarkStart - (LongestQuote / 3), line.Length - LongestQuote));
        return place with
        {
            LineText = line.Substring(start, LongestQuote),
            MarkStart = place.MarkStart - start,
            MarkLength = Math.Min(place.MarkLength, LongestQuote - (place.MarkStart - start)),
        };
    }
}
