using System.Numerics;
using ResourceCheck.Numerics.Counting;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>
/// Harm of a cheat with fixed choices, by how often each value occurs in its own list. The part up to the cheat's last draw is run with
/// these counts as tags; what follows is run once from each state that the draws lead to.
/// </summary>
internal sealed class OwnCounts
{
    private readonly ListProgram _program;
    private readonly ListContext _context;
    private readonly IReadOnlyList<Value> _choices;
    private readonly ListLimits _limits;
    private readonly Meter _meter;
    private readonly double _neglected;
    private readonly CancellationToken _cancellation;
    private long _work;

    public OwnCounts(ListProgram program, IReadOnlyList<Value> choices, ListLimits limits, double neglected, CancellationToken cancellation)
    {
        _program = program;
        _context = program.Context;
        _choices = choices;
        _limits = limits;
        _meter = new Meter(limits, cancellation);
        _neglected = neglected;
        _cancellation = cancellation;
    }

    /// <summary>Transitions so far.</summary>
    public double Work => _work + _meter.Transitions;

    /// <summary>Probability of the cheat's counts together with harm, by the counts.</summary>
    public Dictionary<string, double> Harms()
    {
        BigInteger[] parts = [.. Parts()];
        int tags = parts.Length - 1;
        Counter counter = new(_program, _choices, _meter, tags);
        counter.Deposit(0, _program.Start(_choices, [.. parts.Select(p => new Cell(p, false, BigInteger.Zero))]), Counts(parts));
        counter.RunTo(_context.Code.LastCheatOperation);
        List<Drawn> drawn = [.. counter.Waiting.SelectMany(w => Split(w.At, w.Structure, w.Table, tags))];
        Dictionary<string, double> harms = [];
        foreach ((Drawn state, double harm) in Probable(drawn).AsParallel().AsOrdered().WithCancellation(_cancellation).Select(d => (d, Harm(d))))
        {
            foreach ((string counts, double weight) in state.Lists)
                harms[counts] = harms.GetValueOrDefault(counts) + (weight * harm);
        }

        return harms;
    }

    /// <summary>Types that look alike to the cheat.</summary>
    private IEnumerable<BigInteger> Parts()
    {
        ListTask task = _context.Task;
        int[] own = [.. Enumerable.Range(0, task.Lists.CopySlots).Where(s => task.IsPerCopy(s) && task.Cheats(task.Protocol.Slots[s].Party))];
        return Enumerable.Range(0, _context.Types)
            .GroupBy(t => string.Join('|', own.Select(s => _context.Content(t, s))))
            .Select(g => g.Aggregate(BigInteger.Zero, (mask, t) => mask | (BigInteger.One << t)));
    }

    /// <summary>The multinomial law of the parts' counts; all but the last are repeated as tags.</summary>
    private CountTable Counts(BigInteger[] parts)
    {
        CountTable whole = new(1);
        whole.Add([(ushort)_context.Task.Lists.Copies], 1);
        ListStructure structure = _program.Start(_choices, new Cell(_context.All, false, BigInteger.Zero));
        int[][] allDiffer = [[.. Enumerable.Range(1, _context.Types)]];
        Refinement refinement = Refinement.Of(_context, structure, [.. parts[..^1].Select(p => new[] { p })], allDiffer);
        CountTable split = Splitter.Split(refinement, whole, 0, _meter);
        CountTable counts = new(parts.Length + parts.Length - 1);
        ushort[] key = new ushort[counts.Width];
        for (int entry = 0; entry < split.Count; entry++)
        {
            ReadOnlySpan<ushort> from = split.Key(entry);
            for (int cell = 0; cell < parts.Length; cell++)
                key[Array.IndexOf(parts, refinement.After.Cells[cell].Types)] = from[parts.Length - 1 + cell];
            from[..(parts.Length - 1)].CopyTo(key.AsSpan(parts.Length));
            counts.Add(key, split.Weight(entry));
        }

        return counts;
    }

    private static Dictionary<string, Drawn>.ValueCollection Split(int at, ListStructure structure, CountTable table, int tags)
    {
        Dictionary<string, Drawn> states = [];
        for (int entry = 0; entry < table.Count; entry++)
        {
            ushort[] key = table.Key(entry).ToArray();
            string state = string.Join(',', key[..^tags]), counts = string.Join(',', key[^tags..]);
            if (!states.TryGetValue(state, out Drawn? drawn))
                states[state] = drawn = new Drawn(at, structure, key[..^tags], []);
            drawn.Lists.Add((counts, table.Weight(entry)));
        }

        return states.Values;
    }

    /// <summary>All states but the least probable ones that may be neglected together.</summary>
    private IEnumerable<Drawn> Probable(IEnumerable<Drawn> states)
    {
        double left = _neglected;
        foreach (Drawn state in states.OrderBy(s => s.Weight))
        {
            left -= state.Weight;
            if (left < 0)
                yield return state;
        }
    }

    private double Harm(Drawn state)
    {
        Meter meter = new(_limits, _cancellation);
        Counter counter = new(_program, _choices, meter, 0);
        CountTable start = new(state.Counts.Length);
        start.Add(state.Counts, 1);
        counter.Deposit(state.At, state.Structure, start);
        counter.RunTo(_context.Code.Operations.Count);
        double harm = Verdicts.Of(_context, counter).Harm;
        Interlocked.Add(ref _work, meter.Transitions);
        return harm;
    }

    /// <summary>A state behind the cheat's last draw, with the cheat's counts that lead to it.</summary>
    private sealed record Drawn(int At, ListStructure Structure, ushort[] Counts, List<(string Counts, double Weight)> Lists)
    {
        public double Weight => Lists.Sum(l => l.Weight);
    }
}
