namespace ResourceCheck.Scripts.Binding;

/// <summary>
/// The classical part of a protocol that runs on many copies. Its steps are <see cref="SetStep"/>, <see cref="SendStep"/>,
/// <see cref="AbortStep"/> and <see cref="WhenStep"/> over slots that hold one value (number, truth, set of positions) per run;
/// slots below <paramref name="CopySlots"/> are the rounds' and hold one value per copy.
/// </summary>
/// <param name="Copies">M, the number of kept copies.</param>
/// <param name="CopySlots">Slots with a lower index belong to the rounds.</param>
/// <param name="Steps">All discussions in order, in the honest case.</param>
/// <param name="Blocks">Where each discussion's steps begin and end within <paramref name="Steps"/>, by title.</param>
public sealed record ListProtocol(int Copies, int CopySlots, IReadOnlyList<Step> Steps, IReadOnlyList<BlockRange> Blocks);

/// <summary>Steps of one block.</summary>
/// <param name="Title">Title of the round or discussion.</param>
/// <param name="First">Index of its first step.</param>
/// <param name="Count">Number of its steps.</param>
public sealed record BlockRange(string Title, int First, int Count);

/// <summary>A cheating strategy, bound: the steps that run in place of the honest ones.</summary>
/// <param name="Name">Title of the <c>dishonest</c> block.</param>
/// <param name="By">Indices of the parties that cheat.</param>
/// <param name="Choices">Numbers left to the cheat.</param>
/// <param name="CopySteps">Steps of the rounds under this strategy.</param>
/// <param name="ListSteps">Steps of the discussions under this strategy; null for a protocol on single copies.</param>
/// <param name="Harm">When harm is done.</param>
public sealed record DishonestCase(
    string Name, IReadOnlyList<int> By, IReadOnlyList<Choice> Choices, IReadOnlyList<Step> CopySteps, IReadOnlyList<Step>? ListSteps, BoundExpression Harm)
{
    /// <summary>Whether the cheat's own hardware is declared perfect: its figures are then those without noise at the cheat.</summary>
    public bool PerfectHardware { get; init; }

    /// <summary>The referee's condition with what the strategy makes of its names; null when the cheat leaves one of them out, so that success cannot be told.</summary>
    public BoundExpression? Success { get; init; }

    /// <summary>Whether anything that decides about the harm looks at a private input.</summary>
    public bool Asks(IReadOnlyList<InputValues> inputs)
    {
        HashSet<int> slots = [.. inputs.Select(i => i.Slot)];
        return CopySteps.Concat(ListSteps ?? []).SelectMany(StepWalk.Expressions).Append(Harm).Concat(Choices.SelectMany(c => new[] { c.From, c.To }))
            .SelectMany(BoundWalk.Slots).Any(slots.Contains);
    }

    /// <summary>The protocol as it runs on one copy when the strategy is followed with the numbers given.</summary>
    public Protocol In(Protocol honest, IReadOnlyList<Value> choices)
    {
        ArgumentNullException.ThrowIfNull(honest);
        return honest with { Steps = [.. CopySteps.Select(s => StepWalk.Put(s, choices))], Harm = BoundWalk.Put(Harm, choices), Success = Success is { } success ? BoundWalk.Put(success, choices) : honest.Success };
    }

    /// <summary>The rounds of a list protocol under the strategy, whose numbers are chosen later.</summary>
    public Protocol Rounds(Protocol honest)
    {
        ArgumentNullException.ThrowIfNull(honest);
        return honest with { Steps = CopySteps };
    }

    /// <summary>Whether a number is chosen before the lists are known.</summary>
    public bool ChoosesInRounds => CopySteps.SelectMany(StepWalk.Expressions).SelectMany(BoundWalk.Within).Any(e => e is BoundChoice);
}

/// <summary>A number left to the cheat; its range may depend on what the cheat holds when it is used.</summary>
/// <param name="Name">Its name.</param>
/// <param name="From">Least value.</param>
/// <param name="To">Greatest value.</param>
/// <param name="Whole">Whether only whole numbers count.</param>
public sealed record Choice(string Name, BoundExpression From, BoundExpression To, bool Whole);
