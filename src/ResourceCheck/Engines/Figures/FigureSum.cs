using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Figures;

/// <summary>Running sums of one elementary figure.</summary>
internal abstract class FigureSum
{
    public static FigureSum Of(Figure figure) => figure switch
    {
        ProbabilityFigure probability => new ProbabilitySum(probability),
        MeanFigure mean => new MeanSum(mean),
        GuessFigure guess => new GuessSum(guess),
        InformationFigure information => new InformationSum(information),
        _ => throw new InvalidOperationException($"{figure.GetType().Name} needs no sums."),
    };

    public abstract void Add(Value[] slots, double weight, int levels);

    public abstract Estimate Conclude();

    /// <summary>A fraction of nothing is undefined; it shows as such instead of as 0.</summary>
    public static double Ratio(double part, double whole) => whole > 0 ? part / whole : double.NaN;

    protected static bool Holds(BoundExpression? condition, Value[] slots, int levels) =>
        condition is null || ValueEvaluator.Evaluate(condition, slots, levels) is TruthValue { Truth: true };

    /// <summary>Several values as one key.</summary>
    protected static string Key(IReadOnlyList<BoundExpression> expressions, Value[] slots, int levels) =>
        string.Join('|', expressions.Select(e => ValueEvaluator.Evaluate(e, slots, levels)));
}

/// <summary>P(condition | given).</summary>
internal sealed class ProbabilitySum(ProbabilityFigure figure) : FigureSum
{
    private double _holds, _whole;

    public override void Add(Value[] slots, double weight, int levels)
    {
        if (!Holds(figure.Given, slots, levels))
            return;
        _whole += weight;
        if (Holds(figure.Condition, slots, levels))
            _holds += weight;
    }

    public override Estimate Conclude() => Estimate.Exact(Ratio(_holds, _whole));
}

/// <summary>Mean over the copies in which the value is a number.</summary>
internal sealed class MeanSum(MeanFigure figure) : FigureSum
{
    private double _sum, _present, _whole;

    public override void Add(Value[] slots, double weight, int levels)
    {
        if (!Holds(figure.Given, slots, levels))
            return;
        _whole += weight;
        if (ValueEvaluator.Evaluate(figure.Value, slots, levels) is not NumberValue { Number: var number })
            return;
        _present += weight;
        _sum += weight * number.ToDouble();
    }

    public override Estimate Conclude() => Estimate.Exact(Ratio(_sum, _present)) with { Present = Ratio(_present, _whole) };
}

/// <summary>Σ over what is known of the probability of the likeliest target.</summary>
internal sealed class GuessSum(GuessFigure figure) : FigureSum
{
    private readonly Dictionary<string, Dictionary<string, double>> _joint = [];
    private double _whole;

    public override void Add(Value[] slots, double weight, int levels)
    {
        _whole += weight;
        string known = Key(figure.Known, slots, levels), target = Key([figure.Target], slots, levels);
        if (!_joint.TryGetValue(known, out Dictionary<string, double>? targets))
            _joint[known] = targets = [];
        targets[target] = targets.GetValueOrDefault(target) + weight;
    }

    public override Estimate Conclude() => Estimate.Exact(Ratio(_joint.Values.Sum(t => t.Values.Max()), _whole));
}

/// <summary>Mutual information Σ p(x,y) log2 [p(x,y)/(p(x)p(y))], bits.</summary>
internal sealed class InformationSum(InformationFigure figure) : FigureSum
{
    private readonly Dictionary<(string X, string Y), double> _joint = [];
    private readonly Dictionary<string, double> _left = [];
    private readonly Dictionary<string, double> _right = [];
    private double _whole;

    public override void Add(Value[] slots, double weight, int levels)
    {
        string x = Key(figure.Left, slots, levels), y = Key(figure.Right, slots, levels);
        _whole += weight;
        _joint[(x, y)] = _joint.GetValueOrDefault((x, y)) + weight;
        _left[x] = _left.GetValueOrDefault(x) + weight;
        _right[y] = _right.GetValueOrDefault(y) + weight;
    }

    public override Estimate Conclude()
    {
        double bits = 0;
        foreach (((string x, string y), double weight) in _joint)
            bits += weight <= 0 ? 0 : weight / _whole * Math.Log2(weight * _whole / (_left[x] * _right[y]));
        return Estimate.Exact(_whole > 0 ? Math.Max(bits, 0) : double.NaN); // never negative but for round-off
    }
}
