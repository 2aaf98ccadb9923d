using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Finds lines that can never run because a condition without any name in it is fixed.</summary>
/// <param name="context">The binding.</param>
internal sealed class Reachability(BindContext context)
{
    private Span? _end;

    /// <summary>Line behind which nothing runs, or null.</summary>
    public Span? End
    {
        get => _end;
        set => _end = value;
    }

    /// <summary>Reports a step behind a line that lets nothing through, and notes such lines.</summary>
    public void Visit(Statement statement)
    {
        if (_end is { } end && IsStep(statement))
        {
            context.Findings.Report(statement.Span, BindingMessages.NeverReached($"line {context.LineOf(end)} drops every copy"));
            _end = null;
        }

        if (statement is KeepStatement keep && Fixed(keep.Condition) == false)
            _end = keep.Span;
        if (statement is WhenStatement block && Fixed(block.Condition) is { } holds && (holds ? block.Otherwise : block.Then) is [var dead, ..])
            context.Findings.Report(dead.Span, BindingMessages.NeverReached($"the condition on line {context.LineOf(block.Span)} always {(holds ? "holds" : "fails")}"));
    }

    private bool? Fixed(Expression condition)
    {
        if (!TreeWalk.IsLiteral(condition))
            return null;
        Value? value = new ExpressionBinder(context, new ConstantView(context)).Expect(condition, ValueKind.Truth).Constant;
        return value is null ? null : value is TruthValue { Truth: true };
    }

    private static bool IsStep(Statement statement) =>
        statement is MeasureStatement or ApplyStatement or WaitStatement or InterceptStatement or CheckpointStatement or PickStatement
            or SetStatement or SendStatement or AbortStatement or KeepStatement;
}
