using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement;

/// <summary>The result document of <c>verify</c>.</summary>
/// <param name="Version">Program version.</param>
/// <param name="Protocol">The script.</param>
/// <param name="Title">Name in the <c>protocol</c> line.</param>
/// <param name="Claims">One entry per claim and parameter assignment.</param>
/// <param name="Verdict">Proved when all are, refuted when one is, else not verified.</param>
/// <param name="Warnings">Warnings and notes.</param>
public sealed record VerifyResult(
    string Version, InputFile Protocol, string Title, IReadOnlyList<ClaimResult> Claims, ClaimVerdict Verdict, IReadOnlyList<Diagnostic> Warnings);

/// <summary>One claim at one parameter assignment; the worst over the private inputs.</summary>
/// <param name="Text">The claim as written.</param>
/// <param name="Parameters">Parameter assignment, such as <c>n = 4</c>; empty when there are no parameters.</param>
/// <param name="Verdict">Proved, refuted, not verified or outside the script's requirements.</param>
/// <param name="Left">Left side; null when not computed.</param>
/// <param name="Right">Right side; null when not computed.</param>
/// <param name="Breaking">Outcomes that break it with their probability, most probable first; empty unless refuted.</param>
/// <param name="Reason">Why it was not verified, in words; null otherwise.</param>
public sealed record ClaimResult(
    string Text, string Parameters, ClaimVerdict Verdict, double? Left, double? Right, IReadOnlyList<BranchEvaluation> Breaking, string? Reason)
{
    /// <summary>The weaker label of the two sides.</summary>
    public TruthLabel Label { get; init; } = TruthLabel.Exact;
}

/// <summary>What became of a claim.</summary>
public enum ClaimVerdict
{
    /// <summary>Holds, to 1e-9.</summary>
    Proved,

    /// <summary>Does not hold.</summary>
    Refuted,

    /// <summary>Could not be computed here.</summary>
    NotVerified,

    /// <summary>The script's requirements exclude these parameter values.</summary>
    OutsideRequirements,
}
