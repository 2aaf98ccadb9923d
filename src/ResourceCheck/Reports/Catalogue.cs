using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Resources;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Reports;

/// <summary>Cause and cure of every message, gathered from the steps that give them.</summary>
public static class Catalogue
{
    private static readonly Lazy<IReadOnlyList<Explanation>> Gathered = new(Gather);

    /// <summary>All explanations in order of code.</summary>
    public static IReadOnlyList<Explanation> All => Gathered.Value;

    private static IReadOnlyList<Explanation> Gather()
    {
        IReadOnlyList<Explanation>[] steps =
        [
            SyntaxCatalogue.All,
            BindingCatalogue.All,
            ConditionsCatalogue.All,
            StateCatalogue.All,
            JudgementCatalogue.All,
            StudyCatalogue.All,
            ResourceCheck.Studies.StudyFileMessages.Explanations,
            UsageCatalogue.All,
        ];
        return [.. steps.SelectMany(s => s).OrderBy(e => e.Code, StringComparer.Ordinal)];
    }
}
