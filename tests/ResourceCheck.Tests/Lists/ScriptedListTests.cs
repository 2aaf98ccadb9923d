using System.Globalization;
using ResourceCheck.Engines.Lists;
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
