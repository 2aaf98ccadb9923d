using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A number about the whole ensemble of copies, judged by the referee.</summary>
/// <param name="Span">Where it stands in the script.</param>
public abstract record Figure(Span Span);

/// <summary>A fixed number.</summary>
public sealed record NumberFigure(Span Span, double Value) : Figure(Span);

/// <summary>Negation.</summary>
public sealed record MinusFigure(Span Span, Figure Operand) : Figure(Span);

/// <summary>Arithmetic of two figures; only the four rules of arithmetic occur.</summary>
public sealed record ArithmeticFigure(Span Span, BinaryOperator Operator, Figure Left, Figure Right) : Figure(Span);

/// <summary>Binary entropy h(p) = -p log2 p - (1-p) log2(1-p), bits.</summary>
public sealed record EntropyFigure(Span Span, Figure Operand) : Figure(Span);

/// <summary>Probability of a condition among kept copies, given another one if there is one.</summary>
public sealed record ProbabilityFigure(Span Span, BoundExpression Condition, BoundExpression? Given) : Figure(Span);

/// <summary>Mean of a value over the kept copies in which it is present, given a condition if there is one.</summary>
public sealed record MeanFigure(Span Span, BoundExpression Value, BoundExpression? Given) : Figure(Span);

/// <summary>Best probability of guessing the target from the known values, given a condition if there is one.</summary>
public sealed record GuessFigure(Span Span, BoundExpression Target, IReadOnlyList<BoundExpression> Known) : Figure(Span);

/// <summary>Mutual information between two groups of values, bits.</summary>
public sealed record InformationFigure(Span Span, IReadOnlyList<BoundExpression> Left, IReadOnlyList<BoundExpression> Right) : Figure(Span);

/// <summary>Largest CHSH value of two parties' state at the last checkpoint (page 10).</summary>
public sealed record BellFigure(Span Span, int First, int Second) : Figure(Span);

/// <summary>A metric of the run or the value of a label.</summary>
public sealed record MetricFigure(Span Span, MetricName Metric) : Figure(Span);

/// <summary>Names a figure that goals and claims may use.</summary>
/// <param name="Kind">Which kind of metric.</param>
/// <param name="Label">Label of a checkpoint, report or dishonest case; empty otherwise.</param>
public sealed record MetricName(MetricKind Kind, string Label)
{
    /// <summary>The metric as scripts write it.</summary>
    public override string ToString() => Kind switch
    {
        MetricKind.Checkpoint or MetricKind.Report => $"\"{Label}\"",
        MetricKind.Harm => $"harm \"{Label}\"",
        MetricKind.Success => "success",
        MetricKind.Failure => "failure",
        MetricKind.Abort => "abort",
        _ => "yield",
    };
}

/// <summary>Kinds of metrics.</summary>
public enum MetricKind
{
    /// <summary>Probability that the success condition holds, of kept copies.</summary>
    Success,

    /// <summary>Probability that it does not, aborts included.</summary>
    Failure,

    /// <summary>Probability that some party gave up.</summary>
    Abort,

    /// <summary>Fraction of prepared copies that are kept.</summary>
    Yield,

    /// <summary>Probability of the harm of a dishonest case.</summary>
    Harm,

    /// <summary>Fidelity at a checkpoint.</summary>
    Checkpoint,

    /// <summary>Value of a report.</summary>
    Report,
}
