using ResourceCheck.Judgement;

namespace ResourceCheck.Reports;

/// <summary>The report of <c>verify</c>: each claim, and what breaks the refuted ones.</summary>
internal static class VerifyReport
{
    /// <summary>Builds the report.</summary>
    public static Report From(VerifyResult verification)
    {
        Table claims = Claims(verification.Claims);
        return new Report(
            Headline(verification),
            verification.Claims.Count == 0 ? null : verification.Verdict switch { ClaimVerdict.Proved => true, ClaimVerdict.Refuted => false, _ => null },
            [new Section(null, claims, []), .. verification.Claims.Where(c => c.Breaking.Count > 0).Select(Broken)],
            claims,
            Provenance.Of(verification),
            verification.Warnings);
    }

    /// <summary>A verdict's name in every format.</summary>
    public static string Name(ClaimVerdict verdict) => verdict switch
    {
        ClaimVerdict.Proved => "proved",
        ClaimVerdict.Refuted => "refuted",
        ClaimVerdict.OutsideRequirements => "outside requirements",
        _ => "not verified",
    };

    private static string Headline(VerifyResult verification)
    {
        string[] texts = [.. verification.Claims.Select(c => c.Text).Distinct()];
        int refuted = CountTexts(verification, ClaimVerdict.Refuted);
        int open = CountTexts(verification, ClaimVerdict.NotVerified);
        string of = texts.Length == 1 ? "The claim" : $"of {texts.Length} claims";
        return (texts.Length, refuted, open, Proved(verification)) switch
        {
            (0, _, _, _) => "The script makes no claims, so there is nothing to verify.",
            (1, > 0, _, _) => $"{of} is refuted{At(verification, ClaimVerdict.Refuted)}.",
            (_, > 0, _, _) => $"{refuted} {of} {(refuted == 1 ? "is" : "are")} refuted{At(verification, ClaimVerdict.Refuted)}.",
            (1, _, > 0, _) => $"{of} could not be verified{At(verification, ClaimVerdict.NotVerified)}.",
            (int all, _, int undone, _) when undone == all => $"None of the {all} claims could be verified{At(verification, ClaimVerdict.NotVerified)}; none is refuted.",
            (_, _, > 0, _) => $"{open} {of} could not be verified{At(verification, ClaimVerdict.NotVerified)}; none is refuted.",
            (_, _, _, false) => "Nothing was verified: the script's requirements exclude every parameter value asked for.",
            (1, _, _, _) => $"{of} holds{At(verification, ClaimVerdict.Proved)}.",
            _ => $"All {texts.Length} claims hold{At(verification, ClaimVerdict.Proved)}.",
        };
    }

    private static bool Proved(VerifyResult verification) => verification.Claims.Any(c => c.Verdict == ClaimVerdict.Proved);

    private static int CountTexts(VerifyResult verification, ClaimVerdict verdict) =>
        verification.Claims.Where(c => c.Verdict == verdict).Select(c => c.Text).Distinct().Count();

    private static string At(VerifyResult verification, ClaimVerdict verdict)
    {
        string[] at = [.. verification.Claims.Where(c => c.Verdict == verdict).Select(c => c.Parameters).Where(p => p.Length > 0).Distinct()];
        return at.Length == 0 ? "" : $" for {string.Join("; ", at)}";
    }

    private static Table Claims(IReadOnlyList<ClaimResult> claims) => new(
        [
            new("claim", "Claim"),
            new("parameters", "Parameters"),
            new("verdict", "Verdict"),
            new("left", "Left side"),
            new("right", "Right side"),
            new("label", "Label"),
            new("reason", "Reason"),
        ],
        [.. claims.Select(c => (IReadOnlyList<Cell>)
        [
            Cell.Of(c.Text),
            Cell.Of(c.Parameters),
            Cell.Of(Name(c.Verdict)),
            Cell.Of(c.Left),
            Cell.Of(c.Right),
            Cell.Of(c.Left is null or double.NaN || c.Right is null or double.NaN ? null : Truth.Name(c.Label)),
            Cell.Of(c.Reason),
        ])]);

    private static Section Broken(ClaimResult claim) => new(
        $"{claim.Text}{(claim.Parameters.Length == 0 ? "" : $" ({claim.Parameters})")} is broken by", BranchTable.Of(claim.Breaking), []);
}
