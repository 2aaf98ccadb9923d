using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Brings the steps of the discussions into flat form: draws and counts leave the expressions in the order of evaluation, so that
/// each operation counts positions at most once, all its counts together.
/// </summary>
internal sealed class ListCompiler
{
    private readonly ListTask _task;
    private readonly SetKinds _kinds;
    private readonly List<ListOperation> _operations = [];
    private readonly int _choices;
    private int _slots;
    private int _party;

    private ListCompiler(ListTask task)
    {
        _task = task;
        _kinds = new SetKinds(task.Steps);
        _choices = task.Protocol.Slots.Count;
        _slots = _choices + (task.Case?.Choices.Count ?? 0);
    }

    /// <summary>The flat form of a task's discussions.</summary>
    public static ListCode Compile(ListTask task)
    {
        ListCompiler compiler = new(task);
        compiler.Add(task.Steps);
        int success = compiler._slots++, harm = compiler._slots++;
        compiler._party = -1;
        compiler.Assign(success, task.Protocol.Success);
        compiler.Assign(harm, task.Case?.Harm ?? new BoundLiteral(default, Value.False));
        bool[] isSet = [.. Enumerable.Range(0, compiler._slots).Select(compiler._kinds.IsSet)];
        return new ListCode(compiler._operations, compiler._slots, isSet, success, harm)
        {
            FirstChoice = compiler._choices,
            ChoicesOnlySizeDraws = compiler.ChoicesOnlySizeDraws(),
            Live = Liveness.Of(compiler._operations, compiler._slots, success, harm),
        };
    }

    /// <summary>Whether the cheat's numbers say only how many positions are drawn, so that they change no set's definition.</summary>
    private bool ChoicesOnlySizeDraws() => !_operations
        .SelectMany(o => o is DrawOperation draw ? Reads.Slots(draw.Set).Concat(draw.Count.Statistics.SelectMany(s => Reads.Slots(new Reading([s], s.Set)))) : Reads.Slots(o))
        .Any(slot => slot >= _choices && slot < _choices + (_task.Case?.Choices.Count ?? 0));

    private void Add(IReadOnlyList<Step> steps)
    {
        foreach (Step step in steps)
            Add(step);
    }

    private void Add(Step step)
    {
        switch (step)
        {
            case SetStep set:
                Make(set.Party, set.Slot, set.Value);
                break;
            case SendStep send:
                Make(send.Party, send.Slot, send.Value);
                break;
            case AbortStep abort:
                _party = abort.Party;
                _operations.Add(new AbortOperation(abort.Party, Read(abort.Condition)));
                break;
            case WhenStep block:
                When(block);
                break;
            default:
                throw new ListRefusalException($"A discussion cannot hold {step.GetType().Name}.");
        }
    }

    private void Make(int party, int slot, BoundExpression value)
    {
        _party = party;
        Assign(slot, value);
    }

    private void Assign(int slot, BoundExpression value)
    {
        if (_kinds.IsSet(value))
            _operations.Add(new AssignSetOperation(_party, slot, Set(value)));
        else
            _operations.Add(new AssignOperation(_party, slot, Read(value)));
    }

    private void When(WhenStep block)
    {
        _party = -1;
        int branch = _operations.Count;
        Reading condition = Read(block.Condition);
        branch = _operations.Count;
        _operations.Add(new JumpOperation(0));
        Add(block.Then);
        int jump = _operations.Count;
        _operations.Add(new JumpOperation(0));
        _operations[branch] = new BranchOperation(condition, _operations.Count);
        Add(block.Otherwise);
        _operations[jump] = new JumpOperation(_operations.Count);
    }

    /// <summary>An expression of single values with its counts taken out.</summary>
    private Reading Read(BoundExpression expression)
    {
        List<Statistic> statistics = [];
        BoundExpression residual = Single(expression, statistics);
        return new Reading(statistics, residual);
    }

