using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement;

/// <summary>Mixes failure and harms with those under worse conditions. Runs are whole uses of the protocol: all copies of a run are alike.</summary>
internal static class DriftJudgement
{
    public static Outcome<DriftResult> Of(RunRequest request, Drift drift, IReadOnlyList<CaseResult> today)
    {
        Outcome<Setup> setup = Setup.From(request with { Conditions = drift.Conditions, Drift = null });
        if (setup.Value is not { } worse)
            return Outcome<DriftResult>.Failed(setup.Findings);
        List<Diagnostic> findings = [];
        List<Evaluated> all = RunJudgement.All(worse, findings, cheats: true);
        if (findings.Any(f => f.Severity == Severity.Error))
            return Outcome<DriftResult>.Failed([.. findings.Distinct()]);
        CaseResult[] then = [new CaseResult("honest", [], MetricGathering.Metrics(all)), .. CaseGathering.Cases(all)];
        return Outcome<DriftResult>.Of(new DriftResult(
            drift.Fraction, new InputFile(drift.Conditions.Name, drift.Conditions.Sha256), [.. today.Zip(then).Select(pair => Figure(pair.First, pair.Second, drift.Fraction))]));
    }

    private static DriftFigure Figure(CaseResult today, CaseResult then, double fraction)
    {
        string name = today.Dishonest.Count == 0 ? "failure" : "harm";
        Estimate now = today.Metrics.Single(m => m.Name == name).Estimate, worse = then.Metrics.Single(m => m.Name == name).Estimate;
        return new DriftFigure(today.Case, name, Mixed(now, 1 - fraction, worse, fraction), Mixed(worse, fraction, worse, 0));
    }

    /// <summary>a·x + b·y; the label is the weaker one, and ends add up as the values do.</summary>
    private static Estimate Mixed(Estimate x, double a, Estimate y, double b)
    {
        TruthLabel label = (TruthLabel)Math.Max((int)x.Label, (int)y.Label);
        double low = End(x.Low, a) + End(y.Low, b), high = End(x.High, a) + End(y.High, b);
        return new Estimate((a * x.Value) + (b * y.Value), label, low, high, Math.Min(x.Confidence, y.Confidence));
    }

    private static double End(double end, double factor) => factor == 0 ? 0 : end * factor;
}
