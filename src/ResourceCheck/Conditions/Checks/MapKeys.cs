using System.Globalization;
using ResourceCheck.Conditions.Keys;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Reads the keys of maps.</summary>
internal static class MapKeys
{
    /// <summary>The key in its one spelling, pairs in ascending order; null when it does not fit.</summary>
    public static string? Normalise(MapKey kind, string name)
    {
        if (kind == MapKey.Level)
            return Index(name, 0)?.ToString(CultureInfo.InvariantCulture);
        if (kind == MapKey.PartyPair)
            return Parties(name) is { } names ? string.Join('-', names.OrderBy(n => n, StringComparer.Ordinal)) : null;
        return Pair(name, kind == MapKey.QuditPair ? 1 : 0) is var (a, b) ? $"{a}-{b}" : null;
    }

    /// <summary>Two different indices in ascending order, neither below <paramref name="least"/>; null when the key is not of that form.</summary>
    public static (int Low, int High)? Pair(string name, int least)
    {
        string[] parts = name.Split('-');
        if (parts.Length != 2 || Index(parts[0], least) is not { } a || Index(parts[1], least) is not { } b || a == b)
            return null;
        return (Math.Min(a, b), Math.Max(a, b));
    }

    /// <summary>Two party names; null when the key is not of that form.</summary>
    public static string[]? Parties(string name)
    {
        string[] parts = [.. name.Split('-').Select(p => p.Trim())];
        return parts.Length == 2 && parts[0] != parts[1] && parts.All(p => PartyName.Parse(p) is { IsRange: false }) ? parts : null;
    }

    private static int? Index(string text, int least) =>
        int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out int index) && index >= least ? index : null;
}
