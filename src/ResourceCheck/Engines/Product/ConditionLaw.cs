using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Product;

/// <summary>
/// Probability of a condition on open outcomes without listing strings. Conditions on one outcome exclude others; <c>distinct</c>, <c>same</c>,
/// <c>missing</c> of all but one and counts have sums of their own; what reads few outcomes is listed; <c>not</c>, <c>or</c> and <c>if</c> are taken
/// apart. Everything else is refused with the condition's place.
/// </summary>
internal sealed class ConditionLaw(Inlining inlining, int levels)
{
    /// <summary>Assignments of a few outcomes that may be listed, each with a sum of its own.</summary>
    private const int MostListed = 1024;

    /// <summary>Different counts in one condition: the law of r counts takes (N+1)^r sums.</summary>
    private const int MostCounts = 2;

    /// <summary>Probability that all conditions hold.</summary>
    public RoundedSum Probability(OpenLaw law, IEnumerable<BoundExpression> conditions)
    {
        List<BoundExpression> open = [];
        foreach (BoundExpression condition in conditions.SelectMany(Conjuncts))
        {
            if (condition is BoundLiteral literal)
            {
                if (literal.Value is not TruthValue { Truth: true })
                    return default;
                continue;
            }

            int[] slots = [.. BoundWalk.Slots(condition).Distinct()];
            if (slots.Length == 1)
                law = law.Where(slots[0], v => inlining.Evaluate(inlining.Settle(condition, slots[0], v)) is TruthValue { Truth: true });
            else
                open.Add(condition);
        }

        return open.Count switch
        {
            0 => law.Total,
            1 => Single(law, open[0]),
            _ => Counted(law, open) ?? Listed(law, open),
        };
    }

    /// <summary>All assignments of some slots with the probability that they come with the conditions.</summary>
    public IEnumerable<(IReadOnlyDictionary<int, Value> Values, RoundedSum Weight)> Joint(OpenLaw law, IReadOnlyList<int> slots, IReadOnlyList<BoundExpression> conditions)
    {
        if (slots.Count == 0)
            return [(new Dictionary<int, Value>(), Probability(law, conditions))];
        int first = slots[0];
        int[] rest = [.. slots.Skip(1)];
        return law.Outcomes(first).SelectMany(value =>
            Joint(law.Where(first, v => v.Equals(value)), rest, [.. conditions.Select(c => inlining.Settle(c, first, value))])
                .Select(found => ((IReadOnlyDictionary<int, Value>)new Dictionary<int, Value>(found.Values) { [first] = value }, found.Weight)));
    }

    /// <summary>Whether so few assignments of these slots exist that they may be listed.</summary>
    public static bool MayList(OpenLaw law, IEnumerable<int> slots) => slots.Aggregate(1.0, (product, s) => product * law.Count(s)) <= MostListed;

    /// <summary>The parts of a conjunction; a count that must be full is one.</summary>
    private IEnumerable<BoundExpression> Conjuncts(BoundExpression condition) => condition switch
    {
        BoundBinary { Operator: BinaryOperator.And } e => Conjuncts(e.Left).Concat(Conjuncts(e.Right)),
        BoundBinary { Operator: BinaryOperator.Equal, Left: BoundCall { Function: ValueFunction.Count } count, Right: BoundLiteral { Value: NumberValue number } }
            when number.Number == count.Arguments.Count => count.Arguments.SelectMany(Conjuncts),
        _ => [condition],
    };

