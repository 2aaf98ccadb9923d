namespace ResourceCheck.Scripts.Binding;

/// <summary>Rewrites steps, values and figures for other slots.</summary>
/// <param name="slots">The new place of a slot.</param>
internal sealed class StepMap(Func<int, int> slots)
{
    /// <summary>Rewrites steps.</summary>
    public IReadOnlyList<Step> Steps(IReadOnlyList<Step> steps) => [.. steps.Select(Step)];

    /// <summary>Rewrites a value.</summary>
    public BoundExpression Value(BoundExpression value) => BoundWalk.Map(value, slots);

    /// <summary>Rewrites a cheating strategy.</summary>
    public DishonestCase Case(DishonestCase strategy) => strategy with
    {
        Choices = [.. strategy.Choices.Select(c => c with { From = Value(c.From), To = Value(c.To) })],
        CopySteps = Steps(strategy.CopySteps),
        ListSteps = strategy.ListSteps is { } steps ? Steps(steps) : null,
        Harm = Value(strategy.Harm),
        Success = strategy.Success is { } success ? Value(success) : null,
    };

    /// <summary>Rewrites a figure.</summary>
    public Figure Figure(Figure figure) => figure switch
    {
        MinusFigure f => f with { Operand = Figure(f.Operand) },
        ArithmeticFigure f => f with { Left = Figure(f.Left), Right = Figure(f.Right) },
        EntropyFigure f => f with { Operand = Figure(f.Operand) },
        ProbabilityFigure f => f with { Condition = Value(f.Condition), Given = Optional(f.Given) },
        MeanFigure f => f with { Value = Value(f.Value), Given = Optional(f.Given) },
        GuessFigure f => f with { Target = Value(f.Target), Known = All(f.Known) },
        InformationFigure f => f with { Left = All(f.Left), Right = All(f.Right) },
        _ => figure,
    };

    private Step Step(Step step) => step switch
    {
        MeasureStep s => s with { Basis = Value(s.Basis), Slot = slots(s.Slot) },
        PickStep s => s with { Slot = slots(s.Slot), Options = All(s.Options) },
        SetStep s => s with { Slot = slots(s.Slot), Value = Value(s.Value) },
        SendStep s => s with { Slot = slots(s.Slot), Value = Value(s.Value) },
        ApplyStep s => s with { Unitary = Unitary(s.Unitary) },
        InterceptStep s => s with { Basis = Value(s.Basis), Slot = slots(s.Slot) },
        WhenStep s => s with { Condition = Value(s.Condition), Then = Steps(s.Then), Otherwise = Steps(s.Otherwise) },
        KeepStep s => s with { Condition = Value(s.Condition) },
        AbortStep s => s with { Condition = Value(s.Condition) },
        _ => step,
    };

    private BoundUnitary Unitary(BoundUnitary u) => u with { Basis = Optional(u.Basis), First = Optional(u.First), Second = Optional(u.Second) };

    private BoundExpression? Optional(BoundExpression? value) => value is null ? null : Value(value);

    private BoundExpression[] All(IReadOnlyList<BoundExpression> values) => [.. values.Select(Value)];
}
