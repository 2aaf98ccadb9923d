using FsCheck.Xunit;
using ResourceCheck.Engines.Lists;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>Laws of counting on random programs.</summary>
public sealed class ListLaws
{
    /// <summary>Programs with more paths than this are left to the simulation's tests.</summary>
    private const int MostPaths = 20000;

    [Property(MaxTest = 200)]
    public void Counting_equals_the_enumeration_of_all_runs(int seed)
    {
        ListTask task = new RandomList(seed).Task();
        if (Enumerated(task) is not { } expected)
            return;
        ListOutcome outcome = CountingEngine.Evaluate(task, default);
        Assert.True(outcome.Evaluation is not null, $"seed {seed}: {outcome.Refusal}");
        double[] actual = [outcome.Evaluation.Success.Value, outcome.Evaluation.Failure.Value, outcome.Evaluation.Abort.Value, outcome.Evaluation.Harm.Value];
        for (int i = 0; i < actual.Length; i++)
            Assert.True(Math.Abs(expected[i] - actual[i]) < 1e-12, $"seed {seed}, figure {i}: enumerated {expected[i]:R}, counted {actual[i]:R}");
    }

    [Fact]
    public void Most_random_programs_can_be_enumerated_and_have_open_verdicts()
    {
        double[]?[] all = [.. Enumerable.Range(0, 200).Select(seed => Enumerated(new RandomList(seed).Task()))];
        int known = all.Count(e => e is not null), open = all.Count(e => e is not null && (e[0] is > 0.001 and < 0.999 || e[3] is > 0.001 and < 0.999)), aborting = all.Count(e => e is not null && e[2] is > 0.001 and < 0.999);
        Assert.True(known > 130 && open > 50 && aborting > 10, $"{known} enumerated, {open} open, {aborting} with open aborts");
    }

    private static double[]? Enumerated(ListTask task)
    {
        double[] sums = new double[4];
        int paths = 0;
        EveryChance chance = new();
        try
        {
            chance.ForEach(() =>
            {
                (bool success, bool abort, bool harm) = LiteralRun.Run(task, chance);
                double probability = chance.Probability;
                sums[success ? 0 : 1] += probability;
                sums[2] += abort ? probability : 0;
                sums[3] += harm ? probability : 0;
                if (++paths > MostPaths)
                    throw new OperationCanceledException();
            });
        }
        catch (OperationCanceledException)
        {
            return null;
        }

        return sums;
    }
}
