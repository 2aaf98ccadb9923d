using System.Globalization;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;

namespace ResourceCheck.Judgement;

/// <summary>
/// Verdicts of a list protocol: counted exactly; where that is too much work counted without improbable paths, which bounds them from both
/// sides; and from simulated runs where counting does not apply.
/// </summary>
internal static class ListVerdicts
{
    /// <summary>Runs simulated where nothing is counted: enough to tell 1e-3 from nothing.</summary>
    private const int Runs = 100_000;

    private const double Confidence = 0.99;

    /// <summary>Transitions that take some ten seconds.</summary>
    private const double MostWork = 2e8;

    /// <summary>Paths left out, one limit after the other until the rest can be counted.</summary>
    private static readonly double[] LeftOut = [1e-15, 1e-12, 1e-10, 1e-8, 1e-7, 1e-6];

    public static ListEvaluation Of(ListTask task, RunRequest request) => Of(task, request, MostWork);

    /// <summary>Verdicts with a limit of transitions between states of counts.</summary>
    internal static ListEvaluation Of(ListTask task, RunRequest request, double mostWork)
    {
        ListTask limited = task with { Limits = task.Limits with { Operations = Math.Min(mostWork, task.Limits.Operations) } };
        ListOutcome counted = CountingEngine.Evaluate(limited, request.Cancellation);
        if (counted.Evaluation is { } exact)
            return exact;
        if (counted.TooMuchWork && LeftOut.Select(l => Bounded(limited, l, request)).FirstOrDefault(b => b is not null) is { } bounded)
            return bounded;
        ListEvaluation simulated = SimulationEngine.Simulate(task, Runs, unchecked((ulong)request.Seed), Confidence, request.Cancellation).Evaluation!;
        return simulated with { Method = string.Create(CultureInfo.InvariantCulture, $"{simulated.Method}, since counting was refused: {counted.Refusal}") };
    }

    /// <summary>What was left out ends in some verdict, so it bounds each of them.</summary>
    private static ListEvaluation? Bounded(ListTask task, double leftOut, RunRequest request)
    {
        if (CountingEngine.Evaluate(task with { Limits = task.Limits with { Negligible = leftOut } }, request.Cancellation).Evaluation is not { } counted)
            return null;
        double missing = Math.Max(0, 1 - counted.Success.Value - counted.Failure.Value) + RoundOff;
        return counted with
        {
            Success = Between(counted.Success.Value, missing, most: false),
            Failure = Between(counted.Failure.Value, missing, most: true),
            Abort = Between(counted.Abort.Value, missing, most: true),
            Harm = Between(counted.Harm.Value, missing, most: true),
            Method = string.Create(CultureInfo.InvariantCulture, $"counted without paths less probable than {leftOut:0.#e0}, since all of them are too much work; those left out are {missing:0.#e0} together, which bounds every figure"),
        };
    }

    /// <summary>Sums of some million terms lose no more than this of 1.</summary>
    private const double RoundOff = 1e-14;

    /// <summary>The bound shown as the value is the one that does not flatter.</summary>
    private static Estimate Between(double least, double missing, bool most)
    {
        double greatest = Math.Min(1, least + missing);
        return new Estimate(most ? greatest : least, TruthLabel.Bound, least, greatest, 1);
    }
}
