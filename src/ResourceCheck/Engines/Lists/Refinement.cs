using System.Globalization;
using System.Numerics;

namespace ResourceCheck.Engines.Lists;

/// <summary>How cells are to be split so that some sets become countable, and merged where nothing looks at the difference later.</summary>
internal sealed class Refinement
{
    private readonly ListContext _context;
    private readonly ListStructure _before;
    private readonly IReadOnlyList<BigInteger[]> _counted;
    private readonly int[][] _classes;
    private readonly List<(string Key, int Cell, BigInteger Types)> _targets = [];

    private Refinement(ListContext context, ListStructure before, IReadOnlyList<BigInteger[]> counted, int[][] classes)
    {
        _context = context;
        _before = before;
        _counted = counted;
        _classes = classes;
        Atoms = [.. before.Cells.Select((_, cell) => Split(cell))];
        After = Merged();
    }

    /// <summary>Atoms of each cell.</summary>
    public IReadOnlyList<Atom[]> Atoms { get; }

    /// <summary>Structure with the new cells.</summary>
    public ListStructure After { get; }

    /// <summary>Whether positions are counted of which a cheat was taken to hold enough.</summary>
    public bool CountsPool => _counted.Any(c => c.Where((types, cell) => _before.Cells[cell].IsPool && !types.IsZero).Any());

    /// <summary>Number of sums.</summary>
    public int Sums => _counted.Count;

    /// <summary>Plans a refinement.</summary>
    /// <param name="context">The task.</param>
    /// <param name="before">What the cells are.</param>
    /// <param name="counted">Sets to be counted: member types of each cell.</param>
    /// <param name="classes">What later operations can tell apart.</param>
    public static Refinement Of(ListContext context, ListStructure before, IReadOnlyList<BigInteger[]> counted, int[][] classes) =>
        new(context, before, counted, classes);

    private Atom[] Split(int cell)
    {
        BigInteger drained = _before.Cells[cell].Drained;
        if (_counted.Any(c => !(c[cell] & drained).IsZero))
            throw new ListRefusalException("A set is counted from which the cheat was taken to hold enough positions: the conditional value is not defined here.");
        (BigInteger Types, int[] Sums)[] parts = [.. Parts(cell)];
        double[] weights = [.. parts.Select(p => _context.Weight(p.Types))];
        return [.. parts.Select((p, i) => new Atom(p.Types, p.Sums, Target(cell, p.Types), weights[i], weights[(i + 1)..].Sum()))];
    }

    private List<(BigInteger Types, int[] Sums)> Parts(int cell)
    {
        List<(BigInteger Types, int[] Sums)> parts = [(_before.Cells[cell].Types, [])];
        for (int sum = 0; sum < _counted.Count; sum++)
        {
            BigInteger members = _counted[sum][cell];
            int index = sum;
            parts = [.. parts.SelectMany(p => new[] { (Types: p.Types & members, Sums: (int[])[.. p.Sums, index]), (Types: p.Types & ~members, p.Sums) }).Where(p => !p.Types.IsZero)];
        }

        return parts;
    }

    private int Target(int cell, BigInteger types)
    {
        int[] classes = [.. Enumerable.Range(0, _context.Types).Where(t => ListContext.Has(types, t)).Select(t => _classes[cell][t])];
        Cell from = _before.Cells[cell];
        bool alike = classes.All(c => c == classes[0]);
        if (alike && classes[0] == Signatures.No)
            return -1;
        // A pool keeps its types: draws that always find enough are told apart by what they took from.
        bool narrow = alike && !from.IsPool;
        string key = narrow
            ? string.Create(CultureInfo.InvariantCulture, $"{classes[0]}")
            : string.Create(CultureInfo.InvariantCulture, $"{types}:{string.Join(',', classes)}:{from.IsPool}:{from.Drained}");
        int target = _targets.FindIndex(t => t.Key == key);
        if (target >= 0)
            return target;
        BigInteger lowest = types & -types;
        _targets.Add((key, cell, narrow ? lowest : types));
        return _targets.Count - 1;
    }

    private ListStructure Merged()
    {
        Cell[] cells = [.. _targets.Select(t => new Cell(t.Types, _before.Cells[t.Cell].IsPool, _before.Cells[t.Cell].Drained & t.Types))];
        BigInteger[]?[] sets = [.. _before.Sets.Select(s => s is null ? null : _targets.Select(t => s[t.Cell] & t.Types).ToArray())];
        return new ListStructure(_before.Single, sets, cells, _before.Aborted);
    }
}
