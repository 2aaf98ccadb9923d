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

    /// <summary>Without noise the forger's harm falls exponentially; the best size is found where it is far below what a first comparison leaves out.</summary>
    [Fact]
    public void Small_harms_are_searched_with_as_little_left_out_as_they_need()
    {
        ListTask task = Broadcast.Forger(1200, Copies.Depolarised(0, 0, 0), 0);
        AttackOutcome found = WorstCase.Find(task, new SearchOptions(ExhaustiveUpTo: 2000), null, TestContext.Current.CancellationToken);
        double best = Enumerable.Range(90, 12).Max(size => CountingEngine.Evaluate(task with { Choices = [Value.Of(size)] }, TestContext.Current.CancellationToken).Evaluation!.Harm.Value);
        Assert.InRange(best, 1e-12, 1e-6);
        Assert.Equal(1, found.Evaluation!.Harm.Value / best, 9);
    }

    [Fact]
    public void A_saw_toothed_function_with_a_far_peak_is_climbed()
    {
        SearchResult found = AttackSearch.Maximise(
            [(0, 300), (0, 300), (0, 300)], c => -Math.Abs(c[0] - 211) - (2 * Math.Abs(c[1] + c[0] - 300)) - Math.Abs(c[2] - 7) + (c[0] % 5 == 1 ? 3 : 0), new SearchOptions(), null, TestContext.Current.CancellationToken);
        Assert.Equal([211, 89, 7], found.Choices);
        Assert.False(found.Exhaustive);
    }

    /// <summary>Numbers that are given are not searched, and the average at them is that of counting over the cheat's own lists.</summary>
    [Fact]
    public void Given_numbers_have_their_conditional_harm_and_the_average_of_counting()
    {
        ListTask task = Broadcast.Splitter(150, Copies.Depolarised(.02, .02, .02), false, 38, 0, 7, 2, 63);
        AttackOutcome given = WorstCase.At(task, TestContext.Current.CancellationToken);
        double plain = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken).Evaluation!.Harm.Value;
        Assert.Equal(1.1264667916e-1, given.Evaluation!.Harm.Value, 1e-10);
        Assert.InRange(given.Average!.Harm.Value, plain * (1 - 1e-8), plain * (1 + 1e-12));
        Assert.Null(given.Search);
    }

    [Fact]
    public void A_cheat_that_looks_at_its_list_does_at_least_what_one_does_that_keeps_to_its_numbers()
    {
        IReadOnlyList<CopyType> law = Copies.Depolarised(.02, .02, .02);
        ListTask task = Broadcast.Splitter(60, law, false, 0, 0, 0, 0, 0);
        AttackOutcome found = WorstCase.Find(task, new SearchOptions(GridPoints: 300, Climbs: 3, RandomClimbs: 1, Sweeps: 1), null, TestContext.Current.CancellationToken);
        double kept = CountingEngine.Evaluate(task with { Choices = found.Choices! }, TestContext.Current.CancellationToken).Evaluation!.Harm.Value;
        Assert.True(found.Average!.Harm.Value >= kept * (1 - 1e-8), $"{found.Average.Harm.Value:R} for {kept:R}");
        Assert.True(found.Average.Harm.Value <= found.Evaluation!.Harm.Value);
        Assert.True(double.IsFinite(found.Average.Harm.Low) && double.IsInfinity(found.Average.Harm.High));
    }
}
