namespace ResourceCheck.Scripts.Parsing;

/// <summary>Places of a script in words.</summary>
internal static class PlaceNames
{
    private static readonly Places[] Blocks = [Places.Round, Places.Discussion, Places.Dishonest, Places.Replacement];

    /// <summary>Where a line was found.</summary>
    public static string Inside(Places place) => place == Places.Script ? "outside of any block" : $"in {Name(place)}";

    /// <summary>Where it belongs.</summary>
    public static string Home(Places places)
    {
        string[] blocks = [.. Blocks.Where(p => places.HasFlag(p)).Select(Name)];
        if (places.HasFlag(Places.Script))
            return blocks.Length == 0 ? "outside of blocks" : $"outside of blocks or in {SyntaxMessages.Words(blocks)}";
        return $"in {SyntaxMessages.Words(blocks)}";
    }

    private static string Name(Places place) => place switch
    {
        Places.Loop => "a loop",
        Places.Round => "a round",
        Places.Discussion => "a discussion",
        Places.Dishonest => "a dishonest case",
        _ => "a replacement of a dishonest case",
    };
}
