using System.Globalization;
using System.Numerics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>A task in flat form with all that its runs have in common, whatever numbers a cheat chooses. May be run from several threads.</summary>
internal sealed class ListProgram
{
    private readonly ListTask _task;

    private ListProgram(ListTask task, ListContext context)
    {
        _task = task;
        Context = context;
        Plans = new CountingPlans(context);
    }

    public ListContext Context { get; }

    public CountingPlans Plans { get; }

    /// <summary>The program of a task; the task's choices do not matter.</summary>
    public static ListProgram Of(ListTask task)
    {
        if (task.Lists.Copies is < 0 or > CountTable.LargestCount)
            throw new ListRefusalException(string.Create(CultureInfo.InvariantCulture, $"Too much work: {task.Lists.Copies} copies are more than the {CountTable.LargestCount} that can be counted."));
        return new ListProgram(task, new ListContext(task, ListCompiler.Compile(task)));
    }

    /// <summary>A structure at the start.</summary>
    public ListStructure Start(IReadOnlyList<Value> choices, params Cell[] cells) => new(Context.Start(choices), new BigInteger[]?[Context.Code.Slots], cells, 0);

    /// <summary>Verdicts at given numbers.</summary>
    public ListEvaluation Evaluate(IReadOnlyList<Value> choices, ListLimits limits, CancellationToken cancellation)
    {
        Meter meter = new(limits, cancellation);
        return Run(choices, meter).ToEvaluation(_task, meter);
    }

    /// <summary>What an attack does, and what of its own list it takes.</summary>
    public Attack Attack(int[] point, IReadOnlyList<Value> choices, ListLimits limits, CancellationToken cancellation)
    {
        Meter meter = new(limits, cancellation);
        double harm = Run(choices, meter).Harm;
        Dictionary<BigInteger, int>? needs = meter.CountedPool ? null
            : meter.Needs.GroupBy(n => n.Key.Types).ToDictionary(g => g.Key, g => g.Sum(n => n.Value));
        return new Attack(point, harm, needs);
    }

    private Verdicts Run(IReadOnlyList<Value> choices, Meter meter)
    {
        Counter counter = new(this, choices, meter);
        CountTable start = new(1);
        start.Add([(ushort)_task.Lists.Copies], 1);
        counter.Deposit(0, Start(choices, new Cell(Context.All, _task.HoldsEnough, BigInteger.Zero)), start);
        counter.RunTo(Context.Code.Operations.Count);
        return Verdicts.Of(Context, counter);
    }
}
