namespace ResourceCheck.Engines.Lists;

/// <summary>Exact verdicts of a list protocol from the law of a single copy.</summary>
public static class CountingEngine
{
    /// <summary>Evaluates a task, or says why it cannot be done by counting.</summary>
    /// <param name="task">What is asked.</param>
    /// <param name="cancellation">Stops the evaluation.</param>
    public static ListOutcome Evaluate(ListTask task, CancellationToken cancellation) =>
        Guarded(() => ListProgram.Of(task).Evaluate(task.Choices, task.Limits, cancellation));

    /// <summary>An evaluation or its refusal.</summary>
    internal static ListOutcome Guarded(Func<ListEvaluation> evaluate)
    {
        try
        {
            return new ListOutcome(evaluate(), null);
        }
        catch (ListRefusalException refusal)
        {
            return new ListOutcome(null, refusal.Message, refusal.TooMuchWork);
        }
    }
}
