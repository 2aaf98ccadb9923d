using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Engines.Figures;

/// <summary>Values of reports and claims from metrics, sums and CHSH values.</summary>
internal sealed class FigureValues(Protocol protocol, Metrics metrics, Func<Figure, Estimate> sums, Func<BellFigure, Estimate> bell)
{
    private readonly Dictionary<string, Estimate> _reports = [];

    public IReadOnlyList<Estimate> Reports()
    {
        List<Estimate> values = [];
        foreach (Report report in protocol.Reports)
        {
            Estimate value = Of(report.Figure);
            _reports[report.Label] = value;
            values.Add(value);
        }

        return values;
    }

    /// <summary>Both sides of each claim; to be asked for after the reports, which claims may name.</summary>
    public IReadOnlyList<(Estimate Left, Estimate Right)> Claims() => [.. protocol.Claims.Select(c => (Of(c.Left), Of(c.Right)))];

    private Estimate Of(Figure figure) => figure switch
    {
        NumberFigure number => Estimate.Exact(number.Value),
        MinusFigure minus => Combined([Of(minus.Operand)], v => -v[0], [false]),
        EntropyFigure entropy => Combined([Of(entropy.Operand)], v => BinaryEntropy(v[0]), [null]),
        ArithmeticFigure arithmetic => Arithmetic(arithmetic),
        MetricFigure { Metric.Kind: MetricKind.Report } metric => _reports[metric.Metric.Label],
        MetricFigure metric => metrics.Of(metric.Metric),
        BellFigure pair => bell(pair),
        _ => sums(figure),
    };

    private Estimate Arithmetic(ArithmeticFigure figure)
    {
        Estimate left = Of(figure.Left), right = Of(figure.Right);
        return figure.Operator switch
        {
            BinaryOperator.Plus => Combined([left, right], v => v[0] + v[1], [true, true]),
            BinaryOperator.Minus => Combined([left, right], v => v[0] - v[1], [true, false]),
            BinaryOperator.Times => Combined([left, right], v => v[0] * v[1], [right.Value >= 0, left.Value >= 0]),
            _ => Combined([left, right], v => v[1] == 0 ? double.NaN : v[0] / v[1], [right.Value >= 0, null]),
        };
    }

    /// <summary>
    /// A function of estimates. From exact numbers it is exact; one bound among exact numbers stays a bound when the function rises
    /// (true) or falls (false) with it, and so does one sampled number, whose interval goes through the function; anything else loses
    /// its side, and is undefined rather than mislabelled.
    /// </summary>
    private static Estimate Combined(Estimate[] parts, Func<double[], double> function, bool?[] rises)
    {
        double value = function([.. parts.Select(p => p.Value)]);
        int[] bounds = [.. Enumerable.Range(0, parts.Length).Where(i => parts[i].Label != TruthLabel.Exact)];
        if (bounds.Length == 0)
            return Estimate.Exact(value);
        if (bounds.Length > 1 || rises[bounds[0]] is not { } up)
            return Estimate.Exact(double.NaN);
        if (parts[bounds[0]].Label == TruthLabel.Sampled)
        {
            double[] ends = [.. new[] { parts[bounds[0]].Low, parts[bounds[0]].High }.Select(end => function([.. parts.Select((p, i) => i == bounds[0] ? end : p.Value)]))];
            return parts[bounds[0]] with { Value = value, Low = ends.Min(), High = ends.Max() };
        }

        return double.IsFinite(parts[bounds[0]].Low) == up ? Estimate.AtLeast(value) : Estimate.AtMost(value);
    }

    /// <summary>h(p) in bits; undefined outside [0, 1] beyond round-off.</summary>
    private static double BinaryEntropy(double p) => p switch
    {
        < -1e-9 or > 1 + 1e-9 => double.NaN,
        <= 0 or >= 1 => 0,
        _ => -((p * Math.Log2(p)) + ((1 - p) * Math.Log2(1 - p))),
    };
}
