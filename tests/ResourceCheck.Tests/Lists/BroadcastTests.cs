using System.Numerics;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;
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
        ListEvaluation evaluation = Evaluated(Broadcast.Splitter(copies, Copies.Depolarised(p, p, p), true, n, k1, k2, o, copies * 42 / 100));
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

    [Theory]
    [InlineData(150, .10465065169)]
    [InlineData(300, .012880324054)]
    public void A_forger_without_noise_does_the_reference_harm(int copies, double harm) =>
        Near(harm, Enumerable.Range(((3 * copies) + 39) / 40, 8).Max(size => Evaluated(Broadcast.Forger(copies, Copies.Depolarised(.02, 0, .02), size)).Harm.Value));

    [Theory]
    [InlineData(150, .13614460434, 38, 7)]
    [InlineData(300, .077472849508, 84, 15)]
    public void A_splitter_without_noise_does_the_reference_harm(int copies, double harm, int n, int k2) =>
        Near(harm, Enumerable.Range(0, 12).Max(o => Evaluated(Broadcast.Splitter(copies, Copies.Depolarised(0, .02, .02), true, n, 0, k2, o, copies * 42 / 100)).Harm.Value));

    [Fact]
    public void Failure_without_noise_falls_exponentially_with_the_number_of_copies()
    {
        double[] failure = [.. ((int[])[300, 600, 1200]).Select(copies => Evaluated(Broadcast.Honest(copies, Copies.Depolarised(0, 0, 0))).Failure.Value)];
        double first = -Math.Log(failure[1] / failure[0]) / 300, second = -Math.Log(failure[2] / failure[1]) / 600;
        Assert.InRange(second / first, 0.9, 1.1);
        Assert.InRange(failure[2], 1e-13, 1e-8);
    }

    // The failure is that of a binomial count leaving its window; both sums are made exactly.
    [Fact]
    public void Failure_without_noise_is_twelve_digits_of_the_exact_fraction()
    {
        foreach (int copies in (int[])[150, 600, 1200])
            Assert.Equal(1, Evaluated(Broadcast.Honest(copies, Copies.Depolarised(0, 0, 0))).Failure.Value / ExactFailure(copies), 12);
    }

    private static double ExactFailure(int copies)
    {
        BigInteger outside = 0, term = BigInteger.Pow(2, copies), whole = BigInteger.Pow(3, copies);
        for (int n = 0; n <= copies; n++)
        {
            if (4 * n < copies || 100 * n > 42 * copies)
                outside += term;
            term = term * (copies - n) / (2 * (n + 1));
        }

        return (double)((outside << 300) / whole) * Math.ScaleB(1, -300);
    }

    [Fact]
    public void Without_the_cap_on_sizes_a_sender_splits_the_receivers()
    {
        IReadOnlyList<CopyType> ideal = Copies.Depolarised(0, 0, 0);
        Assert.InRange(Evaluated(Broadcast.Splitter(300, ideal, true, 75, 0, 0, 36, 300)).Harm.Value, 0, 1e-12);
        Assert.InRange(Evaluated(Broadcast.SplitterWithoutCap(300, ideal, 75, 0, 0, 36, 300)).Harm.Value, 0.3, 1);
    }

    [Fact]
    public void Without_the_removal_of_its_own_set_a_receiver_believes_any_forger()
    {
        IReadOnlyList<CopyType> ideal = Copies.Depolarised(0, 0, 0);
        Assert.InRange(Evaluated(Broadcast.ForgerFromTheSet(300, ideal, true)).Harm.Value, 0, 2e-3);
        Assert.InRange(Evaluated(Broadcast.ForgerFromTheSet(300, ideal, false)).Harm.Value, 0.99, 1);
    }

    [Fact]
    public void Too_much_work_is_refused_with_its_figures()
    {
        ListTask task = Broadcast.Splitter(300, Copies.Depolarised(.02, .02, .02), true, 84, 0, 15, 7, 126) with { Limits = new ListLimits(Operations: 1e5) };
        ListOutcome outcome = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken);
        Assert.Null(outcome.Evaluation);
        Assert.Equal("Too much work: counting needs more than 1e5 transitions between states of counts.", outcome.Refusal);
    }

    [Fact]
    public void Conditional_values_that_are_not_defined_are_refused()
    {
        ListTask task = Broadcast.Forger(60, Copies.Depolarised(0, 0, 0), 5);
        DishonestCase cheat = task.Case! with { Harm = Terms.AtLeast(Terms.Size(Terms.Where(1, Terms.Of(0))), Terms.Of(3)), ListSteps = [.. task.Case.ListSteps!, Terms.Set(2, 10, Terms.Slot(10))] };
        ListOutcome outcome = CountingEngine.Evaluate(task with { Case = cheat }, TestContext.Current.CancellationToken);
        Assert.Equal("A set is counted from which the cheat was taken to hold enough positions: the conditional value is not defined here.", outcome.Refusal);
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
