using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>A checked value of a conditions file.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path, as <c>--set</c> takes it.</param>
internal abstract record Setting(Spot Spot, string Path);

/// <summary>A number, in SI units.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path.</param>
/// <param name="Value">Value.</param>
/// <param name="Uncertainty">Standard uncertainty; null when none was given.</param>
/// <param name="Dimension">What it measures.</param>
/// <param name="UnitText">Unit as written; empty for a plain number.</param>
internal sealed record NumberSetting(Spot Spot, string Path, double Value, double? Uncertainty, Dimension Dimension, string UnitText) : Setting(Spot, Path);

/// <summary>A level.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path.</param>
/// <param name="Level">Its number.</param>
internal sealed record LevelSetting(Spot Spot, string Path, int Level) : Setting(Spot, Path);

/// <summary>A text or file name.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path.</param>
/// <param name="Text">Its content.</param>
internal sealed record TextSetting(Spot Spot, string Path, string Text) : Setting(Spot, Path);

/// <summary><c>true</c> or <c>false</c>.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path.</param>
/// <param name="Truth">Which.</param>
internal sealed record FlagSetting(Spot Spot, string Path, bool Truth) : Setting(Spot, Path);

/// <summary>A list.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path.</param>
/// <param name="Items">Its items.</param>
internal sealed record ListSetting(Spot Spot, string Path, IReadOnlyList<Setting> Items) : Setting(Spot, Path);

/// <summary>An object: a group of keys, a map, or a section per party.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Path">Its path.</param>
/// <param name="Shape">The shape it was read by.</param>
/// <param name="Entries">Its entries in the order written.</param>
/// <param name="IsWhole">Whether nothing of it was refused; else nothing is concluded from what is absent.</param>
internal sealed record GroupSetting(Spot Spot, string Path, Shape Shape, IReadOnlyList<Entry> Entries, bool IsWhole = true) : Setting(Spot, Path)
{
    /// <summary>The entry with a name; null when there is none.</summary>
    public Entry? EntryOf(string name) => Entries.FirstOrDefault(e => e.Name == name);

    /// <summary>The value of a key; null when it is absent.</summary>
    public Setting? Find(string name) => EntryOf(name)?.Value;

    /// <summary>The number of a key; null when it is absent.</summary>
    public NumberSetting? NumberOf(string name) => Find(name) as NumberSetting;

    /// <summary>The number of a key, or a fallback.</summary>
    public double Number(string name, double fallback) => NumberOf(name)?.Value ?? fallback;

    /// <summary>Whether a key is there and true.</summary>
    public bool Flag(string name) => Find(name) is FlagSetting { Truth: true };

    /// <summary>The value of a key that holds one group or a list of them, as a list.</summary>
    public IEnumerable<GroupSetting> Groups(string name) => Find(name) switch
    {
        GroupSetting group => [group],
        ListSetting list => list.Items.OfType<GroupSetting>(),
        _ => [],
    };
}

/// <summary>An entry of an object.</summary>
/// <param name="Name">Its name.</param>
/// <param name="NameSpot">Where the name stands.</param>
/// <param name="Value">Its value.</param>
internal sealed record Entry(string Name, Spot NameSpot, Setting Value);
