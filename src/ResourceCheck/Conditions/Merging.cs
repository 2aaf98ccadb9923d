using ResourceCheck.Conditions.Keys;

namespace ResourceCheck.Conditions;

/// <summary>What a party has of a section: what it does not say itself it takes from ranges it belongs to, then from <c>default</c>.</summary>
internal static class Merging
{
    /// <summary>The section as one party has it; null when nothing there is meant for it.</summary>
    /// <param name="section">A plain section or one per party.</param>
    /// <param name="party">The party; null for what holds by default.</param>
    public static GroupSetting? ViewOf(GroupSetting section, PartyName? party)
    {
        if (section.Shape is not PartyShape)
            return section;
        IEnumerable<Entry> own = party is null ? [] : section.Entries.Where(e => PartyName.Parse(e.Name)?.Covers(party) == true);
        IEnumerable<Entry> ordered = section.Entries.Where(e => e.Name == KeyTable.Default).Concat(own.OrderBy(e => !PartyName.Parse(e.Name)!.IsRange));
        GroupSetting? merged = null;
        foreach (GroupSetting group in ordered.Select(e => (GroupSetting)e.Value))
            merged = merged is null ? group : Merge(merged, group);
        return merged;
    }

    /// <summary>Every view that a file spells out, before any protocol is known: the default, and each entry on top of it.</summary>
    public static IEnumerable<GroupSetting> ViewsOf(GroupSetting section)
    {
        if (section.Shape is not PartyShape)
            return [section];
        GroupSetting? common = section.Find(KeyTable.Default) as GroupSetting;
        return section.Entries.Select(e => (GroupSetting)e.Value).Select(g => common is null || ReferenceEquals(g, common) ? g : Merge(common, g));
    }

    private static GroupSetting Merge(GroupSetting lower, GroupSetting upper)
    {
        GroupShape shape = (GroupShape)upper.Shape;
        IEnumerable<Entry> inherited = lower.Entries.Where(e => upper.EntryOf(e.Name) is null && !IsReplaced(e.Name, shape, upper));
        IEnumerable<Entry> own = upper.Entries.Select(e => e.Value is GroupSetting { Shape: GroupShape } above && lower.Find(e.Name) is GroupSetting { Shape: GroupShape } below
            ? e with { Value = Merge(below, above) }
            : e);
        return upper with { Entries = [.. inherited, .. own], IsWhole = lower.IsWhole && upper.IsWhole };
    }

    /// <summary>A party that gives a speed does not inherit a time of flight.</summary>
    private static bool IsReplaced(string name, GroupShape shape, GroupSetting upper) =>
        shape.Alternatives.Any(a => a.Names.Contains(name) && a.Names.Any(other => upper.EntryOf(other) is not null));
}
