using ResourceCheck.Numerics.Counting;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// A cheat that looks at how often each value occurs in its own list and then takes the best of some listed choices. Its average
/// harm is a lower bound on what the best choice for every list can do.
/// </summary>
public static class AdaptiveCheat
{
    /// <summary>Evaluates the adaptive strategy.</summary>
    /// <param name="task">The task with a cheat; <see cref="ListTask.Choices"/> and <see cref="ListTask.HoldsEnough"/> are ignored.</param>
    /// <param name="listed">The choices to take from, at least one.</param>
    /// <param name="neglected">Lists this improbable in all are counted as harmless, which keeps the bound; 0 for none.</param>
    /// <param name="cancellation">Stops the evaluation.</param>
    public static AdaptiveOutcome Average(ListTask task, IReadOnlyList<IReadOnlyList<Value>> listed, double neglected, CancellationToken cancellation)
    {
        try
        {
            ListProgram program = ListProgram.Of(task with { HoldsEnough = false });
            Dictionary<string, double> best = [];
            double[] fixedHarms = new double[listed.Count];
            double[] work = new double[listed.Count];
            for (int i = 0; i < listed.Count; i++)
            {
                OwnCounts own = new(program, listed[i], task.Limits, neglected, cancellation);
                Dictionary<string, double> harms = own.Harms();
                fixedHarms[i] = Sum(harms.Values);
                work[i] = own.Work;
                foreach ((string counts, double harm) in harms)
                    best[counts] = Math.Max(harm, best.GetValueOrDefault(counts));
            }

            return new AdaptiveOutcome(Estimate.AtLeast(Sum(best.Values)), [.. fixedHarms.Select(Estimate.AtLeast)], work.Sum(), null);
        }
        catch (ListRefusalException refusal)
        {
            return new AdaptiveOutcome(null, [], 0, refusal.Message);
        }
        catch (AggregateException several) when (several.InnerExceptions.OfType<ListRefusalException>().FirstOrDefault() is { } refusal)
        {
            return new AdaptiveOutcome(null, [], 0, refusal.Message);
        }
    }

    private static double Sum(IEnumerable<double> terms)
    {
        CompensatedSum sum = default;
        foreach (double term in terms.Order())
            sum.Add(term);
        return sum.Value;
    }
}
