using System.Globalization;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Judgement;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>The two list protocols as scripts, against the independent table.</summary>
public sealed class ScriptedListTests
{
    [Fact]
    public void Scripts_reproduce_every_row()
    {
        List<string> off = [.. TableRow.Of("lists").Select(r => (Row: r, Value: Compute(r))).Where(p => !(Math.Abs(p.Value - p.Row.Value) <= 1e-9 * p.Row.Value))
            .Select(p => $"{p.Row} {string.Join(';', p.Row.Parameters)}: {p.Value:R} for {p.Row.Value:R}")];
        Assert.True(off.Count == 0, string.Join('\n', off));
    }

    [Fact]
    public void The_worst_choices_stay_within_the_ranges_that_the_others_leave()
    {
        ListTask task = Task("detectable-broadcast", 60, .02) with { HoldsEnough = true };
        task = task with { Case = task.Protocol.Dishonest[0] };
        AttackOutcome found = WorstCase.Find(task, new SearchOptions(GridPoints: 300, Climbs: 3, RandomClimbs: 1, Sweeps: 1), null, TestContext.Current.CancellationToken);
        Assert.True(found.Refusal is null, found.Refusal);
        int[] choices = [.. found.Search!.Choices];
        Assert.True(choices[1] + choices[2] + choices[3] <= choices[0] && choices[3] <= choices[4], string.Join(", ", choices));
        Assert.InRange(found.Evaluation!.Harm.Value, 0.1, 1);
    }

    /// <summary>
    /// With few copies all choices are evaluated, so the average of a cheat that looks at its own list is, over the multinomial law of the
    /// list, the greatest harm among the choices that it holds enough zeros, ones and twos for.
    /// </summary>
    [Fact]
    public void The_average_over_own_lists_takes_the_best_choice_that_each_list_affords()
    {
        const int copies = 14;
        ListTask task = Task("detectable-broadcast", copies, .1) with { HoldsEnough = true };
        task = task with { Case = task.Protocol.Dishonest[0] };
        (int[] Needs, double Harm)[] attacks = [.. Attacks(copies).Select(c => (new[] { c[0] - c[1] - c[2], c[1] + c[4] - c[3], c[2] }, Evaluated(task with { Choices = [.. c.Select(Value.Of)] }).Harm.Value))];
        double average = 0;
        for (int zeros = 0; zeros <= copies; zeros++)
        {
            for (int ones = 0; zeros + ones <= copies; ones++)
            {
                int[] list = [zeros, ones, copies - zeros - ones];
                double ways = Factorial(copies) / list.Aggregate(1.0, (product, n) => product * Factorial(n));
                average += ways / Math.Pow(3, copies) * attacks.Where(a => a.Needs.Zip(list).All(p => p.First <= p.Second)).Select(a => a.Harm).DefaultIfEmpty(0).Max();
            }
        }

        AttackOutcome found = WorstCase.Find(task, new SearchOptions(ExhaustiveUpTo: 100_000), null, TestContext.Current.CancellationToken);
        Assert.Equal(1, found.Average!.Harm.Value / average, 5);
        Assert.True(found.Average.Harm.Value <= average * (1 + 1e-12));
    }

    /// <summary>All allowed (n, k1, k2, o, n1) at the default thresholds.</summary>
    private static IEnumerable<int[]> Attacks(int copies) =>
        from n in Sizes(copies)
        from k1 in Enumerable.Range(0, n + 1)
        from k2 in Enumerable.Range(0, n - k1 + 1)
        from o in Enumerable.Range(0, n - k1 - k2 + 1)
        from n1 in Sizes(copies)
        select new[] { n, k1, k2, o, n1 };

    private static IEnumerable<int> Sizes(int copies) => Enumerable.Range(0, copies).Where(n => 4 * n >= copies && 100 * n <= 42 * copies);

    private static double Factorial(int n) => Enumerable.Range(1, n).Aggregate(1.0, (product, k) => product * k);

    private static ListEvaluation Evaluated(ListTask task) => CountingEngine.Evaluate(task, TestContext.Current.CancellationToken).Evaluation!;

    /// <summary>What was left out of a count bounds it from both sides, and the exact value lies between.</summary>
    [Theory]
    [InlineData(6e4)]
    [InlineData(2e4)]
    public void Too_much_work_is_bounded_from_both_sides(double work)
    {
        ListTask task = Task("detectable-broadcast", 150, .02);
        ListEvaluation exact = Evaluated(task);
        ListEvaluation bounded = ListVerdicts.Of(task, new RunRequest { Script = new InputText("", "", "") }, work);
        Assert.Equal(TruthLabel.Bound, bounded.Failure.Label);
        Assert.InRange(exact.Failure.Value, bounded.Failure.Low, bounded.Failure.High);
        Assert.InRange(exact.Success.Value, bounded.Success.Low, bounded.Success.High);
        Assert.InRange(bounded.Failure.High - bounded.Failure.Low, 1e-15, 1e-2);
        Assert.Equal(bounded.Failure.High, bounded.Failure.Value);
        Assert.Contains("which bounds every figure", bounded.Method, StringComparison.Ordinal);
    }

    private static double Compute(TableRow row)
    {
        int copies = (int)row.Number("M", 0);
        int[] attack = [.. row.Parameters["attack"].Split(',', StringSplitOptions.RemoveEmptyEntries).Select(n => int.Parse(n, CultureInfo.InvariantCulture))];
        ListTask task = Task(row.Name, copies, row.Number("p", 0));
        int[] choices = row.Kind.StartsWith('s') ? [.. attack, copies * 42 / 100] : attack;
        if (row.Kind != "honest")
            task = task with { Case = task.Protocol.Dishonest.Single(d => d.Name.EndsWith(row.Kind, StringComparison.Ordinal)), Choices = [.. choices.Select(Value.Of)], HoldsEnough = true };
        ListOutcome outcome = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken);
        Assert.True(outcome.Evaluation is not null, outcome.Refusal);
        return row.Kind == "honest" ? outcome.Evaluation.Failure.Value : outcome.Evaluation.Harm.Value;
    }

    private static ListTask Task(string name, int copies, double p)
    {
        Protocol protocol = TestScripts.Bind(ProtocolLibrary.ProtocolLibraryTests.Text(name + ".protocol"), ("M", copies));
        return new ListTask
        {
            Protocol = protocol,
            Copies = [.. Copies.Depolarised(p, p, p).Select(c => c with { Slots = [.. protocol.Slots.Take(protocol.Lists!.CopySlots).Select(s => c.Slots[s.Party])] })],
            Inputs = [Value.Of(0)],
        };
    }
}
