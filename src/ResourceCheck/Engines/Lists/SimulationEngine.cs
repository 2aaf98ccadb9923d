using System.Globalization;
using ResourceCheck.Numerics.Counting;
using ResourceCheck.Numerics.Randomness;

namespace ResourceCheck.Engines.Lists;

/// <summary>Verdicts of a list protocol from simulated runs of the protocol as written, position by position.</summary>
public static class SimulationEngine
{
    /// <summary>Simulates a task. Each run has a random stream of its own, so that the result does not depend on the number of threads.</summary>
    /// <param name="task">What is asked; draws that always find enough cannot be simulated.</param>
    /// <param name="runs">Number of runs, at least 1.</param>
    /// <param name="seed">Fixes all random streams.</param>
    /// <param name="confidence">Confidence of the intervals.</param>
    /// <param name="cancellation">Stops the simulation.</param>
    public static ListOutcome Simulate(ListTask task, int runs, ulong seed, double confidence, CancellationToken cancellation)
    {
        if (task.HoldsEnough)
            return new ListOutcome(null, "A list that always holds enough positions cannot be simulated: real lists do not.");
        int successes = 0, aborts = 0, harms = 0;
        Parallel.For(0, runs, new ParallelOptions { CancellationToken = cancellation }, run =>
        {
            (bool success, bool abort, bool harm) = LiteralRun.Run(task, new RandomChance(Xoshiro256.Stream(seed, (ulong)run)));
            Interlocked.Add(ref successes, success ? 1 : 0);
            Interlocked.Add(ref aborts, abort ? 1 : 0);
            Interlocked.Add(ref harms, harm ? 1 : 0);
        });
        return new ListOutcome(
            new ListEvaluation
            {
                Success = Sampled(successes, runs, confidence),
                Failure = Sampled(runs - successes, runs, confidence),
                Abort = Sampled(aborts, runs, confidence),
                Harm = Sampled(harms, runs, confidence),
                Method = string.Create(CultureInfo.InvariantCulture, $"simulated position by position in {runs} runs, seed {seed}"),
                Work = (double)runs * task.Lists.Copies,
            },
            null);
    }

    private static Estimate Sampled(int count, int runs, double confidence)
    {
        (double low, double high) = ClopperPearson.Interval(count, runs, confidence);
        return new Estimate((double)count / runs, TruthLabel.Sampled, low, high, confidence);
    }
}
