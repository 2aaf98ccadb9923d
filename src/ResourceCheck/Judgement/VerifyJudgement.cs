using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Judgement;

/// <summary>Proves or refutes claims under ideal conditions, exactly, for every parameter value asked for.</summary>
internal static class VerifyJudgement
{
    /// <summary>Two sides closer than this are equal: round-off of exact evaluations stays far below.</summary>
    private const double Equality = 1e-9;

    /// <summary>Breaking outcomes told per claim.</summary>
    private const int BreakingTold = 6;

    public static Outcome<VerifyResult> Of(Setup setup)
    {
        List<ClaimResult> claims = [.. setup.Settings.SelectMany(s => Claims(s, setup.Request))];
        return Outcome<VerifyResult>.Of(new VerifyResult(
            Provenance.Version,
            new InputFile(setup.Request.Script.Name, setup.Request.Script.Sha256),
            setup.Settings[0].Protocol.Name,
            claims,
            Whole(claims),
            [.. setup.Notes.Where(n => n.Code != "P010"), .. claims.Count == 0 ? [JudgementMessages.NoClaims(setup.Settings[0].Protocol.Source)] : Array.Empty<Diagnostic>()]));
    }

    private static ClaimVerdict Whole(List<ClaimResult> claims)
    {
        if (claims.Any(c => c.Verdict == ClaimVerdict.Refuted))
            return ClaimVerdict.Refuted;
        if (claims.Count == 0 || claims.Any(c => c.Verdict == ClaimVerdict.NotVerified))
            return ClaimVerdict.NotVerified;
        return claims.Any(c => c.Verdict == ClaimVerdict.Proved) ? ClaimVerdict.Proved : ClaimVerdict.OutsideRequirements;
    }

    private static IEnumerable<ClaimResult> Claims(Setting setting, RunRequest request)
    {
        if (setting.Protocol.Requirements.FirstOrDefault(r => !r.Holds) is { } broken)
            return setting.Protocol.Claims.Select(c => Undone(c, setting, ClaimVerdict.OutsideRequirements, $"the script requires {broken.Text}: {broken.Reason}"));
        Outcome<IReadOnlyList<Evaluation>> outcome = Evaluator.Evaluate(setting.Idealised(), request);
        if (outcome.Value is { } evaluations)
        {
            IReadOnlyList<CheatEvaluation> cheats = setting.Protocol.Claims.Any(c => Harmed(c) is not null) ? Evaluator.Cheats(setting.Idealised(), evaluations, request).Value ?? [] : [];
            return [.. setting.Protocol.Claims.Select((c, i) => Harmed(c) is { } name && cheats.Any(e => e.Case.Name == name) ? OnHarm(c, setting, name, cheats) : Worst(c, i, setting, evaluations, request))];
        }

        return setting.Protocol.Claims.Select(c => Undone(c, setting, ClaimVerdict.NotVerified, outcome.Findings[0].Message));
    }

    /// <summary>The case whose harm a claim compares with a number; null for other claims.</summary>
    private static string? Harmed(Claim claim) => claim is { Left: MetricFigure { Metric: { Kind: MetricKind.Harm } metric }, Right: NumberFigure } ? metric.Label : null;

    private static ClaimResult OnHarm(Claim claim, Setting setting, string name, IReadOnlyList<CheatEvaluation> cheats)
    {
        Estimate harm = cheats.Where(c => c.Case.Name == name).Select(c => c.Harm).MaxBy(h => h.Value)!;
        double right = ((NumberFigure)claim.Right).Value;
        ClaimVerdict verdict = Decide(claim.Comparison, harm, Estimate.Exact(right));
        string? reason = verdict == ClaimVerdict.NotVerified ? "the harm is known only as a bound that does not decide it" : null;
        return new ClaimResult(claim.Text, setting.Words, verdict, harm.Value, right, [], reason) { Label = harm.Label };
    }

    private static ClaimResult Undone(Claim claim, Setting setting, ClaimVerdict verdict, string reason) =>
        new(claim.Text, setting.Words, verdict, null, null, [], reason);

    private static ClaimResult Worst(Claim claim, int index, Setting setting, IReadOnlyList<Evaluation> evaluations, RunRequest request)
    {
        ClaimResult[] results = [.. evaluations.Select(e => One(claim, index, setting, e, request))];
        return results.FirstOrDefault(r => r.Verdict == ClaimVerdict.Refuted) ?? results.FirstOrDefault(r => r.Verdict == ClaimVerdict.NotVerified) ?? results[0];
    }

    private static ClaimResult One(Claim claim, int index, Setting setting, Evaluation evaluation, RunRequest request)
    {
        (Estimate left, Estimate right) = evaluation.Claims[index];
        string parameters = new Evaluated(setting, evaluation, evaluation).At;
        ClaimVerdict verdict = Decide(claim.Comparison, left, right);
        IReadOnlyList<BranchEvaluation> breaking = verdict == ClaimVerdict.Refuted ? BrokenBy(claim, setting, evaluation, left.Value, right.Value, request) : [];
        string? reason = verdict == ClaimVerdict.NotVerified ? Reason(left, right) : null;
        return new ClaimResult(claim.Text, parameters, verdict, left.Value, right.Value, breaking, reason) { Label = left.Label == TruthLabel.Exact ? right.Label : left.Label };
    }

    private static IReadOnlyList<BranchEvaluation> BrokenBy(Claim claim, Setting setting, Evaluation evaluation, double left, double right, RunRequest request)
    {
        if (Breaking.WouldMend(claim, setting.Protocol, left, right) is not { } success)
            return Breaking.Of(claim, setting.Protocol, evaluation, BreakingTold);
        Setting judged = setting with { Protocol = setting.Protocol with { Success = success } };
        IReadOnlyList<Evaluation> again = Evaluator.Evaluate(judged.Idealised(), request).Value!; // was evaluated once already
        return [.. again.First(e => e.Inputs.SequenceEqual(evaluation.Inputs)).Failures.Take(BreakingTold)];
    }

    private static string Reason(Estimate left, Estimate right) => double.IsNaN(left.Value) || double.IsNaN(right.Value)
        ? "a side is undefined: its checkpoint is never reached, its condition never holds, or it divides by zero"
        : "a side is known only as a bound that does not decide the claim";

    /// <summary>A bound decides a claim only when it lies on the right side.</summary>
    private static ClaimVerdict Decide(BinaryOperator comparison, Estimate left, Estimate right)
    {
        if (double.IsNaN(left.Value) || double.IsNaN(right.Value))
            return ClaimVerdict.NotVerified;
        bool atLeast = left.Low >= right.High - Equality, atMost = left.High <= right.Low + Equality;
        bool below = left.High < right.Low - Equality, above = left.Low > right.High + Equality;
        (bool holds, bool fails) = comparison switch
        {
            BinaryOperator.GreaterOrEqual => (atLeast, below),
            BinaryOperator.LessOrEqual => (atMost, above),
            _ => (atLeast && atMost, below || above),
        };
        return holds ? ClaimVerdict.Proved : fails ? ClaimVerdict.Refuted : ClaimVerdict.NotVerified;
    }
}
