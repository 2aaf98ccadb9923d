using ResourceCheck.Numerics.Counting;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>What is asked of the evaluation of lists: a protocol, the law of one copy, and who cheats with which numbers.</summary>
public sealed record ListTask
{
    /// <summary>The protocol; its <see cref="Protocol.Lists"/> must be present.</summary>
    public required Protocol Protocol { get; init; }

    /// <summary>Joint law of one kept copy under the strategy at hand; probabilities may have any common factor.</summary>
    public required IReadOnlyList<CopyType> Copies { get; init; }

    /// <summary>A value for each private input, in order.</summary>
    public IReadOnlyList<Value> Inputs { get; init; } = [];

    /// <summary>The cheating strategy; null for the honest case.</summary>
    public DishonestCase? Case { get; init; }

    /// <summary>A number for each of the case's choices, in order.</summary>
    public IReadOnlyList<Value> Choices { get; init; } = [];

    /// <summary>
    /// Whether every draw <c>some(k of SET)</c> of a cheating party from its own list finds enough positions: the value is then
    /// conditional on that, which bounds what the numbers chosen can achieve.
    /// </summary>
    public bool HoldsEnough { get; init; }

    /// <summary>How much work and memory may be spent.</summary>
    public ListLimits Limits { get; init; } = new();

    internal ListProtocol Lists => Protocol.Lists ?? throw new InvalidOperationException("The protocol has no lists.");

    internal IReadOnlyList<Step> Steps => Case?.ListSteps ?? Lists.Steps;

    internal bool IsPerCopy(int slot) => slot < Lists.CopySlots && !Protocol.Inputs.Any(i => i.Slot == slot);

    internal bool Cheats(int party) => Case is not null && Case.By.Contains(party);
}

/// <summary>Limits of an evaluation by counting.</summary>
/// <param name="States">Most states of counts held at once; each takes about 100 bytes.</param>
/// <param name="Operations">Most transitions between states.</param>
/// <param name="Negligible">Paths less probable than this are left out; all of them together do not show at 1e-27, which is 1e-12 of 1e-15.</param>
public sealed record ListLimits(int States = 20_000_000, double Operations = 5e9, double Negligible = BinomialRow.Negligible);
