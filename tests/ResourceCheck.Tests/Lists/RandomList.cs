using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using static ResourceCheck.Tests.Lists.Terms;

namespace ResourceCheck.Tests.Lists;

/// <summary>Random list programs: sets in slots 4 to 7, single values in slots 8 to 11, one cheat with two choices.</summary>
internal sealed class RandomList(int seed)
{
    private readonly Random _random = new(seed);
    private readonly HashSet<int> _made = [];
    private readonly bool _choicesEverywhere = seed % 2 == 0;

    public ListTask Task()
    {
        int copies = _random.Next(1, 7), types = copies > 4 ? 3 : 4;
        Step[] steps = [.. Steps(_random.Next(3, 8), 0)];
        Protocol protocol = Protocol(copies, 12, Verdict(copies), steps);
        return new ListTask
        {
            Protocol = protocol,
            Copies = [.. Enumerable.Range(0, types).Select(_ => new CopyType([.. Enumerable.Range(0, 3).Select(_ => Level())], _random.Next(1, 9) / 16.0))],
            Inputs = [Value.Of(_random.Next(2))],
            Case = new DishonestCase("cheat", [0], [new Choice("c0", Of(0), Of(4), true), new Choice("c1", Of(0), Of(4), true)], [], steps, Verdict(copies)),
            Choices = [Value.Of(_random.Next(4)), Value.Of(_random.Next(3))],
        };
    }

    /// <summary>A comparison of counts, so that most verdicts are open, with anything.</summary>
    private BoundExpression Verdict(int copies)
    {
        BoundExpression counted = Binary(Pick(BinaryOperator.Less, BinaryOperator.GreaterOrEqual, BinaryOperator.Equal), Size(SetOf(2)), Of(_random.Next(1, copies + 1)));
        return _random.Next(3) switch { 0 => counted, 1 => And(counted, Condition(2)), _ => Or(counted, Condition(2)) };
    }

    private Value Level() => _random.Next(8) == 0 ? Value.None : Value.Of(_random.Next(3));

    private IEnumerable<Step> Steps(int count, int depth)
    {
        for (int i = 0; i < count; i++)
            yield return Step(depth);
    }

    private Step Step(int depth)
    {
        int party = _random.Next(3);
        switch (_random.Next(depth > 1 ? 6 : 8))
        {
            case 0 or 1 or 2:
                int set = _random.Next(4, 8);
                BoundExpression value = SetOf(2);
                _made.Add(set);
                return Set(party, set, value);
            case 3 or 4:
                return Send(party, _random.Next(8, 12), Single(2));
            case 5:
                return _random.Next(2) == 0 ? Abort(party, Condition(1)) : Set(party, _random.Next(8, 12), Condition(2));
            default:
                return When(Condition(1), [.. Steps(_random.Next(1, 4), depth + 1)], [.. Steps(_random.Next(3), depth + 1)]);
        }
    }

    private BoundExpression SetOf(int depth) => _random.Next(depth <= 0 ? 2 : 7) switch
    {
        0 => Where(Predicate()),
        1 => _made.Count == 0 ? Where(Predicate()) : Slot(_made.ElementAt(_random.Next(_made.Count))),
        2 or 3 => Some(_random.Next(3) == 0 ? Choice(_random.Next(2)) : Single(1), SetOf(depth - 1)),
        4 => And(SetOf(depth - 1), SetOf(depth - 1)),
        5 => _random.Next(4) == 0 ? If(Condition(1), SetOf(depth - 1), SetOf(depth - 1)) : Or(SetOf(depth - 1), SetOf(depth - 1)),
        _ => Without(SetOf(depth - 1), SetOf(depth - 1)),
    };

    private BoundExpression Predicate()
    {
        BoundExpression simple = Binary(Pick(BinaryOperator.Equal, BinaryOperator.Unequal, BinaryOperator.Less), Slot(_random.Next(3)), Small());
        return _random.Next(4) == 0 ? Or(simple, Same(Slot(0), Slot(1))) : simple;
    }

    private BoundExpression Small() => _random.Next(4) switch
    {
        0 => Slot(3),
        1 => Slot(_random.Next(8, 12)),
        2 when _choicesEverywhere => Choice(_random.Next(2)),
        _ => Of(_random.Next(3)),
    };

    private BoundExpression Single(int depth) => _random.Next(depth <= 0 ? 2 : 7) switch
    {
        0 or 1 => Small(),
        2 or 6 => Size(SetOf(1)),
        3 => Count(Predicate(), SetOf(1)),
        4 => Binary(Pick(BinaryOperator.Plus, BinaryOperator.Minus, BinaryOperator.Times), Single(depth - 1), Single(depth - 1)),
        _ => If(Condition(depth - 1), Single(depth - 1), Single(depth - 1)),
    };

    private BoundExpression Condition(int depth) => _random.Next(depth <= 0 ? 2 : 6) switch
    {
        0 => Binary(Pick(BinaryOperator.Equal, BinaryOperator.Less, BinaryOperator.GreaterOrEqual), Single(1), Small()),
        1 => AtMost(Share(Predicate(), SetOf(1)), Of(Pick("0.25", "0.5", "0.75"))),
        2 => And(Condition(depth - 1), Condition(depth - 1)),
        3 => Or(Condition(depth - 1), Condition(depth - 1)),
        4 => new BoundUnary(default, UnaryOperator.Not, Condition(depth - 1)),
        _ => _random.Next(2) == 0 ? Same(SetOf(1), SetOf(1)) : AtLeast(Size(SetOf(2)), Small()),
    };

    private T Pick<T>(params T[] options) => options[_random.Next(options.Length)];
}
