using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Dense;

/// <summary>Sums by what was measured, picked or given so far.</summary>
internal sealed class History(Protocol protocol, bool withFidelity)
{
    /// <summary>More different histories than this are not told apart; the sums would take more memory than the state.</summary>
    private const int MostHistories = 65536;

    /// <summary>Content of slots that no step has filled yet; equal to none, but not told as an outcome.</summary>
    public static Value NotYet { get; } = new NoneValue();

    private readonly Dictionary<string, Sum> _sums = [];
    private readonly int[] _told = [.. Enumerable.Range(0, protocol.Slots.Count).Where(s => protocol.Slots[s].Kind is SlotKind.Outcome or SlotKind.Pick or SlotKind.Input)];

    public void Add(Value[] slots, double weight, double overlap)
    {
        string key = string.Join('|', _told.Select(s => slots[s]));
        if (_sums.TryGetValue(key, out Sum? sum))
            sum.Add(weight, overlap);
        else if (_sums.Count < MostHistories)
            _sums[key] = new Sum(slots, weight, overlap);
    }

    public IEnumerable<BranchEvaluation> MostProbable(double whole, int count) =>
        _sums.Values.Where(s => s.Weight > 0).OrderByDescending(s => Math.Round(s.Weight, 12)).ThenBy(s => Key(s.Slots), StringComparer.Ordinal).Take(count)
            .Select(s => new BranchEvaluation(Outcomes(s.Slots), s.Weight / whole, withFidelity ? s.Overlap / s.Weight : null));

    private string Key(Value[] slots) => string.Join('|', _told.Select(s => slots[s]));

    private KeyValuePair<string, string>[] Outcomes(Value[] slots) =>
        [.. _told.Where(s => !ReferenceEquals(slots[s], NotYet))
            .Select(s => new KeyValuePair<string, string>($"{protocol.Parties[protocol.Slots[s].Party]}.{protocol.Slots[s].Name}", slots[s].ToString()!))];

    private sealed class Sum(Value[] slots, double weight, double overlap)
    {
        public Value[] Slots => slots;

        public double Weight { get; private set; } = weight;

        public double Overlap { get; private set; } = overlap;

        public void Add(double more, double overlapping)
        {
            Weight += more;
            Overlap += overlapping;
        }
    }
}
