namespace ResourceCheck.Scripts.Binding;

/// <summary>Ways through steps.</summary>
internal static class StepWalk
{
    /// <summary>The step with numbers in place of the cheat's choices.</summary>
    public static Step Put(Step step, IReadOnlyList<Value> choices)
    {
        if (choices.Count == 0)
            return step;
        return step switch
        {
            MeasureStep s => s with { Basis = BoundWalk.Put(s.Basis, choices) },
            PickStep s => s with { Options = [.. s.Options.Select(o => BoundWalk.Put(o, choices))] },
            SetStep s => s with { Value = BoundWalk.Put(s.Value, choices) },
            SendStep s => s with { Value = BoundWalk.Put(s.Value, choices) },
            ApplyStep s => s with { Unitary = Put(s.Unitary, choices) },
            InterceptStep s => s with { Basis = BoundWalk.Put(s.Basis, choices) },
            WhenStep s => s with { Condition = BoundWalk.Put(s.Condition, choices), Then = [.. s.Then.Select(t => Put(t, choices))], Otherwise = [.. s.Otherwise.Select(t => Put(t, choices))] },
            KeepStep s => s with { Condition = BoundWalk.Put(s.Condition, choices) },
            AbortStep s => s with { Condition = BoundWalk.Put(s.Condition, choices) },
            _ => step,
        };
    }

    /// <summary>All expressions of a step and of the steps within it.</summary>
    public static IEnumerable<BoundExpression> Expressions(Step step) => step switch
    {
        MeasureStep s => [s.Basis],
        PickStep s => s.Options,
        SetStep s => [s.Value],
        SendStep s => [s.Value],
        ApplyStep s => new[] { s.Unitary.Basis, s.Unitary.First, s.Unitary.Second }.OfType<BoundExpression>(),
        InterceptStep s => [s.Basis],
        WhenStep s => s.Then.Concat(s.Otherwise).SelectMany(Expressions).Prepend(s.Condition),
        KeepStep s => [s.Condition],
        AbortStep s => [s.Condition],
        _ => [],
    };

    private static BoundUnitary Put(BoundUnitary unitary, IReadOnlyList<Value> choices) => unitary with
    {
        Basis = unitary.Basis is { } basis ? BoundWalk.Put(basis, choices) : null,
        First = unitary.First is { } first ? BoundWalk.Put(first, choices) : null,
        Second = unitary.Second is { } second ? BoundWalk.Put(second, choices) : null,
    };
}
