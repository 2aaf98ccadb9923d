using System.Diagnostics;
using ResourceCheck.Engines.Lists;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>Values of detectable broadcast found by an independent program; see tests/reference/lists.py.</summary>
public sealed class BroadcastTests
{
    [Theory]
    [InlineData(0, 150, 2.4262163320e-2)]
    [InlineData(.02, 150, 5.0368381247e-2)]
    [InlineData(0, 300, 1.4055113536e-3)]
    [InlineData(.02, 300, 3.6059443913e-3)]
    [InlineData(.05, 300, 1.3906832068e-1)]
    public void Honest_parties_fail_with_the_reference_probability(double p, int copies, double failure)
    {
        foreach (int x in (int[])[0, 1])
            Near(failure, Evaluated(Broadcast.Honest(copies, Copies.Depolarised(p, p, p), x)).Failure.Value);
    }

    [Theory]
    [InlineData(0, 150, 1.5533298243e-1, 38, 0, 7, 4)]
    [InlineData(.02, 150, 1.1264667916e-1, 38, 0, 7, 2)]
    [InlineData(0, 300, 9.0227455662e-2, 84, 0, 15, 11)]
    [InlineData(.02, 300, 5.8103589605e-2, 84, 0, 15, 7)]
    [InlineData(.05, 300, 3.6640237254e-2, 84, 0, 13, 1)]
    public void A_splitting_sender_that_holds_enough_does_the_reference_harm(double p, int copies, double harm, int n, int k1, int k2, int o)
    {
        Stopwatch watch = Stopwatch.StartNew();
        ListEvaluation evaluation = Evaluated(Broadcast.Splitter(copies, Copies.Depolarised(p, p, p), true, n, k1, k2, o, copies * 42 / 100));
        TestContext.Current.SendDiagnosticMessage($"{watch.ElapsedMilliseconds} ms, {evaluation.Work} transitions");
        Near(harm, evaluation.Harm.Value);
    }

    [Theory]
    [InlineData(0, 150, 9.5489119660e-2)]
    [InlineData(.02, 150, 1.0174065210e-1)]
    [InlineData(0, 300, 1.2717512174e-2)]
    [InlineData(.02, 300, 1.2032077242e-2)]
    [InlineData(.05, 300, 7.9732570880e-2)]
    public void A_forging_receiver_that_holds_enough_does_the_reference_harm_at_its_best_size(double p, int copies, double harm)
    {
        int least = ((3 * copies) + 39) / 40;
        double best = Enumerable.Range(least, 12).Max(size => Evaluated(Broadcast.Forger(copies, Copies.Depolarised(p, p, p), size)).Harm.Value);
        Near(harm, best);
    }

    private static ListEvaluation Evaluated(ListTask task)
    {
        ListOutcome outcome = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken);
        Assert.True(outcome.Evaluation is not null, outcome.Refusal);
        Assert.Equal(1, outcome.Evaluation.Success.Value + outcome.Evaluation.Failure.Value, 12);
        return outcome.Evaluation;
    }

    private static void Near(double expected, double actual) => Assert.InRange(actual, expected * (1 - 1e-9), expected * (1 + 1e-9));
}
