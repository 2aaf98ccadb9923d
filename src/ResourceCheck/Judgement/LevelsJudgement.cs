using System.Globalization;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;

namespace ResourceCheck.Judgement;

/// <summary>Compares which physical level plays which value of the script: failure and harms under every assignment.</summary>
internal static class LevelsJudgement
{
    /// <summary>Path in the conditions that says which physical level plays which value.</summary>
    private const string Path = "resource.levels";

    /// <summary>All orders of more levels than this are too many evaluations.</summary>
    private const int MostLevels = 4;

    public static Outcome<IReadOnlyList<LevelsResult>> Of(Setup setup)
    {
        int levels = setup.Settings.Max(s => s.Protocol.Levels);
        if (levels > MostLevels || setup.Settings.Any(s => s.Protocol.Levels != levels))
            return Outcome<IReadOnlyList<LevelsResult>>.Failed([JudgementMessages.TooManyLevels(levels, MostLevels)]);
        int[] today = [.. setup.Settings[0].World.Resource.PhysicalLevels ?? Enumerable.Range(0, levels)];
        List<LevelsResult> results = [];
        foreach (int[] order in Orders([], levels))
        {
            Outcome<LevelsResult> one = Under(setup.Request, order, order.SequenceEqual(today));
            if (one.Value is not { } result)
                return Outcome<IReadOnlyList<LevelsResult>>.Failed(one.Findings);
            results.Add(result);
        }

        return Outcome<IReadOnlyList<LevelsResult>>.Of([.. results.OrderBy(r => r.Greatest)]);
    }

    private static Outcome<LevelsResult> Under(RunRequest request, int[] order, bool today)
    {
        string text = $"[{string.Join(", ", order.Select(l => l.ToString(CultureInfo.InvariantCulture)))}]";
        RunRequest changed = request with { Overrides = [.. request.Overrides.Where(o => o.Key != Path), new(Path, text)], Drift = null, TryLevels = false };
        Outcome<Setup> setup = Setup.From(changed);
        if (setup.Value is not { } read)
            return Outcome<LevelsResult>.Failed(setup.Findings);
        List<Diagnostic> findings = [];
        List<Evaluated> all = RunJudgement.All(read, findings, cheats: true);
        if (findings.Any(f => f.Severity == Severity.Error))
            return Outcome<LevelsResult>.Failed([.. findings.Distinct()]);
        CaseFigure[] figures =
        [
            .. MetricGathering.Metrics(all).Where(m => m.Name == "failure").Select(m => new CaseFigure("honest", m.Name, m.Estimate)),
            .. CaseGathering.Cases(all).SelectMany(c => c.Metrics.Where(m => m.Name == "harm").Select(m => new CaseFigure(c.Case, m.Name, m.Estimate))),
        ];
        return Outcome<LevelsResult>.Of(new LevelsResult(order, today, figures));
    }

    private static IEnumerable<int[]> Orders(int[] before, int levels) => before.Length == levels
        ? [before]
        : Enumerable.Range(0, levels).Except(before).SelectMany(l => Orders([.. before, l], levels));
}

/// <summary>Failure and harms when physical levels play the script's values in one way.</summary>
/// <param name="Levels">The physical level that plays value 0, 1, and so on.</param>
/// <param name="Today">Whether the conditions say so.</param>
/// <param name="Figures">Failure of the honest case, harm of each strategy.</param>
public sealed record LevelsResult(IReadOnlyList<int> Levels, bool Today, IReadOnlyList<CaseFigure> Figures)
{
    /// <summary>The greatest of failure and harms, by which assignments are compared.</summary>
    public double Greatest => Figures.Max(f => f.Value.Value);
}

/// <summary>One figure of one case.</summary>
/// <param name="Case"><c>honest</c> or the name of a dishonest block.</param>
/// <param name="Name"><c>failure</c> or <c>harm</c>.</param>
/// <param name="Value">The worst over inputs and listed parameter values.</param>
public sealed record CaseFigure(string Case, string Name, Estimate Value);