    private RoundedSum Single(OpenLaw law, BoundExpression condition) => condition switch
    {
        BoundUnary { Operator: UnaryOperator.Not } e => Difference(law.Total, Probability(law, [e.Operand])),
        BoundBinary { Operator: BinaryOperator.Or } e =>
            Difference(Probability(law, [e.Left]) + Probability(law, [e.Right]), Probability(law, [e.Left, e.Right])),
        BoundBinary { Operator: BinaryOperator.Unequal } e => Difference(law.Total, Probability(law, [e with { Operator = BinaryOperator.Equal }])),
        BoundIf e => Probability(law, [e.Condition, e.Then]) + Probability(law, [new BoundUnary(e.Span, UnaryOperator.Not, e.Condition), e.Else]),
        BoundCall { Function: ValueFunction.Distinct } e when Differing(law, e.Arguments) is { } found => found,
        BoundCall { Function: ValueFunction.Same } e => Same(law, e.Arguments),
        BoundBinary { Operator: BinaryOperator.Equal } e when LeftOut(law, e) is { } found => found,
        _ => Counted(law, [condition]) ?? Listed(law, [condition]),
    };

    /// <summary>A difference keeps the absolute accuracy of its parts.</summary>
    private static RoundedSum Difference(RoundedSum a, RoundedSum b) => new(a.Value - b.Value, a.Error + b.Error + 1e-16);

    private static RoundedSum? Differing(OpenLaw law, IReadOnlyList<BoundExpression> arguments)
    {
        List<int> slots = [];
        List<Value> settled = [];
        foreach (BoundExpression argument in arguments)
        {
            if (argument is BoundSlot slot)
                slots.Add(slot.Slot);
            else if (argument is BoundLiteral literal)
                settled.Add(literal.Value);
            else
                return null;
        }

        if (settled.Contains(Value.None) || settled.Distinct().Count() < settled.Count || slots.Distinct().Count() < slots.Count)
            return default(RoundedSum);
        OpenLaw left = slots.Aggregate(law, (l, s) => l.Where(s, v => !settled.Contains(v)));
        return left.Distinct(slots);
    }

    /// <summary>One value for all, whichever.</summary>
    private RoundedSum Same(OpenLaw law, IReadOnlyList<BoundExpression> arguments) =>
        Enumerable.Range(0, levels).Select(k => new BoundLiteral(arguments[0].Span, Value.Of(k)))
            .Select(value => Probability(law, arguments.Select(a => Equal(a, value)))).Aggregate(default(RoundedSum), (a, b) => a + b);

    private static BoundExpression Equal(BoundExpression a, BoundLiteral value) => a is BoundLiteral literal
        ? new BoundLiteral(a.Span, Value.Of(literal.Value.Equals(value.Value)))
        : new BoundBinary(a.Span, BinaryOperator.Equal, a, value);

    /// <summary>x = missing(all others): with every outcome present that is to say that all differ.</summary>
    private RoundedSum? LeftOut(OpenLaw law, BoundBinary e)
    {
        (BoundExpression one, BoundExpression other) = e.Left is BoundCall { Function: ValueFunction.Missing } ? (e.Right, e.Left) : (e.Left, e.Right);
        if (other is not BoundCall { Function: ValueFunction.Missing } missing || missing.Arguments.Count != levels - 1)
            return null;
        BoundExpression[] all = [one, .. missing.Arguments];
        bool present = all.All(a => a is BoundSlot slot ? !law.MayBeNone(slot.Slot) : a is BoundLiteral { Value: not NoneValue });
        return present ? Differing(law, all) : null;
    }

    /// <summary>Conditions that are functions of few counts of conditions on single outcomes, and of nothing else.</summary>
    private RoundedSum? Counted(OpenLaw law, IReadOnlyList<BoundExpression> conditions)
    {
        BoundCall[] counts = [.. conditions.SelectMany(BoundWalk.Within).OfType<BoundCall>().Where(c => c.Function == ValueFunction.Count && BoundWalk.Slots(c).Any())];
        if (counts.Length == 0 || conditions.Any(c => BoundWalk.Slots(c).Count() != counts.Where(call => BoundWalk.Within(c).Contains(call)).Sum(call => BoundWalk.Slots(call).Count())))
            return null;
        BoundCall[] different = [.. counts.DistinctBy(Key)];
        if (different.Length > MostCounts || !different.All(IsOfSingleOutcomes))
            return null;
        RoundedSum[] numbers = law.Counts([.. different.Select(Predicates)]);
        int radix = (int)Math.Round(Math.Pow(numbers.Length, 1.0 / different.Length));
        return Enumerable.Range(0, numbers.Length).Where(i => Holds(conditions, different, i, radix)).Select(i => numbers[i]).Aggregate(default(RoundedSum), (a, b) => a + b);
    }

