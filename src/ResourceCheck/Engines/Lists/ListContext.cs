using System.Numerics;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Lists;

/// <summary>A task's types of copies and the evaluation of expressions in a structure.</summary>
internal sealed class ListContext
{
    private readonly int _levels;
    private readonly Value[][] _types;

    public ListContext(ListTask task, ListCode code)
    {
        Task = task;
        Code = code;
        _levels = task.Protocol.Levels;
        (_types, Weights) = Merged(task, code);
        All = (BigInteger.One << _types.Length) - 1;
    }

    public ListTask Task { get; }

    public ListCode Code { get; }

    /// <summary>Probability of each type.</summary>
    public double[] Weights { get; }

    /// <summary>The set of all types.</summary>
    public BigInteger All { get; }

    public int Types => _types.Length;

    /// <summary>Content of a per-copy slot in a type.</summary>
    public Value Content(int type, int slot) => _types[type][slot];

    /// <summary>Probability of a set of types.</summary>
    public double Weight(BigInteger types)
    {
        double weight = 0;
        for (int type = 0; type < Weights.Length; type++)
            weight += Has(types, type) ? Weights[type] : 0;
        return weight;
    }

    public static bool Has(BigInteger types, int type) => !((types >> type) & 1).IsZero;

    /// <summary>Single values at the start: private inputs.</summary>
    public Value[] Start(IReadOnlyList<Value> choices)
    {
        Value[] single = new Value[Code.Slots];
        Array.Fill(single, Value.None);
        for (int i = 0; i < Task.Inputs.Count; i++)
            single[Task.Protocol.Inputs[i].Slot] = Task.Inputs[i];
        return Code.ChoicesOnlySizeDraws ? single : WithChoices(single, choices);
    }

    /// <summary>Whether a slot's content is not part of a structure: a number of the cheat that only sizes draws.</summary>
    public bool IsOutside(int slot) => Code.ChoicesOnlySizeDraws && slot >= Code.FirstChoice && slot < Code.FirstChoice + (Task.Case?.Choices.Count ?? 0);

    /// <summary>Slots with the cheat's numbers put in.</summary>
    public Value[] WithChoices(Value[] single, IReadOnlyList<Value> choices)
    {
        Value[] all = [.. single];
        for (int i = 0; i < choices.Count; i++)
            all[Code.FirstChoice + i] = choices[i];
        return all;
    }

    public Value Evaluate(BoundExpression expression, Value[] slots) => ValueEvaluator.Evaluate(expression, slots, _levels);

    /// <summary>Member types of each cell; null for none.</summary>
    public BigInteger[]? Set(BoundExpression expression, ListStructure structure)
    {
        switch (expression)
        {
            case BoundWhere where:
                BigInteger types = Where(where.Predicate, structure.Single);
                return [.. structure.Cells.Select(c => c.Types & types)];
            case BoundSlot slot:
                return structure.Sets[slot.Slot];
            case BoundIf choice:
                bool holds = Evaluate(choice.Condition, structure.Single) is TruthValue { Truth: true };
                return Set(holds ? choice.Then : choice.Else, structure);
            case BoundBinary binary when Set(binary.Left, structure) is { } left && Set(binary.Right, structure) is { } right:
                return [.. left.Zip(right, (l, r) => Combined(binary.Operator, l, r))];
            default:
                return null;
        }
    }

    /// <summary>Types at which a predicate holds.</summary>
    public BigInteger Where(BoundExpression predicate, Value[] single)
    {
        BigInteger types = BigInteger.Zero;
        for (int type = 0; type < _types.Length; type++)
        {
            if (Holds(predicate, single, type))
                types |= BigInteger.One << type;
        }

        return types;
    }

    public bool Holds(BoundExpression predicate, Value[] single, int type)
    {
        Value[] slots = [.. single];
        for (int slot = 0; slot < _types[type].Length; slot++)
        {
            if (Task.IsPerCopy(slot))
                slots[slot] = _types[type][slot];
        }

        return Evaluate(predicate, slots) is TruthValue { Truth: true };
    }

    private static BigInteger Combined(BinaryOperator op, BigInteger left, BigInteger right) => op switch
    {
        BinaryOperator.And => left & right,
        BinaryOperator.Or => left | right,
        BinaryOperator.Without => left & ~right,
        _ => throw new ListRefusalException($"Sets of positions cannot be combined by {op}."),
    };

    /// <summary>Copies that agree in all that the discussions read are one type; impossible ones are none.</summary>
    private static (Value[][] Types, double[] Weights) Merged(ListTask task, ListCode code)
    {
        int[] read = [.. code.Operations.SelectMany(Reads.Slots).Where(task.IsPerCopy).Distinct().Order()];
        Dictionary<string, int> index = [];
        List<Value[]> types = [];
        List<double> weights = [];
        foreach (CopyType copy in task.Copies.Where(c => c.Probability > 0))
        {
            string key = string.Join('|', read.Select(s => $"{copy.Slots[s].GetType().Name[0]}{copy.Slots[s]}"));
            if (!index.TryGetValue(key, out int type))
            {
                index[key] = type = types.Count;
                types.Add([.. copy.Slots.Take(task.Lists.CopySlots)]);
                weights.Add(0);
            }

            weights[type] += copy.Probability;
        }

        return ([.. types], [.. weights]);
    }
}
