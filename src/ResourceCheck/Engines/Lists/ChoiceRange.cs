using System.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>Whole numbers that stand for the values of a choice, and the range that its other choices leave it.</summary>
internal sealed class ChoiceRange
{
    /// <summary>Values tried of a choice that need not be whole.</summary>
    private const int RealSteps = 240;

    private readonly Choice _choice;
    private readonly int _levels;
    private readonly Rational _from;
    private readonly Rational _step;

    /// <summary>The range of a choice; where it depends on other choices or on the list, the widest one.</summary>
    public ChoiceRange(Choice choice, int copies, int levels)
    {
        _choice = choice;
        _levels = levels;
        Rational from = Bound(choice.From, []) ?? 0, to = Bound(choice.To, []) ?? copies;
        _from = choice.Whole ? 0 : from;
        _step = choice.Whole ? 1 : (to - from) / RealSteps;
        First = choice.Whole ? Clamped(from.Ceiling()) : 0;
        Last = choice.Whole ? Clamped(to.Floor()) : RealSteps;
        if (from >= to && !choice.Whole)
            Last = from == to ? 0 : -1;
    }

    /// <summary>Number that stands for the least value.</summary>
    public int First { get; }

    /// <summary>Number that stands for the greatest value.</summary>
    public int Last { get; }

    /// <summary>The value that a number stands for.</summary>
    public Value At(int index) => new NumberValue(_from + (_step * index));

    /// <summary>Whether a value is within the range that the other choices leave; what depends on the list does not limit it, draws take all when asked for more.</summary>
    public bool Allows(Value value, IReadOnlyList<Value> choices) => value is NumberValue number
        && !(Bound(_choice.From, choices) is { } from && number.Number < from)
        && !(Bound(_choice.To, choices) is { } to && number.Number > to);

    private Rational? Bound(BoundExpression expression, IReadOnlyList<Value> choices)
    {
        bool known = BoundWalk.Within(expression).All(p => p is not (BoundSlot or BoundSize or BoundTally or BoundWhere or BoundSome) && (p is not BoundChoice choice || choice.Choice < choices.Count));
        return known && ValueEvaluator.Evaluate(BoundWalk.Put(expression, choices), [], _levels) is NumberValue number ? number.Number : null;
    }

    private static int Clamped(BigInteger number) => (int)BigInteger.Min(BigInteger.Max(number, -CountTable.LargestCount), CountTable.LargestCount);
}
