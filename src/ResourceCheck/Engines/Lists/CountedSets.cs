using System.Collections.Concurrent;
using System.Numerics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>The sets that an expression counts in a structure, each once, and its value for given counts.</summary>
internal sealed class CountedSets
{
    private readonly ListContext _context;
    private readonly Reading _reading;
    private readonly ListStructure _structure;
    private readonly List<BigInteger[]> _sets = [];
    private readonly bool _readsChoices;

    // Values by sums, kept for other runs; only where the sums fit one number and nothing else enters.
    private readonly ConcurrentDictionary<ulong, Value> _values = [];

    // For each statistic the set that it counts, or its value where that does not depend on counts.
    private readonly List<(int Set, Value? Fixed)> _sources = [];

    private CountedSets(ListContext context, Reading reading, ListStructure structure)
    {
        _context = context;
        _reading = reading;
        _structure = structure;
        _readsChoices = Reads.Slots(reading.Residual).Any(context.IsOutside);
    }

    public IReadOnlyList<BigInteger[]> Sets => _sets;

    public static CountedSets Of(ListContext context, Reading reading, ListStructure structure)
    {
        Reading needed = Simplification.Of(reading, s => !context.IsOutside(s), e => context.Evaluate(e, structure.Single));
        CountedSets counted = new(context, needed, structure);
        foreach (Statistic statistic in needed.Statistics)
            counted._sources.Add(counted.Source(statistic));
        return counted;
    }

    /// <summary>Counts one more set, which no statistic reads.</summary>
    public CountedSets With(BigInteger[] set)
    {
        Index(set);
        return this;
    }

    /// <summary>Tables over cells, by the value that the sums give.</summary>
    public IEnumerable<(Value Value, CountTable Table)> Sorted(CountTable table, IReadOnlyList<Value> choices)
    {
        int sums = _sets.Count;
        CountTable seen = new(sums);
        List<CountTable> homes = [];
        Dictionary<Value, CountTable> parts = [];
        for (int entry = 0; entry < table.Count; entry++)
        {
            ReadOnlySpan<ushort> key = table.Key(entry);
            int index = seen.Add(key[..sums], 1);
            if (index == homes.Count)
                homes.Add(Home(parts, Value(key[..sums], choices), table.Width - sums));
            homes[index].Add(key[sums..], table.Weight(entry));
        }

        return parts.Select(p => (p.Key, p.Value));
    }

    private static CountTable Home(Dictionary<Value, CountTable> parts, Value value, int width)
    {
        if (!parts.TryGetValue(value, out CountTable? table))
            parts[value] = table = new CountTable(width);
        return table;
    }

    private Value Value(ReadOnlySpan<ushort> sums, IReadOnlyList<Value> choices)
    {
        if (_readsChoices || sums.Length > sizeof(ulong) / sizeof(ushort))
            return Computed(sums, choices);
        ulong packed = 0;
        foreach (ushort sum in sums)
            packed = (packed << 16) | sum;
        if (!_values.TryGetValue(packed, out Value? value))
            _values[packed] = value = Computed(sums, choices);
        return value;
    }

    private Value Computed(ReadOnlySpan<ushort> sums, IReadOnlyList<Value> choices)
    {
        Value[] slots = _readsChoices ? _context.WithChoices(_structure.Single, choices) : [.. _structure.Single];
        for (int i = 0; i < _sources.Count; i++)
            slots[_reading.Statistics[i].Temporary] = _sources[i].Fixed ?? Scripts.Binding.Value.Of(sums[_sources[i].Set]);
        return _context.Evaluate(_reading.Residual, slots);
    }

    private (int Set, Value? Fixed) Source(Statistic statistic)
    {
        BigInteger[]? set = _context.Set(statistic.Set, _structure);
        if (statistic.Kind == StatisticKind.Mismatch)
            return Mismatch(set, _context.Set(statistic.Other!, _structure));
        if (set is null)
            return (-1, Scripts.Binding.Value.None);
        if (statistic.Kind == StatisticKind.Size)
            return (Index(set), null);
        BigInteger where = _context.Where(statistic.Other!, _structure.Single);
        return (Index([.. set.Select(s => s & where)]), null);
    }

    private (int Set, Value? Fixed) Mismatch(BigInteger[]? left, BigInteger[]? right)
    {
        if (left is null || right is null)
            return (-1, left is null && right is null ? Scripts.Binding.Value.Of(0) : Scripts.Binding.Value.Of(-1));
        return (Index([.. left.Zip(right, (l, r) => l ^ r)]), null);
    }

    private int Index(BigInteger[] set)
    {
        int index = _sets.FindIndex(s => s.SequenceEqual(set));
        if (index < 0)
            _sets.Add(set);
        return index < 0 ? _sets.Count - 1 : index;
    }
}
