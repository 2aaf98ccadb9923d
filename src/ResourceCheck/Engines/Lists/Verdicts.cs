using System.Globalization;
using ResourceCheck.Numerics.Counting;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Probabilities of the ends of a run, each summed by itself.</summary>
internal sealed record Verdicts(double Success, double Failure, double Abort, double Harm)
{
    /// <summary>Verdicts of all states that have run to the end.</summary>
    public static Verdicts Of(ListContext context, Counter counter)
    {
        CompensatedSum success = default, failure = default, abort = default, harm = default;
        foreach ((_, ListStructure structure, CountTable table) in counter.Waiting)
        {
            bool succeeds = structure.Aborted == 0 && Holds(structure, context.Code.SuccessSlot);
            for (int entry = 0; entry < table.Count; entry++)
            {
                double weight = table.Weight(entry);
                (succeeds ? ref success : ref failure).Add(weight);
                if (structure.Aborted != 0)
                    abort.Add(weight);
                if (Holds(structure, context.Code.HarmSlot))
                    harm.Add(weight);
            }
        }

        return new Verdicts(Rounded(success), Rounded(failure), Rounded(abort), Rounded(harm));
    }

    /// <summary>Round-off may carry a sure event a little above 1.</summary>
    private static double Rounded(CompensatedSum sum) => Math.Min(1, sum.Value);

    public static bool Holds(ListStructure structure, int slot) => structure.Single[slot] is TruthValue { Truth: true };

    public ListEvaluation ToEvaluation(ListTask task, Meter meter)
    {
        Func<double, Estimate> label = task.HoldsEnough ? Estimate.AtMost : Estimate.Exact;
        return new ListEvaluation
        {
            Success = Estimate.Exact(Success),
            Failure = Estimate.Exact(Failure),
            Abort = Estimate.Exact(Abort),
            Harm = label(Harm),
            Method = Method(task),
            Work = meter.Transitions,
        };
    }

    private static string Method(ListTask task) => task.HoldsEnough
        ? "counted exactly, conditional on the cheat's list holding enough positions of each value it draws"
        : string.Create(CultureInfo.InvariantCulture, $"counted exactly over the law of {task.Lists.Copies} independent copies");
}
