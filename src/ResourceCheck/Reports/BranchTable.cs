using ResourceCheck.Engines;

namespace ResourceCheck.Reports;

/// <summary>Histories of outcomes as a table.</summary>
internal static class BranchTable
{
    /// <summary>Histories are told by exact engines only.</summary>
    private const string Exact = "exact";

    /// <summary>One row a history.</summary>
    public static Table Of(IEnumerable<BranchEvaluation> branches) => new(
        [new("outcomes", "Outcomes"), new("probability", "Probability", Lead: "probability "), new("fidelity", "Fidelity", Lead: "fidelity "), new("label", "Label")],
        [.. branches.Select(b => (IReadOnlyList<Cell>)[Cell.Of(Outcomes(b)), Cell.Of(b.Probability), Cell.Of(b.Fidelity), Cell.Of(Exact)])],
        Headed: false);

    /// <summary>Names and values of a history in one line.</summary>
    public static string Outcomes(BranchEvaluation branch) =>
        branch.Outcomes.Count == 0 ? "no outcomes yet" : string.Join(", ", branch.Outcomes.Select(o => $"{o.Key} = {o.Value}"));
}
