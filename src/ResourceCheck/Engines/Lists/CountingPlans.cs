using System.Collections.Concurrent;
using System.Numerics;

namespace ResourceCheck.Engines.Lists;

/// <summary>How to go on from a structure at an operation; worked out once and shared by all runs of a program.</summary>
internal sealed class CountingPlans(ListContext context)
{
    private readonly ConcurrentDictionary<(int At, string Key), ReductionPlan> _reductions = [];
    private readonly ConcurrentDictionary<(int At, string Key), ReadingPlan> _readings = [];

    /// <summary>Brings a structure into the one form of all that behave alike from an operation on.</summary>
    public ReductionPlan Reduction(int at, ListStructure structure) => _reductions.GetOrAdd((at, structure.Key), _ => Reduce(at, structure));

    /// <summary>Counts what an operation reads.</summary>
    /// <param name="at">Index of the operation.</param>
    /// <param name="structure">What is known.</param>
    /// <param name="reading">What is read.</param>
    /// <param name="also">One more set to be counted; null for none.</param>
    /// <param name="classes">What later operations can tell apart.</param>
    public ReadingPlan Reading(int at, ListStructure structure, Reading reading, BigInteger[]? also, Func<int[][]> classes) => _readings.GetOrAdd((at, structure.Key), _ =>
    {
        CountedSets counted = CountedSets.Of(context, reading, structure);
        if (also is not null)
            counted = counted.With(also);
        return new ReadingPlan(counted, Refinement.Of(context, structure, counted.Sets, classes()));
    });

    private ReductionPlan Reduce(int at, ListStructure structure)
    {
        ListStructure forgotten = Lists.Reduction.Forget(context, structure, at);
        Refinement refinement = Refinement.Of(context, forgotten, [], Foresight.Classes(context, forgotten, at));
        int[] order = Lists.Reduction.Order(refinement.After);
        return new ReductionPlan(refinement, order, Lists.Reduction.Ordered(refinement.After, order));
    }
}

/// <summary>A reduction: cells are merged, then brought into order.</summary>
internal sealed record ReductionPlan(Refinement Refinement, int[] Order, ListStructure Structure);

/// <summary>A reading: cells are split, then states sorted by value.</summary>
internal sealed record ReadingPlan(CountedSets Counted, Refinement Refinement);
