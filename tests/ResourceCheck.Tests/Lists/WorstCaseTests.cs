using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>Searches over a cheat's numbers.</summary>
public sealed class WorstCaseTests
{
    [Theory]
    [InlineData(0, 150, 1.5533298243e-1)]
    [InlineData(0, 300, 9.0227455662e-2)]
    public void The_search_finds_at_least_the_reference_attack(double p, int copies, double harm)
    {
        AttackOutcome found = WorstCase.Find(Broadcast.Splitter(copies, Copies.Depolarised(p, p, p), true, 0, 0, 0, 0, 0), new SearchOptions(), null, TestContext.Current.CancellationToken);
        Assert.True(found.Refusal is null, found.Refusal);
        Assert.True(found.Evaluation!.Harm.Value >= harm * (1 - 1e-9), $"{found.Evaluation.Harm.Value:R} at {string.Join(", ", found.Choices!)}; {found.Search!.Check}");
    }

    [Fact]
    public void One_number_is_searched_exhaustively()
    {
        AttackOutcome found = WorstCase.Find(Broadcast.Forger(150, Copies.Depolarised(.02, .02, .02), 0), new SearchOptions(), null, TestContext.Current.CancellationToken);
        Assert.True(found.Search!.Exhaustive);
        Assert.Equal(151, found.Search!.Evaluations);
        Assert.Equal(1.0174065210e-1, found.Evaluation!.Harm.Value, 10);
    }

    [Fact]
    public void A_saw_toothed_function_with_a_far_peak_is_climbed()
    {
        SearchResult found = AttackSearch.Maximise(
            [(0, 300), (0, 300), (0, 300)], c => -Math.Abs(c[0] - 211) - (2 * Math.Abs(c[1] + c[0] - 300)) - Math.Abs(c[2] - 7) + (c[0] % 5 == 1 ? 3 : 0), new SearchOptions(), null, TestContext.Current.CancellationToken);
        Assert.Equal([211, 89, 7], found.Choices);
        Assert.False(found.Exhaustive);
    }

    [Fact]
    public void Average_harm_of_one_choice_is_that_of_counting_and_adapting_never_does_less()
    {
        IReadOnlyList<CopyType> law = Copies.Depolarised(.02, .02, .02);
        Value[][] listed = [Numbers(16, 0, 3, 1, 22), Numbers(18, 1, 3, 2, 20)];
        double[] plain = [.. listed.Select(c => CountingEngine.Evaluate(Broadcast.Splitter(60, law, false, 0, 0, 0, 0, 0) with { Choices = c }, TestContext.Current.CancellationToken).Evaluation!.Harm.Value)];
        AdaptiveOutcome adaptive = AdaptiveCheat.Average(Broadcast.Splitter(60, law, false, 0, 0, 0, 0, 0), listed, 0, TestContext.Current.CancellationToken);
        Assert.True(adaptive.Harm is not null, adaptive.Refusal);
        for (int i = 0; i < plain.Length; i++)
            Assert.Equal(1, adaptive.Fixed[i].Value / plain[i], 11);
        Assert.True(adaptive.Harm.Value >= plain.Max() * (1 - 1e-11));
    }

    [Fact]
    public void The_average_harm_of_the_reference_attack_is_below_its_conditional_value()
    {
        ListTask task = Broadcast.Splitter(150, Copies.Depolarised(.02, .02, .02), false, 38, 0, 7, 2, 63);
        AdaptiveOutcome adaptive = AdaptiveCheat.Average(task, [task.Choices], 1e-9, TestContext.Current.CancellationToken);
        double plain = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken).Evaluation!.Harm.Value;
        Assert.InRange(adaptive.Harm!.Value, plain - 1e-9, plain * (1 + 1e-12));
        Assert.InRange(plain, 0.01, 1.1264667916e-1);
    }

    private static Value[] Numbers(params int[] numbers) => [.. numbers.Select(Value.Of)];
}
