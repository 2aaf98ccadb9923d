using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Product;

/// <summary>The law of a branch's open outcomes, some of which may have been excluded. Never changed after it is built.</summary>
internal sealed class OpenLaw
{
    private readonly IOutcomeWeights _weights;
    private readonly Reading[] _readings;
    private readonly bool[]?[] _allowed;
    private readonly int _levels;

    public OpenLaw(IOutcomeWeights weights, Reading[] readings, int levels)
        : this(weights, readings, new bool[]?[readings.Length], levels)
    {
    }

    private OpenLaw(IOutcomeWeights weights, Reading[] readings, bool[]?[] allowed, int levels) =>
        (_weights, _readings, _allowed, _levels) = (weights, readings, allowed, levels);

    /// <summary>Open slots.</summary>
    public IEnumerable<int> Slots => _readings.Where(r => r.IsOpen).Select(r => r.Slot);

    /// <summary>Probability that no excluded outcome happens.</summary>
    public RoundedSum Total => _weights.Of([.. Enumerable.Range(0, _readings.Length).Select(Operator)]);

    /// <summary>Number of outcomes of a slot that are not excluded.</summary>
    public int Count(int slot) => Outcomes(slot).Count();

    /// <summary>Outcomes of a slot that are not excluded.</summary>
    public IEnumerable<Value> Outcomes(int slot)
    {
        int site = Site(slot);
        return Enumerable.Range(0, _readings[site].Operators.Count).Where(k => IsAllowed(site, k)).Select(Value);
    }

    /// <summary>Whether a missing click is possible and not excluded.</summary>
    public bool MayBeNone(int slot) => _readings[Site(slot)].Operators.Count > _levels && IsAllowed(Site(slot), _levels);

    /// <summary>The law with all outcomes of a slot excluded for which a predicate fails.</summary>
    public OpenLaw Where(int slot, Func<Value, bool> predicate)
    {
        int site = Site(slot);
        bool[]?[] allowed = [.. _allowed];
        allowed[site] = [.. Enumerable.Range(0, _readings[site].Operators.Count).Select(k => IsAllowed(site, k) && predicate(Value(k)))];
        return new OpenLaw(_weights, _readings, allowed, _levels);
    }

    /// <summary>Probability that the outcomes of some slots are all present and differ.</summary>
    public RoundedSum Distinct(IReadOnlyList<int> slots)
    {
        int[] sites = [.. slots.Select(Site)];
        LocalOperator zero = LocalOperator.Combination([_readings[sites[0]].Operators[0]], [0]);
        IReadOnlyList<LocalOperator>[] effects = [.. sites.Select(s => Enumerable.Range(0, _levels).Select(k => IsAllowed(s, k) ? _readings[s].Operators[k] : zero).ToArray())];
        return _weights.Distinct(effects, [.. Enumerable.Range(0, _readings.Length).Except(sites).Select(Operator)]);
    }

    /// <summary>Law of how many slots satisfy each of some predicates: (N+1)^r numbers.</summary>
    public RoundedSum[] Counts(IReadOnlyList<IReadOnlyDictionary<int, Func<Value, bool>>> predicates)
    {
        IReadOnlyList<(int, LocalOperator)>[] parties = [.. Enumerable.Range(0, _readings.Length).Select(site => Classes(site, predicates))];
        return _weights.Counts(parties, predicates.Count);
    }

    /// <summary>All strings of the open outcomes with their probability, excluded ones left out; slots ascending by site.</summary>
    public double[] Joint() => _weights.Joint([.. _readings.Select(r => r.Operators)]);

    /// <summary>Number of strings, excluded ones counted too.</summary>
    public double Strings => _readings.Aggregate(1.0, (product, r) => product * r.Operators.Count);

    /// <summary>Parties' sites in the order of strings, with the number of outcomes of each.</summary>
    public IReadOnlyList<(int Slot, int Outcomes)> Digits => [.. _readings.Select(r => (r.Slot, r.Operators.Count))];

    /// <summary>An outcome as a value.</summary>
    public Value Value(int outcome) => outcome < _levels ? Scripts.Binding.Value.Of(outcome) : Scripts.Binding.Value.None;

    private IReadOnlyList<(int, LocalOperator)> Classes(int site, IReadOnlyList<IReadOnlyDictionary<int, Func<Value, bool>>> predicates)
    {
        if (!_readings[site].IsOpen)
            return [(0, _readings[site].Operators[0])];
        int Sets(int k) => predicates.Select((p, i) => p.TryGetValue(_readings[site].Slot, out Func<Value, bool>? holds) && holds(Value(k)) ? 1 << i : 0).Sum();
        return [.. Enumerable.Range(0, _readings[site].Operators.Count).Where(k => IsAllowed(site, k)).GroupBy(Sets)
            .Select(g => (g.Key, LocalOperator.Sum([.. g.Select(k => _readings[site].Operators[k])])))];
    }

    private LocalOperator Operator(int site)
    {
        if (_allowed[site] is not { } allowed || allowed.All(a => a))
            return _readings[site].Sum;
        int[] left = [.. Enumerable.Range(0, allowed.Length).Where(k => allowed[k])];
        return left.Length == 0
            ? LocalOperator.Combination([_readings[site].Operators[0]], [0])
            : LocalOperator.Sum([.. left.Select(k => _readings[site].Operators[k])]);
    }

    private bool IsAllowed(int site, int outcome) => _allowed[site]?[outcome] ?? true;

    private int Site(int slot) => Array.FindIndex(_readings, r => r.Slot == slot);
}
