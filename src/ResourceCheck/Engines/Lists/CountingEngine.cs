using System.Globalization;
using System.Numerics;
using ResourceCheck.Numerics.Counting;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Exact verdicts of a list protocol from the law of a single copy.</summary>
public static class CountingEngine
{
    /// <summary>Evaluates a task, or says why it cannot be done by counting.</summary>
    /// <param name="task">What is asked.</param>
    /// <param name="cancellation">Stops the evaluation.</param>
    public static ListOutcome Evaluate(ListTask task, CancellationToken cancellation)
    {
        try
        {
            return new ListOutcome(Counted(task, cancellation), null);
        }
        catch (ListRefusalException refusal)
        {
            return new ListOutcome(null, refusal.Message);
        }
    }

    private static ListEvaluation Counted(ListTask task, CancellationToken cancellation)
    {
        RequireCopies(task.Lists.Copies);
        ListCode code = ListCompiler.Compile(task);
        ListContext context = new(task, code);
        Meter meter = new(task.Limits, cancellation);
        Counter counter = new(context, meter, 0);
        CountTable start = new(1);
        start.Add([(ushort)task.Lists.Copies], 1);
        counter.Deposit(0, Start(context, [new Cell(context.All, task.HoldsEnough, BigInteger.Zero)]), start);
        counter.RunTo(code.Operations.Count);
        return Verdicts.Of(context, counter).ToEvaluation(task, meter);
    }

    internal static ListStructure Start(ListContext context, Cell[] cells) => new(context.Start(), new BigInteger[]?[context.Code.Slots], cells, 0);

    internal static void RequireCopies(int copies)
    {
        if (copies is < 0 or > CountTable.LargestCount)
            throw new ListRefusalException(string.Create(CultureInfo.InvariantCulture, $"Too much work: {copies} copies are more than the {CountTable.LargestCount} that can be counted."));
    }
}