    private BoundExpression Single(BoundExpression expression, List<Statistic> statistics)
    {
        switch (expression)
        {
            case BoundChoice choice:
                return new BoundSlot(choice.Span, _choices + choice.Choice);
            case BoundSize size:
                return Count(new Statistic(StatisticKind.Size, Set(size.Set), null, _slots++), statistics);
            case BoundTally tally:
                return Tally(tally, statistics);
            case BoundBinary { Operator: BinaryOperator.Equal or BinaryOperator.Unequal } binary when _kinds.IsSet(binary.Left) || _kinds.IsSet(binary.Right):
                BoundExpression mismatch = Count(new Statistic(StatisticKind.Mismatch, Set(binary.Left), Set(binary.Right), _slots++), statistics);
                return new BoundBinary(binary.Span, binary.Operator, mismatch, new BoundLiteral(binary.Span, Value.Of(0)));
            case BoundBinary binary:
                return Folded(binary with { Left = Single(binary.Left, statistics), Right = Single(binary.Right, statistics) });
            case BoundUnary unary:
                return unary with { Operand = Single(unary.Operand, statistics) };
            case BoundIf choice:
                return new BoundIf(choice.Span, Single(choice.Condition, statistics), Single(choice.Then, statistics), Single(choice.Else, statistics));
            case BoundCall call when call.Arguments.Any(_kinds.IsSet):
                throw new ListRefusalException("Sets of positions are compared by = and != only.");
            case BoundCall call:
                return call with { Arguments = [.. call.Arguments.Select(a => Single(a, statistics))] };
            case BoundWhere or BoundSome:
                throw new ListRefusalException("A set of positions stands where a single value belongs.");
            default:
                return expression;
        }
    }

    /// <summary>Products such as <c>a * M</c> are worked out once instead of in every state.</summary>
    private static BoundExpression Folded(BoundBinary binary) => binary is { Left: BoundLiteral, Right: BoundLiteral }
        ? new BoundLiteral(binary.Span, ValueEvaluator.Evaluate(binary, [], 0))
        : binary;

    private BoundExpression Tally(BoundTally tally, List<Statistic> statistics)
    {
        BoundExpression set = Set(tally.Set);
        BoundExpression count = Count(new Statistic(StatisticKind.Tally, set, Predicate(tally.Predicate), _slots++), statistics);
        if (!tally.IsShare)
            return count;
        BoundExpression size = Count(new Statistic(StatisticKind.Size, set, null, _slots++), statistics);
        return new BoundBinary(tally.Span, BinaryOperator.Divide, count, size);
    }

    private static BoundSlot Count(Statistic statistic, List<Statistic> statistics)
    {
        int same = statistics.FindIndex(s => s with { Temporary = statistic.Temporary } == statistic);
        if (same < 0)
            statistics.Add(statistic);
        return new BoundSlot(default, same < 0 ? statistic.Temporary : statistics[same].Temporary);
    }

    /// <summary>A set expression without draws: each draw becomes an operation of its own before this one.</summary>
    private BoundExpression Set(BoundExpression expression)
    {
        switch (expression)
        {
            case BoundWhere where:
                return where with { Predicate = Predicate(where.Predicate) };
            case BoundSome some:
                BoundExpression source = Set(some.Set);
                Reading count = Read(some.Count);
                int drawn = NewSet();
                _operations.Add(new DrawOperation(_party, drawn, count, source, _task.HoldsEnough && _task.Cheats(_party)));
                return new BoundSlot(some.Span, drawn);
            case BoundBinary { Operator: BinaryOperator.And or BinaryOperator.Or or BinaryOperator.Without } binary:
                return binary with { Left = Set(binary.Left), Right = Set(binary.Right) };
            case BoundIf choice:
                return new BoundIf(choice.Span, Settled(choice.Condition), Set(choice.Then), Set(choice.Else));
            default:
                return expression;
        }
    }

    private int NewSet()
    {
        _kinds.Add(_slots);
        return _slots++;
    }

    private BoundExpression Predicate(BoundExpression predicate) => Settled(predicate);

    /// <summary>An expression without counts; counts are worked out beforehand into a slot.</summary>
    private BoundExpression Settled(BoundExpression expression)
    {
        List<Statistic> statistics = [];
        BoundExpression residual = Single(expression, statistics);
        if (statistics.Count == 0)
            return residual;
        foreach (Statistic statistic in statistics)
            _operations.Add(new AssignOperation(_party, statistic.Temporary, new Reading([statistic], new BoundSlot(default, statistic.Temporary))));
        return residual;
    }
}