    /// <summary>Two counts of the same conditions are one.</summary>
    private static string Key(BoundCall count) => string.Join(';', count.Arguments.Select(a => string.Join(',', BoundWalk.Within(a).Select(Words))));

    private static string Words(BoundExpression e) => e switch
    {
        BoundSlot slot => $"s{slot.Slot}",
        BoundLiteral literal => literal.Value.ToString()!,
        BoundBinary binary => binary.Operator.ToString(),
        BoundUnary unary => unary.Operator.ToString(),
        BoundCall call => call.Function.ToString(),
        _ => e.GetType().Name,
    };

    private static bool IsOfSingleOutcomes(BoundCall count) =>
        count.Arguments.All(a => BoundWalk.Slots(a).Distinct().Count() <= 1)
        && count.Arguments.SelectMany(a => BoundWalk.Slots(a).Distinct()).GroupBy(s => s).All(g => g.Count() == 1);

    private Dictionary<int, Func<Value, bool>> Predicates(BoundCall count) =>
        count.Arguments.Where(a => BoundWalk.Slots(a).Any()).ToDictionary(
            a => BoundWalk.Slots(a).First(),
            a => (Func<Value, bool>)(v => inlining.Evaluate(inlining.Settle(a, BoundWalk.Slots(a).First(), v)) is TruthValue { Truth: true }));

    private bool Holds(IReadOnlyList<BoundExpression> conditions, BoundCall[] counts, int index, int radix)
    {
        Dictionary<string, int> numbers = [];
        for (int i = counts.Length - 1; i >= 0; i--)
        {
            int always = counts[i].Arguments.Count(a => a is BoundLiteral { Value: TruthValue { Truth: true } });
            numbers[Key(counts[i])] = (index % radix) + always;
            index /= radix;
        }

        return conditions.All(c => inlining.Evaluate(Numbered(c, numbers)) is TruthValue { Truth: true });
    }

    private static BoundExpression Numbered(BoundExpression e, Dictionary<string, int> numbers) => e switch
    {
        BoundCall { Function: ValueFunction.Count } call when numbers.TryGetValue(Key(call), out int number) => new BoundLiteral(e.Span, Value.Of(number)),
        BoundUnary u => u with { Operand = Numbered(u.Operand, numbers) },
        BoundBinary b => b with { Left = Numbered(b.Left, numbers), Right = Numbered(b.Right, numbers) },
        BoundIf i => i with { Condition = Numbered(i.Condition, numbers), Then = Numbered(i.Then, numbers), Else = Numbered(i.Else, numbers) },
        BoundCall call => call with { Arguments = [.. call.Arguments.Select(a => Numbered(a, numbers))] },
        _ => e,
    };

    /// <summary>The condition that reads fewest outcomes is listed, and the others are asked for each assignment.</summary>
    private RoundedSum Listed(OpenLaw law, List<BoundExpression> conditions)
    {
        int[][] reads = [.. conditions.Select(c => BoundWalk.Slots(c).Distinct().ToArray())];
        int[] fewest = reads.MinBy(r => r.Length)!;
        if (!MayList(law, fewest))
            throw new ProductRefusalException(conditions[Array.IndexOf(reads, fewest)].Span, fewest.Length);
        return Joint(law, fewest, conditions).Select(found => found.Weight).Aggregate(default(RoundedSum), (a, b) => a + b);
    }
}
