using System.Globalization;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Lists;

/// <summary>Every row of tests/reference/lists.csv, which tests/reference/lists.py computes without the engine's methods.</summary>
public sealed class ListTableTests
{
    private const double RelativeTolerance = 1e-9;

    [Fact]
    public void Counting_reproduces_every_row()
    {
        IReadOnlyList<TableRow> rows = TableRow.Of("lists");
        Assert.NotEmpty(rows);
        List<string> off = [.. rows.Select(r => (Row: r, Value: Compute(r))).Where(p => !(Math.Abs(p.Value - p.Row.Value) <= RelativeTolerance * p.Row.Value))
            .Select(p => $"{p.Row} {string.Join(';', p.Row.Parameters)}: {p.Value:R} for {p.Row.Value:R}")];
        Assert.True(off.Count == 0, string.Join('\n', off));
    }

    private static double Compute(TableRow row)
    {
        double p = row.Number("p", 0);
        int copies = (int)row.Number("M", 0);
        int[] attack = [.. row.Parameters["attack"].Split(',', StringSplitOptions.RemoveEmptyEntries).Select(n => int.Parse(n, CultureInfo.InvariantCulture))];
        IReadOnlyList<CopyType> law = Copies.Depolarised(p, p, p);
        int second = copies * 42 / 100;
        ListTask task = (row.Name, row.Kind) switch
        {
            ("detectable-broadcast", "honest") => Broadcast.Honest(copies, law),
            ("detectable-broadcast", "forges") => Broadcast.Forger(copies, law, attack[0]),
            ("detectable-broadcast", _) => Broadcast.Splitter(copies, law, true, [.. attack, second]),
            (_, "honest") => Liar.Honest(copies, law),
            (_, "sender lies") => Liar.SenderLies(copies, law, [.. attack, second]),
            _ => Liar.ForwarderLies(copies, law, attack),
        };
        ListOutcome outcome = CountingEngine.Evaluate(task, TestContext.Current.CancellationToken);
        Assert.True(outcome.Evaluation is not null, outcome.Refusal);
        return row.Kind == "honest" ? outcome.Evaluation.Failure.Value : outcome.Evaluation.Harm.Value;
    }
}
