using ResourceCheck.Engines.Lists;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>Values of liar detection found by an independent program; see tests/reference/lists.py.</summary>
public sealed class LiarTests
{
    [Theory]
    [InlineData(0, 150, .18408203125, 40, 7, 0, 5)]
    [InlineData(0, 300, .081716299057, 80, 0, 14, 9)]
    [InlineData(.02, 300, .035558044575, 80, 0, 14, 2)]
    public void A_sender_that_lies_goes_undetected_with_the_reference_probability(double p, int copies, double harm, int n, int k1, int k2, int o) =>
        Near(harm, Liar.SenderLies(copies, Copies.Depolarised(p, p, p), n, k1, k2, o, copies * 42 / 100));

    [Theory]
    [InlineData(0, 150, .24532776694, 15, 7)]
    [InlineData(0, 300, .13464083558, 30, 13)]
    [InlineData(.02, 300, .11944488016, 30, 13)]
    public void A_forwarder_that_lies_goes_undetected_with_the_reference_probability(double p, int copies, double harm, int size, int own) =>
        Near(harm, Liar.ForwarderLies(copies, Copies.Depolarised(p, p, p), size, own));

    private static void Near(double expected, ListTask task)
    {
        ListOutcome outcome = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken);
        Assert.True(outcome.Evaluation is not null, outcome.Refusal);
        Assert.InRange(outcome.Evaluation.Harm.Value, expected * (1 - 1e-9), expected * (1 + 1e-9));
    }
}
