using System.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Worst harm of a cheating strategy over the numbers left to the cheat.</summary>
public static class WorstCase
{
    /// <summary>Values of a choice that need not be whole, over its range.</summary>
    private const int RealSteps = 240;

    /// <summary>Paths left out while points are compared; the value shown is found with the task's own limit.</summary>
    private const double NegligibleInSearch = 1e-20;

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
        ChoiceRange[] ranges = [.. cheat.Choices.Select(c => ChoiceRange.Of(c, task.Lists.Copies, task.Protocol.Levels))];
        try
        {
            ListProgram program = ListProgram.Of(task);
            ListLimits coarse = task.Limits with { Negligible = Math.Max(task.Limits.Negligible, NegligibleInSearch) };
            SearchResult found = AttackSearch.Maximise(
                [.. ranges.Select(r => (r.First, r.Last))],
                point => program.Evaluate(Values(ranges, point), coarse, cancellation).Harm.Value,
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

    private static Value[] Values(ChoiceRange[] ranges, IReadOnlyList<int> point) => [.. ranges.Zip(point, (r, i) => r.At(i))];

    /// <summary>Whole numbers that stand for the values of a choice.</summary>
    private sealed record ChoiceRange(int First, int Last, Rational From, Rational Step, bool Whole)
    {
        public static ChoiceRange Of(Choice choice, int copies, int levels)
        {
            // What depends on the list is at most all of it; draws take all when they ask for more.
            Rational from = Fixed(choice.From, levels) ?? 0, to = Fixed(choice.To, levels) ?? copies;
            if (choice.Whole)
                return new ChoiceRange(Clamped(from.Ceiling()), Clamped(to.Floor()), 0, 1, true);
            return new ChoiceRange(0, from < to ? RealSteps : from == to ? 0 : -1, from, (to - from) / RealSteps, false);
        }

        public Value At(int index) => Whole ? Value.Of(index) : new NumberValue(From + (Step * index));

        private static Rational? Fixed(BoundExpression expression, int levels) =>
            Reads.Parts(expression).Any(p => p is BoundSlot or BoundSize or BoundTally or BoundWhere or BoundSome or BoundChoice)
                ? null
                : ValueEvaluator.Evaluate(expression, [], levels) is NumberValue number ? number.Number : null;

        private static int Clamped(BigInteger number) => (int)BigInteger.Min(BigInteger.Max(number, -CountTable.LargestCount), CountTable.LargestCount);
    }
}
