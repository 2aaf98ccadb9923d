using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>A list protocol in flat form.</summary>
/// <param name="Operations">What happens; the last two operations judge success and harm.</param>
/// <param name="Slots">Number of slots, temporaries and verdicts included.</param>
/// <param name="IsSet">Whether a slot holds a set of positions.</param>
/// <param name="SuccessSlot">Slot of the success verdict.</param>
/// <param name="HarmSlot">Slot of the harm verdict.</param>
internal sealed record ListCode(
    IReadOnlyList<ListOperation> Operations, int Slots, IReadOnlyList<bool> IsSet, int SuccessSlot, int HarmSlot)
{
    /// <summary>Slot of the cheat's first number; the others follow.</summary>
    public required int FirstChoice { get; init; }

    /// <summary>Whether the cheat's numbers say only how many positions are drawn.</summary>
    public required bool ChoicesOnlySizeDraws { get; init; }

    /// <summary>Slots read at or after each operation before they are written again.</summary>
    public required IReadOnlyList<bool[]> Live { get; init; }
}
