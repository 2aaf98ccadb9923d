using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Tests.ProtocolLibrary;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>Numbers of copies that a failure probability costs.</summary>
public sealed class CopiesTests
{
    /// <summary>Runs at neighbouring numbers say the same: the one below fails the target, all of the margin hold it.</summary>
    [Fact]
    public void Honest_failure_holds_from_the_number_found_and_not_below()
    {
        CopiesResult found = Value(Judge.Copies(new CopiesRequest(Broadcast(), 0.02, 1, null)));
        Assert.True(Failure(found.Copies - 1) > 0.02);
        Assert.All(Enumerable.Range(found.Copies, found.CheckedUpTo - found.Copies + 1), copies => Assert.True(Failure(copies) <= 0.02));
        Assert.Empty(found.Attacks);
    }

    [Fact]
    public void Harms_count_and_come_with_the_strategy()
    {
        CopiesResult found = Value(Judge.Copies(new CopiesRequest(Broadcast(), 0.1, 0.2, null)));
        Assert.All(found.Attacks, a => Assert.True(a.Value.High <= 0.2));
        Assert.Equal(["sender splits", "receiver forges"], found.Attacks.Select(a => a.Case));
        Assert.Contains(found.Steps, s => s.Copies == found.Copies && s.Harm is { Label: TruthLabel.Bound });
    }

    /// <summary>Thresholds that are chosen need fewer copies than the script's, and what they are said to hold a run of its own confirms.</summary>
    [Fact]
    public void Chosen_thresholds_need_fewer_copies_and_hold_what_is_said()
    {
        CopiesResult given = Value(Judge.Copies(new CopiesRequest(Broadcast(), 0.1, 0.2, null)));
        CopiesResult chosen = Value(Judge.Copies(new CopiesRequest(Broadcast(), 0.1, 0.2, null) { Optimise = ["a", "b", "c", "t1", "t2"] }));
        Assert.Equal(["a", "b", "c", "t1", "t2"], chosen.Optimised);
        Assert.True(chosen.Copies < 0.75 * given.Copies, $"{chosen.Copies} against {given.Copies}");
        RunResult run = Value(Judge.Run(Broadcast() with { Parameters = [new("M", $"{chosen.Copies}"), .. chosen.Thresholds] }));
        Assert.DoesNotContain(run.Warnings, w => w.Code == "P010"); // requirements hold
        Assert.True(run.Cases[0].Metrics.Single(m => m.Name == "failure").Estimate.Value <= 0.1);
        Assert.All(run.Cases.Skip(1), c => Assert.True(c.Metrics.Single(m => m.Name == "harm").Estimate.Value <= 0.2));
    }

    [Theory]
    [InlineData("J013", "d")]
    [InlineData("J013", "M")]
    public void What_is_no_threshold_is_told(string code, string name) =>
        Assert.Equal([code], Judge.Copies(new CopiesRequest(Broadcast(), 0.05, 0.1, null) { Optimise = [name] }).Findings.Select(f => f.Code));

    [Fact]
    public void Thresholds_are_chosen_for_one_value_of_all_else() =>
        Assert.Equal(["J014"], Judge.Copies(new CopiesRequest(Broadcast() with { Parameters = [new("t1", "0.05,0.06")] }, 0.05, 0.1, null) { Optimise = ["a"] }).Findings.Select(f => f.Code));

    [Fact]
    public void What_cannot_be_had_is_told_with_its_figures()
    {
        Outcome<CopiesResult> noisy = Judge.Copies(new CopiesRequest(Broadcast() with { Overrides = [new("flight.depolarising", "0.3")], Parameters = [new("M", "12")] }, 1e-3, 1, null));
        Assert.Equal(["E010"], noisy.Findings.Select(f => f.Code));
        Outcome<CopiesResult> single = Judge.Copies(new CopiesRequest(ProtocolLibraryTests.Request("removal.protocol", conditions: false), 1e-3, 1, null));
        Assert.Equal(["J012"], single.Findings.Select(f => f.Code));
    }

    /// <summary>Every row is what a single target gives; smaller failure costs more, and noise beyond the thresholds is told in its row.</summary>
    [Fact]
    public void A_table_holds_the_single_numbers_against_failure_and_noise()
    {
        CopiesRequest request = new(Broadcast(), 1, 1, null);
        CopiesTable table = Value(Judge.Copies(new CopiesTableRequest(request, [0.1, 0.02], 1, [new("flight.depolarising", "0..0.3:2")])));
        Assert.Equal([(0.0, 0.1), (0.0, 0.02), (0.3, 0.1), (0.3, 0.02)], table.Rows.Select(r => (r.Value!.Value, r.Targets.Failure)));
        Assert.Equal([.. new[] { 0.1, 0.02 }.Select(f => (int?)Value(Judge.Copies(request with { Failure = f })).Copies), null, null], table.Rows.Select(r => r.Copies));
        Assert.True(table.Rows[0].Copies < table.Rows[1].Copies);
        Assert.All(table.Rows.Take(2), r => Assert.True(r.Failure!.Value <= r.Targets.Failure && r.Harm is null && r.Refusal is null));
        Assert.All(table.Rows.Skip(2), r => Assert.EndsWith("(E010)", r.Refusal, StringComparison.Ordinal));
        Assert.Equal(["J012"], Judge.Copies(new CopiesTableRequest(request with { Run = ProtocolLibraryTests.Request("removal.protocol", conditions: false) }, [0.1, 0.2], null, [])).Findings.Select(f => f.Code));
    }

    private static double Failure(int copies)
    {
        RunRequest request = Broadcast() with { Script = Broadcast().Script with { Text = Broadcast().Script.Text.Split("\ndishonest")[0].Replace("goal harm", "# goal harm", StringComparison.Ordinal) }, Parameters = [new("M", $"{copies}")] };
        return Value(Judge.Run(request)).Cases[0].Metrics.Single(m => m.Name == "failure").Estimate.Value;
    }

    private static RunRequest Broadcast() => ProtocolLibraryTests.Request("detectable-broadcast.protocol", conditions: false, parameters: false);

    private static T Value<T>(Outcome<T> outcome)
        where T : class
    {
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
