using System.Numerics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Runs a list protocol on tables of counts. Positions are exchangeable: given the counts of the cells, types within each are
/// independent. An operation that counts splits cells binomially, a draw splits them by the hypergeometric law, and tables of
/// structures that later operations cannot tell apart are added up.
/// </summary>
internal sealed class Counter(ListProgram program, IReadOnlyList<Value> choices, Meter meter)
{
    private readonly SortedDictionary<int, Dictionary<string, (ListStructure Structure, CountTable Table)>> _pending = [];
    private readonly ListContext _context = program.Context;

    /// <summary>All states that wait at operations not run yet.</summary>
    public IEnumerable<(int At, ListStructure Structure, CountTable Table)> Waiting =>
        _pending.SelectMany(p => p.Value.Values.Select(g => (p.Key, g.Structure, g.Table)));

    /// <summary>Takes in states that wait at an operation.</summary>
    public void Deposit(int at, ListStructure structure, CountTable table)
    {
        ReductionPlan plan = program.Plans.Reduction(at, structure);
        Add(at, plan, Splitter.Split(plan.Refinement, table, meter));
    }

    /// <summary>Runs all operations before one.</summary>
    public void RunTo(int end)
    {
        while (_pending.Count > 0 && _pending.First() is { Key: int at, Value: { } groups } && at < end)
        {
            _pending.Remove(at);
            foreach ((ListStructure structure, CountTable table) in groups.Values)
                Run(at, structure, table);
        }
    }

    private void Add(int at, ReductionPlan plan, CountTable table)
    {
        if (!_pending.TryGetValue(at, out Dictionary<string, (ListStructure, CountTable)>? groups))
            _pending[at] = groups = [];
        int cells = plan.Order.Length;
        if (!groups.TryGetValue(plan.Structure.Key, out (ListStructure Structure, CountTable Table) group))
            groups[plan.Structure.Key] = group = (plan.Structure, new CountTable(cells));
        ushort[] key = new ushort[group.Table.Width];
        for (int entry = 0; entry < table.Count; entry++)
        {
            ReadOnlySpan<ushort> from = table.Key(entry);
            for (int cell = 0; cell < cells; cell++)
                key[cell] = from[plan.Order[cell]];
            group.Table.Add(key, table.Weight(entry));
        }
    }

    private void Run(int at, ListStructure structure, CountTable table)
    {
        switch (_context.Code.Operations[at])
        {
            case AssignOperation assign when structure.HasAborted(assign.Party):
                Deposit(at + 1, structure.With(assign.Slot, Value.None), table);
                break;
            case AssignOperation assign:
                foreach ((Value value, ListStructure next, CountTable counts) in Read(at, assign.Value, structure, table, () => Foresight.Classes(_context, structure, at + 1, open: assign.Slot)))
                    Deposit(at + 1, next.With(assign.Slot, value), counts);
                break;
            case AssignSetOperation assign:
                Deposit(at + 1, structure.With(assign.Slot, structure.HasAborted(assign.Party) ? null : _context.Set(assign.Set, structure)), table);
                break;
            case DrawOperation draw:
                Draw(at, draw, structure, table);
                break;
            case AbortOperation abort:
                foreach ((Value value, ListStructure next, CountTable counts) in Read(at, abort.Condition, structure, table, () => Foresight.Classes(_context, structure, at + 1, abortOpen: abort.Party)))
                    Deposit(at + 1, value is TruthValue { Truth: true } ? next.WithAborted(abort.Party) : next, counts);
                break;
            case BranchOperation branch:
                foreach ((Value value, ListStructure next, CountTable counts) in Read(at, branch.Condition, structure, table, () => Foresight.Classes(_context, structure, at + 1, branch.Otherwise)))
                    Deposit(value is TruthValue { Truth: true } ? at + 1 : branch.Otherwise, next, counts);
                break;
            case JumpOperation jump:
                Deposit(jump.Target, structure, table);
                break;
        }
    }

    /// <summary>Values of an expression with the states in which it has them.</summary>
    private IEnumerable<(Value Value, ListStructure Structure, CountTable Table)> Read(int at, Reading reading, ListStructure structure, CountTable table, Func<int[][]> classes)
    {
        ReadingPlan plan = program.Plans.Reading(at, structure, reading, null, classes);
        CountTable split = Split(plan, table);
        return plan.Counted.Sorted(split, choices).Select(p => (p.Value, plan.Refinement.After, p.Table));
    }

    private void Draw(int at, DrawOperation draw, ListStructure structure, CountTable table)
    {
        BigInteger[]? source = _context.Set(draw.Set, structure);
        if (source is null || structure.HasAborted(draw.Party))
        {
            Deposit(at + 1, structure.With(draw.Slot, (BigInteger[]?)null), table);
            return;
        }

        bool pooled = draw.AlwaysFull && structure.Cells.Where((c, i) => c.IsPool && !source[i].IsZero).Any();
        ReadingPlan plan = program.Plans.Reading(at, structure, draw.Count, pooled ? null : source, () => Foresight.Classes(_context, structure, at));
        ListStructure next = plan.Refinement.After;
        foreach ((Value value, CountTable part) in plan.Counted.Sorted(Split(plan, table), choices))
        {
            if (value is not NumberValue number)
            {
                Deposit(at + 1, next.With(draw.Slot, (BigInteger[]?)null), part);
                continue;
            }

            BigInteger[] set = _context.Set(draw.Set, next)!;
            if (pooled)
                meter.Need(at, set.Aggregate(BigInteger.Zero, (all, types) => all | types), Positions(number));
            (ListStructure drawn, CountTable counts) = Drawing.Draw(next, part, set, draw.Slot, Positions(number), pooled, meter);
            Deposit(at + 1, drawn, counts);
        }
    }

    private CountTable Split(ReadingPlan plan, CountTable table)
    {
        meter.CountedPool |= plan.Refinement.CountsPool;
        return Splitter.Split(plan.Refinement, table, meter);
    }

    private static int Positions(NumberValue number) => (int)BigInteger.Min(BigInteger.Max(number.Number.Floor(), 0), CountTable.LargestCount);
}
