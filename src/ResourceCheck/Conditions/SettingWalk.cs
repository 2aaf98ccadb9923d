namespace ResourceCheck.Conditions;

/// <summary>Walks a checked file.</summary>
internal static class SettingWalk
{
    /// <summary>Every number in the order written.</summary>
    public static IEnumerable<NumberSetting> NumbersOf(Setting setting) => setting switch
    {
        NumberSetting number => [number],
        ListSetting list => list.Items.SelectMany(NumbersOf),
        GroupSetting group => group.Entries.SelectMany(e => NumbersOf(e.Value)),
        _ => [],
    };
}
