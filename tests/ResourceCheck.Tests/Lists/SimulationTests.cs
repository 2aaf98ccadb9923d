using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>The literal protocol against the count; with fixed seeds, so that an interval that should miss once in a thousand does not.</summary>
public sealed class SimulationTests
{
    public static TheoryData<string, int, double> Settings => new()
    {
        { "honest", 60, 0 }, { "honest", 60, .02 }, { "honest", 150, 0 }, { "honest", 150, .02 },
        { "splitter", 60, .02 }, { "splitter", 150, 0 }, { "splitter", 150, .02 },
        { "forger", 60, .02 }, { "forger", 150, .02 },
        { "nobody lies", 60, .02 }, { "nobody lies", 150, .02 }, { "sender lies", 60, .02 }, { "sender lies", 150, 0 }, { "sender lies", 150, .02 },
        { "forwarder lies", 60, .02 }, { "forwarder lies", 150, 0 }, { "forwarder lies", 150, .02 },
    };

    [Theory]
    [MemberData(nameof(Settings))]
    public void Simulated_runs_agree_with_counting(string kind, int copies, double p)
    {
        ListTask task = Task(kind, copies, Copies.Depolarised(p, p, p));
        ListEvaluation counted = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken).Evaluation!;
        ListEvaluation simulated = SimulationEngine.Simulate(task, 6000, 11, 0.999, TestContext.Current.CancellationToken).Evaluation!;
        Inside(counted.Success, simulated.Success);
        Inside(counted.Failure, simulated.Failure);
        Inside(counted.Abort, simulated.Abort);
        Inside(counted.Harm, simulated.Harm);
    }

    [Fact]
    public void The_same_seed_gives_the_same_counts()
    {
        ListTask task = Task("honest", 60, Copies.Depolarised(.05, .05, .05));
        double[] failures = [.. ((ulong[])[1, 1, 2]).Select(seed => SimulationEngine.Simulate(task, 3000, seed, 0.9, default).Evaluation!.Failure.Value)];
        Assert.Equal(failures[0], failures[1]);
        Assert.NotEqual(failures[0], failures[2]);
    }

    private static ListTask Task(string kind, int copies, IReadOnlyList<CopyType> law) => kind switch
    {
        "honest" => Broadcast.Honest(copies, law),
        "nobody lies" => Liar.Honest(copies, law),
        "sender lies" => Liar.SenderLies(copies, law, (copies / 4) + 1, 0, 5, 3, copies * 2 / 5) with { HoldsEnough = false },
        "forwarder lies" => Liar.ForwarderLies(copies, law, (copies / 10) + 1, copies / 25) with { HoldsEnough = false },
        "forger" => Broadcast.Forger(copies, law, (copies * 3 / 40) + 1, false),
        _ => Broadcast.Splitter(copies, law, false, (copies / 4) + 1, 0, 5, 3, copies * 2 / 5),
    };

    private static void Inside(Estimate exact, Estimate sampled) => Assert.InRange(exact.Value, sampled.Low, sampled.High);
}
