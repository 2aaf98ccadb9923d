using System.Numerics;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// One run of the protocol as it is written, on positions one by one. It shares nothing with the evaluation by counting but the
/// meaning of single values and the kinds of slots, so that each can be held against the other.
/// </summary>
internal sealed class LiteralRun
{
    private readonly ListTask _task;
    private readonly IChance _chance;
    private readonly int[] _types;
    private readonly Value[] _single;
    private readonly bool[]?[] _sets;
    private readonly SetKinds _kinds;
    private ulong _aborted;

    private LiteralRun(ListTask task, IChance chance)
    {
        _task = task;
        _chance = chance;
        _kinds = new SetKinds(task.Steps);
        _single = new Value[task.Protocol.Slots.Count];
        _sets = new bool[]?[task.Protocol.Slots.Count];
        Array.Fill(_single, Value.None);
        for (int i = 0; i < task.Inputs.Count; i++)
            _single[task.Protocol.Inputs[i].Slot] = task.Inputs[i];
        double[] weights = [.. task.Copies.Select(c => c.Probability)];
        _types = new int[task.Lists.Copies];
        for (int position = 0; position < _types.Length; position++)
            _types[position] = chance.Pick(weights);
    }

    /// <summary>Runs the protocol once.</summary>
    public static (bool Success, bool Abort, bool Harm) Run(ListTask task, IChance chance)
    {
        LiteralRun run = new(task, chance);
        run.Do(task.Steps);
        bool success = run._aborted == 0 && IsTrue(run.Single(task.Protocol.Success));
        return (success, run._aborted != 0, task.Case is { } cheat && IsTrue(run.Single(cheat.Harm)));
    }

    private static bool IsTrue(Value? value) => value is TruthValue { Truth: true };

    private void Do(IReadOnlyList<Step> steps)
    {
        foreach (Step step in steps)
        {
            switch (step)
            {
                case SetStep set:
                    Store(set.Party, set.Slot, set.Value);
                    break;
                case SendStep send:
                    Store(send.Party, send.Slot, send.Value);
                    break;
                case AbortStep abort when IsTrue(Single(abort.Condition)):
                    _aborted |= 1UL << abort.Party;
                    break;
                case WhenStep block:
                    Do(IsTrue(Single(block.Condition)) ? block.Then : block.Otherwise);
                    break;
            }
        }
    }

    private void Store(int party, int slot, BoundExpression expression)
    {
        bool gone = (_aborted & (1UL << party)) != 0, isSet = _kinds.IsSet(expression);
        bool[]? set = isSet ? Set(expression) : null;
        Value single = isSet ? Value.None : Single(expression);
        _sets[slot] = gone ? null : set;
        _single[slot] = gone ? Value.None : single;
    }

    /// <summary>A single value: counts are put in as literals, the rest is left to the evaluator of single values.</summary>
    private Value Single(BoundExpression expression) => ValueEvaluator.Evaluate(Counted(expression), _single, _task.Protocol.Levels);

    private BoundExpression Counted(BoundExpression expression)
    {
        switch (expression)
        {
            case BoundChoice choice:
                return Literal(_task.Choices[choice.Choice]);
            case BoundSize size:
                return Literal(Set(size.Set) is { } sized ? Value.Of(sized.Count(m => m)) : Value.None);
            case BoundTally tally:
                return Tally(tally);
            case BoundBinary { Operator: BinaryOperator.Equal or BinaryOperator.Unequal } binary when _kinds.IsSet(binary.Left) || _kinds.IsSet(binary.Right):
                return Literal(Value.Of(Equal(Set(binary.Left), Set(binary.Right)) == (binary.Operator == BinaryOperator.Equal)));
            case BoundBinary binary:
                return binary with { Left = Counted(binary.Left), Right = Counted(binary.Right) };
            case BoundUnary unary:
                return unary with { Operand = Counted(unary.Operand) };
            case BoundIf choice:
                return new BoundIf(choice.Span, Counted(choice.Condition), Counted(choice.Then), Counted(choice.Else));
            case BoundCall call:
                return call with { Arguments = [.. call.Arguments.Select(Counted)] };
            default:
                return expression;
        }
    }

    private static bool Equal(bool[]? left, bool[]? right) => left is null || right is null ? left is null && right is null : left.SequenceEqual(right);

    private static BoundLiteral Literal(Value value) => new(default, value);

    private BoundLiteral Tally(BoundTally tally)
    {
        if (Set(tally.Set) is not { } set)
            return Literal(Value.None);
        bool[] where = Where(tally.Predicate);
        int size = set.Count(m => m), count = set.Zip(where).Count(m => m.First && m.Second);
        if (!tally.IsShare)
            return Literal(Value.Of(count));
        return Literal(size == 0 ? Value.None : new NumberValue(Quantities.Rational.From(count, size)));
    }

    private bool[]? Set(BoundExpression expression)
    {
        switch (expression)
        {
            case BoundWhere where:
                return Where(where.Predicate);
            case BoundSome some:
                return Some(Set(some.Set), Single(some.Count));
            case BoundSlot slot:
                return _sets[slot.Slot];
            case BoundIf choice:
                bool[]? then = Set(choice.Then), otherwise = Set(choice.Else);
                return IsTrue(Single(choice.Condition)) ? then : otherwise;
            case BoundBinary binary:
                bool[]? left = Set(binary.Left), right = Set(binary.Right);
                return left is null || right is null ? null : [.. left.Zip(right, (l, r) => Member(binary.Operator, l, r))];
            default:
                return null;
        }
    }

    private static bool Member(BinaryOperator op, bool left, bool right) => op switch
    {
        BinaryOperator.And => left && right,
        BinaryOperator.Or => left || right,
        _ => left && !right,
    };

    private bool[] Where(BoundExpression predicate)
    {
        BoundExpression counted = Counted(predicate);
        bool?[] known = new bool?[_task.Copies.Count];
        return [.. _types.Select(t => known[t] ??= Holds(counted, t))];
    }

    private bool Holds(BoundExpression predicate, int type)
    {
        Value[] slots = [.. _single];
        for (int slot = 0; slot < _task.Lists.CopySlots; slot++)
        {
            if (_task.IsPerCopy(slot))
                slots[slot] = _task.Copies[type].Slots[slot];
        }

        return IsTrue(ValueEvaluator.Evaluate(predicate, slots, _task.Protocol.Levels));
    }

    /// <summary>Goes through the set once; a member is taken with the chance that as many of those left are still wanted.</summary>
    private bool[]? Some(bool[]? set, Value count)
    {
        if (set is null || count is not NumberValue number)
            return null;
        int left = set.Count(m => m);
        int wanted = (int)BigInteger.Min(BigInteger.Max(number.Number.Floor(), 0), left);
        bool[] drawn = new bool[set.Length];
        for (int position = 0; position < set.Length; position++)
        {
            if (!set[position])
                continue;
            bool taken = wanted > 0 && (wanted == left || _chance.Pick([wanted, left - wanted]) == 0);
            drawn[position] = taken;
            wanted -= taken ? 1 : 0;
            left--;
        }

        return drawn;
    }
}
