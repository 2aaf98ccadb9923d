using System.Globalization;
using ResourceCheck.Engines.Lists;

namespace ResourceCheck.Judgement;

/// <summary>Verdicts of a list protocol: by counting where that is possible, else from simulated runs.</summary>
internal static class ListVerdicts
{
    /// <summary>Runs simulated where counting is too much work: enough to tell 1e-3 from nothing.</summary>
    private const int Runs = 100_000;

    private const double Confidence = 0.99;

    public static ListEvaluation Of(ListTask task, RunRequest request)
    {
        ListOutcome counted = CountingEngine.Evaluate(task, request.Cancellation);
        if (counted.Evaluation is { } exact)
            return exact;
        ListEvaluation simulated = SimulationEngine.Simulate(task, Runs, unchecked((ulong)request.Seed), Confidence, request.Cancellation).Evaluation!;
        return simulated with { Method = string.Create(CultureInfo.InvariantCulture, $"{simulated.Method}, since counting was refused: {counted.Refusal}") };
    }
}
