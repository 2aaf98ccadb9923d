using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;
using Xunit;
using static ResourceCheck.Tests.Lists.Terms;

namespace ResourceCheck.Tests.Lists;

/// <summary>Fractions of positions under decay: each permutation keeps (1-q)/6, each mixed triple of the lower levels gains q/6.</summary>
public sealed class DecayTests
{
    // Columns: decaying value, S's bit, share of s = x, wrong share at R0 among them, wrong evidence, success of a forged position.
    public static TheoryData<int, int, Func<double, double[]>> Fractions => new()
    {
        { 2, 0, q => [(2 + q) / 6, q / (2 + q), 2 * q / (1 + q), (1 - q) / 2] },
        { 2, 1, q => [(2 + q) / 6, q / (2 + q), 2 * q / (1 + q), (1 - q) / 2] },
        { 0, 0, q => [(1 - q) / 3, 0, 0, Math.Max(0.5, 2 * q / (1 + (2 * q)))] },
        { 0, 1, q => [(2 + q) / 6, q / (2 + q), 0, 0.5] },
        { 1, 1, q => [(1 - q) / 3, 0, 0, Math.Max(0.5, 2 * q / (1 + (2 * q)))] },
        { 1, 0, q => [(2 + q) / 6, q / (2 + q), 0, 0.5] },
    };

    [Theory]
    [MemberData(nameof(Fractions))]
    public void One_position_shows_the_published_fractions(int value, int x, Func<double, double[]> expected)
    {
        foreach (double q in (double[])[0, 0.1, 0.3, 0.6])
        {
            IReadOnlyList<CopyType> law = Copies.Decayed(q, value);
            BoundExpression kept = Same(Slot(0), Of(x)), evidence = And(kept, Same(Slot(1), Of(1 - x)));
            double[] fractions = expected(q);
            Assert.Equal(fractions[0], Probability(law, kept), 14);
            Assert.Equal(fractions[1], Share(law, Same(Slot(1), Of(x)), kept), 14);
            Assert.Equal(fractions[2], Share(law, Differ(Slot(2), Of(2)), evidence), 14);
            Assert.Equal(fractions[3], Enumerable.Range(0, 3).Max(own => Share(law, Same(Slot(2), Of(2)), And(Differ(Slot(0), Of(x)), Same(Slot(1), Of(own))))), 14);
        }
    }

    /// <summary>Probability that a predicate holds at the one position of a list of one copy.</summary>
    private static double Probability(IReadOnlyList<CopyType> law, BoundExpression predicate)
    {
        ListOutcome outcome = CountingEngine.Evaluate(
            new ListTask { Protocol = Protocol(1, 4, AtLeast(Size(Where(predicate)), Of(1)), []), Copies = law, Inputs = [Value.Of(0)] }, default);
        return outcome.Evaluation!.Success.Value;
    }

    private static double Share(IReadOnlyList<CopyType> law, BoundExpression part, BoundExpression whole) =>
        Probability(law, whole) is var all and > 0 ? Probability(law, And(part, whole)) / all : 0;
}
