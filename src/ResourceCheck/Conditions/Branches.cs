using ResourceCheck.Conditions.Json;

namespace ResourceCheck.Conditions;

/// <summary>The branches that a decay entry spells out.</summary>
internal static class Branches
{
    /// <summary>Target, share of the entry's rate and place of each branch.</summary>
    public static IEnumerable<(int To, double Share, Spot Spot)> Of(GroupSetting entry)
    {
        if (entry.Find("to") is LevelSetting to)
            yield return (to.Level, 1, to.Spot);
        foreach (Entry branch in (entry.Find("branching") as GroupSetting)?.Entries ?? [])
            yield return (int.Parse(branch.Name, System.Globalization.CultureInfo.InvariantCulture), ((NumberSetting)branch.Value).Value, branch.NameSpot);
    }

    /// <summary>The rate of an entry, 1/s, however it was written.</summary>
    public static double RateOf(GroupSetting entry)
    {
        if (entry.NumberOf("lifetime") is { } lifetime)
            return 1 / lifetime.Value;
        return entry.NumberOf("linewidth") is { } linewidth ? 2 * Math.PI * linewidth.Value : entry.Number("rate", 0);
    }
}
