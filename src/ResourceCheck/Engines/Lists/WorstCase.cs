using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Worst harm of a cheating strategy over the numbers left to the cheat.</summary>
public static class WorstCase
{
    /// <summary>Paths left out while points are compared; the value shown is found with the task's own limit.</summary>
    private const double NegligibleInSearch = 1e-9;

    /// <summary>
    /// Searches the choices for the largest harm. With <see cref="ListTask.HoldsEnough"/> each harm is conditional on holding enough
    /// positions, without it each is the average over the cheat's list.
    /// </summary>
    /// <param name="task">The task; its choices are ignored.</param>
    /// <param name="options">How much to search.</param>
    /// <param name="progress">Told about every evaluation; null for nobody.</param>
    /// <param name="cancellation">Stops the search.</param>
    public static AttackOutcome Find(ListTask task, SearchOptions options, IProgress<SearchProgress>? progress, CancellationToken cancellation)
    {
        DishonestCase cheat = task.Case ?? throw new ArgumentException("There is no cheat in this task.", nameof(task));
        ChoiceRange[] ranges = [.. cheat.Choices.Select(c => new ChoiceRange(c, task.Lists.Copies, task.Protocol.Levels))];
        try
        {
            ListProgram program = ListProgram.Of(task);
            ListLimits coarse = task.Limits with { Negligible = Math.Max(task.Limits.Negligible, NegligibleInSearch) };
            SearchResult found = AttackSearch.Maximise(
                [.. ranges.Select(r => (r.First, r.Last))],
                point => Harm(program, ranges, Values(ranges, point), coarse, cancellation),
                options,
                progress,
                cancellation);
            Value[] choices = Values(ranges, found.Choices);
            return new AttackOutcome(choices, program.Evaluate(choices, task.Limits, cancellation), found, null);
        }
        catch (ListRefusalException refusal)
        {
            return new AttackOutcome(null, null, null, refusal.Message);
        }
        catch (AggregateException several) when (several.InnerExceptions.OfType<ListRefusalException>().FirstOrDefault() is { } refusal)
        {
            return new AttackOutcome(null, null, null, refusal.Message);
        }
    }

    /// <summary>Harm at some numbers; numbers outside a range that depends on the others are no attack and count as harmless.</summary>
    private static double Harm(ListProgram program, ChoiceRange[] ranges, Value[] choices, ListLimits limits, CancellationToken cancellation)
    {
        for (int i = 0; i < ranges.Length; i++)
        {
            if (!ranges[i].Allows(choices[i], choices))
                return 0;
        }

        return program.Evaluate(choices, limits, cancellation).Harm.Value;
    }

    private static Value[] Values(ChoiceRange[] ranges, IReadOnlyList<int> point) => [.. ranges.Zip(point, (r, i) => r.At(i))];
}
