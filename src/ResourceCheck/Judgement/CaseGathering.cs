using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>Puts cheating strategies together over all inputs and listed parameter values: the greatest harm of each.</summary>
internal static class CaseGathering
{
    public static IEnumerable<CaseResult> Cases(IReadOnlyList<Evaluated> all) => Worst(all).Select(c => new CaseResult(
        c.Worst.Case.Name, [.. c.Worst.Case.By.Select(p => c.Of.Setting.Protocol.Parties[p])], [.. Metrics(c.Worst, c.Range, all.Count > 1)]));

    public static IReadOnlyList<AttackResult> Attacks(IReadOnlyList<Evaluated> all) =>
        [.. Worst(all).Select(c => new AttackResult(c.Worst.Case.Name, all.Count > 1 ? c.Worst.At : null, c.Worst.Choices, c.Worst.Harm, c.Worst.Average, c.Worst.Method))];

    private static IEnumerable<(Evaluated Of, CheatEvaluation Worst, (double Low, double High)? Range)> Worst(IReadOnlyList<Evaluated> all)
    {
        (Evaluated Of, CheatEvaluation Cheat)[] cheats = [.. all.SelectMany(e => e.Cheats.Select(c => (e, c)))];
        foreach (IGrouping<string, (Evaluated Of, CheatEvaluation Cheat)> alike in cheats.GroupBy(c => c.Cheat.Case.Name))
        {
            (Evaluated of, CheatEvaluation worst) = alike.MaxBy(c => c.Cheat.Harm.Value);
            yield return (of, worst, MetricGathering.Range(alike.Select(c => c.Cheat.Harm.Value)));
        }
    }

    private static IEnumerable<MetricResult> Metrics(CheatEvaluation cheat, (double Low, double High)? range, bool several)
    {
        yield return new MetricResult("harm", cheat.Harm, null, range, several ? cheat.At : null);
        if (cheat.Average is { } average)
            yield return new MetricResult("harm on average", average, null, null, several ? cheat.At : null);
        if (cheat.Copies is not { } copies)
            yield break;
        if (cheat.Case.Success is not null)
            yield return new MetricResult("success", copies.Success, null, null, null);
        yield return new MetricResult("copies kept", Estimate.Exact(copies.Yield), null, null, null);
        foreach (CheckpointEvaluation look in copies.Checkpoints.Skip(MetricGathering.BuiltIn))
            yield return new MetricResult($"fidelity {look.Label}", look.Fidelity, null, null, null);
    }
}
