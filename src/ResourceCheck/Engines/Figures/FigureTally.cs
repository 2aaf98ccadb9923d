using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Figures;

/// <summary>Adds up, over ends of branches, what each elementary figure of the reports and claims needs.</summary>
internal sealed class FigureTally
{
    private readonly Dictionary<Figure, FigureSum> _sums = new(ReferenceEqualityComparer.Instance as IEqualityComparer<Figure>);

    public FigureTally(Protocol protocol)
    {
        foreach (Figure figure in Elementary(protocol))
            _sums[figure] = FigureSum.Of(figure);
    }

    /// <summary>One history with its probability.</summary>
    public void Add(Value[] slots, double weight, int levels)
    {
        foreach (FigureSum sum in _sums.Values)
            sum.Add(slots, weight, levels);
    }

    public Estimate Of(Figure figure) => _sums[figure].Conclude();

    /// <summary>All figures at the leaves of reports and claims.</summary>
    public static IEnumerable<Figure> Elementary(Protocol protocol) =>
        protocol.Reports.Select(r => r.Figure).Concat(protocol.Claims.SelectMany(c => new[] { c.Left, c.Right })).SelectMany(Leaves)
            .Where(f => f is ProbabilityFigure or MeanFigure or GuessFigure or InformationFigure);

    /// <summary>The leaves of a figure.</summary>
    public static IEnumerable<Figure> Leaves(Figure figure) => figure switch
    {
        MinusFigure minus => Leaves(minus.Operand),
        EntropyFigure entropy => Leaves(entropy.Operand),
        ArithmeticFigure arithmetic => Leaves(arithmetic.Left).Concat(Leaves(arithmetic.Right)),
        _ => [figure],
    };
}
