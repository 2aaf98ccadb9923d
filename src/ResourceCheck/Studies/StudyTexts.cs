using ResourceCheck.Engines;
using ResourceCheck.Reports;

namespace ResourceCheck.Studies;

/// <summary>What stands in every report: what is assumed, how figures were found, what they are not, and the literature of the methods used.</summary>
internal static class StudyTexts
{
    /// <summary>What is trusted and what is modelled.</summary>
    public static IReadOnlyList<PageItem> Assumptions(StudyResult result)
    {
        bool lists = result.Parts.Any(p => p.Run?.List is not null), cheats = result.Parts.Any(p => p.Run?.Attacks.Count > 0);
        (string What, string Assumed)[] rows =
        [
            ("Source and calibration", "trusted; the values of the conditions files are taken as they stand, with their uncertainties where these are carried through"),
            ("Noise", "modelled as the conditions say: white noise and shared decay at preparation, decay, dephasing, depolarising, rotations, loss and leakage per party and stage, imperfect operations and readout"),
            ("Copies", "independent and alike; a drift that moves all copies of a run together is outside the model unless --drift asks for it"),
            ("Lost qudits and missing clicks", "heralded losses and announced missing clicks drop the copy; figures are then of the copies that are left, and the yield says how many"),
            .. lists || cheats ? [("Messages", "authenticated; what anybody announces reaches all alike, a dishonest party's announcements included")] : Array.Empty<(string, string)>(),
            .. cheats ? [("Dishonest parties", "the strategies listed in the scripts, at their worst numbers; other strategies may do more harm")] : Array.Empty<(string, string)>(),
        ];
        Table table = new([new("what", "About"), new("assumed", "Assumed")], [.. rows.Select(r => (IReadOnlyList<Cell>)[Cell.Of(r.What), Cell.Of(r.Assumed)])]);
        return [new PageItem(null, "assumptions", null, null, [new Section(null, table, [])], table, [])];
    }

    /// <summary>How figures were found and what they are not.</summary>
    public static IReadOnlyList<PageItem> Method(StudyResult result)
    {
        string[] engines = [.. result.Parts.Select(p => p.Run?.Engine.Name).OfType<string>().Distinct()];
        return [PageItem.Of(null,
        [
            $"Engines: {string.Join(", ", engines)}. Each figure carries its label: exact (followed through every branch, up to round-off), bound (at least or at most what is shown), sampled (with its interval).",
            "Fidelity is that with the ideal resource or with what the protocol makes of it, of the copies that are kept. Loss is ideal minus actual.",
            .. result.Parts.Any(p => p.Budget is not null) ? ["Loss is shared out by Shapley's value: the mean, over all orders of adding sources, of what one adds."] : Array.Empty<string>(),
            .. result.Parts.Any(p => p.Tolerances.Count > 0) ? ["Tolerated values are bracketed by a scan and found by Brent's method; two crossings within one step of the scan would not be seen."] : Array.Empty<string>(),
            .. result.Parts.Any(p => p.Run?.Uncertainty is not null) ? ["Uncertainties are carried through to first order with derivatives by differences, and checked by drawing the values from normal laws cut off at what they may be."] : Array.Empty<string>(),
            Report.Caution,
            "\"Goal met\" holds for the values entered, and \"not met\" proves no impossibility. A deployment is judged under the standards that apply, by accredited evaluators.",
            "Random numbers of the program are no secret keys. Reports hold file names and what the study file says: read them before sharing.",
            "Laboratory work with lasers (infrared light in fibres cannot be seen), high voltage and cryogens follows local rules and licensed practice; nothing here replaces them.",
        ])];
    }

    /// <summary>Literature of the methods used.</summary>
    public static IReadOnlyList<PageItem> References(StudyResult result)
    {
        bool sampled = result.Parts.Any(p => p.Run?.Cases.SelectMany(c => c.Metrics).Any(m => m.Estimate.Label == TruthLabel.Sampled) ?? false);
        return [PageItem.Of(null,
        [
            .. result.Parts.Any(p => p.Budget is not null) ? ["L. S. Shapley, A value for n-person games, in Contributions to the Theory of Games II, Annals of Mathematics Studies 28, 307 (1953)."] : Array.Empty<string>(),
            .. result.Parts.Any(p => p.Tolerances.Count > 0) ? ["R. P. Brent, Algorithms for Minimization without Derivatives, chapter 4 (1973)."] : Array.Empty<string>(),
            .. result.Parts.Any(p => p.Run?.Uncertainty is not null) ? ["Evaluation of measurement data: Guide to the expression of uncertainty in measurement, JCGM 100:2008; its supplement 1 on Monte Carlo, JCGM 101:2008."] : Array.Empty<string>(),
            .. sampled ? ["C. J. Clopper and E. S. Pearson, Biometrika 26, 404 (1934)."] : Array.Empty<string>(),
            "R. Jozsa, Fidelity for mixed quantum states, Journal of Modern Optics 41, 2315 (1994).",
        ])];
    }
}
