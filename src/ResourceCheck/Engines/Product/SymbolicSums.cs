using ResourceCheck.Engines.Figures;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Product;

/// <summary>
/// Sums of figures over branches whose open outcomes are not listed. What a figure reads of them is listed when it is little; a guess or an
/// information from more is bounded from below by what can be listed, and a guess besides by naming a level that nobody known has.
/// </summary>
internal sealed class SymbolicSums
{
    private readonly Inlining _inlining;
    private readonly ConditionLaw _conditions;
    private readonly int _levels;
    private readonly Dictionary<Figure, FigureSum> _sums = new(ReferenceEqualityComparer.Instance as IEqualityComparer<Figure>);
    private readonly Dictionary<Figure, (RoundedSum Holds, RoundedSum Whole)> _probabilities = new(ReferenceEqualityComparer.Instance as IEqualityComparer<Figure>);
    private readonly Dictionary<Figure, double> _naming = new(ReferenceEqualityComparer.Instance as IEqualityComparer<Figure>);
    private readonly HashSet<Figure> _bounds = new(ReferenceEqualityComparer.Instance as IEqualityComparer<Figure>);
    private double _whole;

    public SymbolicSums(Protocol protocol, Inlining inlining, ConditionLaw conditions)
    {
        (_inlining, _conditions, _levels) = (inlining, conditions, protocol.Levels);
        foreach (Figure figure in FigureTally.Elementary(protocol))
        {
            if (figure is ProbabilityFigure)
                _probabilities[figure] = default;
            else
                _sums[figure] = FigureSum.Of(figure);
        }
    }

    /// <summary>One branch with the law of its open outcomes.</summary>
    /// <param name="branch">The branch.</param>
    /// <param name="law">The law.</param>
    /// <param name="kept">Probability of its kept copies, the factor included.</param>
    public void Add(ProductBranch branch, OpenLaw law, double kept)
    {
        _whole += kept;
        foreach (Figure figure in _probabilities.Keys.ToArray())
            AddProbability((ProbabilityFigure)figure, branch, law);
        foreach (Figure figure in _sums.Keys)
            AddListed(figure, branch, law);
    }

    public Estimate Of(Figure figure)
    {
        if (_probabilities.TryGetValue(figure, out (RoundedSum Holds, RoundedSum Whole) sums))
            return ProductTally.Fraction(sums.Holds, sums.Whole);
        Estimate found = _sums[figure].Conclude();
        return _bounds.Contains(figure) ? Estimate.AtLeast(Math.Max(found.Value, _naming.GetValueOrDefault(figure) / _whole)) : found;
    }

    private void AddProbability(ProbabilityFigure figure, ProductBranch branch, OpenLaw law)
    {
        BoundExpression[] given = figure.Given is null ? [.. branch.Conditions] : [.. branch.Conditions, _inlining.In(figure.Given, branch)];
        RoundedSum whole = _conditions.Probability(law, given).Times(branch.Factor);
        RoundedSum holds = _conditions.Probability(law, [.. given, _inlining.In(figure.Condition, branch)]).Times(branch.Factor);
        (RoundedSum before, RoundedSum wholeBefore) = _probabilities[figure];
        _probabilities[figure] = (before + holds, wholeBefore + whole);
    }

    private void AddListed(Figure figure, ProductBranch branch, OpenLaw law)
    {
        List<int> slots = [];
        foreach (BoundExpression part in Parts(figure))
        {
            int[] more = [.. slots.Concat(BoundWalk.Slots(_inlining.In(part, branch))).Distinct()];
            if (ConditionLaw.MayList(law, more))
                slots = [.. more];
            else if (figure is MeanFigure)
                throw new ProductRefusalException(part.Span, more.Length);
            else
                _bounds.Add(figure);
        }

        foreach ((IReadOnlyDictionary<int, Value> values, RoundedSum weight) in _conditions.Joint(law, slots, branch.Conditions))
            _sums[figure].Add(Filled(branch, values), branch.Factor * weight.Value.Real, _levels);
        if (figure is GuessFigure guess && _bounds.Contains(figure))
            _naming[figure] = _naming.GetValueOrDefault(figure) + (branch.Factor * Naming(guess, branch, law));
    }

    /// <summary>What a figure reads, the indispensable first.</summary>
    private static IEnumerable<BoundExpression> Parts(Figure figure) => figure switch
    {
        MeanFigure mean => mean.Given is null ? [mean.Value] : [mean.Value, mean.Given],
        GuessFigure guess => guess.Known.Prepend(guess.Target),
        InformationFigure information => Alternating(information.Left, information.Right),
        _ => throw new InvalidOperationException($"{figure.GetType().Name} lists nothing."),
    };

    private static IEnumerable<BoundExpression> Alternating(IReadOnlyList<BoundExpression> left, IReadOnlyList<BoundExpression> right) =>
        Enumerable.Range(0, Math.Max(left.Count, right.Count)).SelectMany(i => left.Skip(i).Take(1).Concat(right.Skip(i).Take(1)));

    /// <summary>Probability of success of naming at random a level that none of the known outcomes is.</summary>
    private double Naming(GuessFigure guess, ProductBranch branch, OpenLaw law)
    {
        BoundExpression target = _inlining.In(guess.Target, branch);
        BoundExpression[] known = [.. guess.Known.Select(k => _inlining.In(k, branch)).Where(k => k is not BoundLiteral)];
        if (known.Length >= _levels || !known.Append(target).All(e => e is BoundSlot))
            return 0;
        BoundExpression differ = new BoundCall(target.Span, ValueFunction.Distinct, [target, .. known]);
        return _conditions.Probability(law, [.. branch.Conditions, differ]).Value.Real / (_levels - known.Length);
    }

    /// <summary>Slots of a history with some open outcomes settled; values that depend on others stay none, and are not read.</summary>
    private Value[] Filled(ProductBranch branch, IReadOnlyDictionary<int, Value> values)
    {
        Value[] slots = [.. branch.Slots];
        foreach ((int slot, Value value) in values)
            slots[slot] = value;
        for (int slot = 0; slot < slots.Length; slot++)
        {
            if (branch.Symbols[slot] is { } symbol && symbol is not BoundSlot && BoundWalk.Slots(symbol).All(values.ContainsKey))
                slots[slot] = ValueEvaluator.Evaluate(symbol, slots, _levels);
        }

        return slots;
    }
}
