using System.Numerics;
using ResourceCheck.Engines;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>Lists the figures of a state, then evaluates each for the state as read and for the mended one.</summary>
internal static class StateDescriber
{
    /// <summary>Enough for all permutations of three levels, and for what disturbs them.</summary>
    private const int MostPopulations = 12;

    /// <summary>Populations that print as 0 are left out.</summary>
    private const double LeastPopulation = 1e-9;

    private sealed record Definition(string Name, Func<PreparedState, double> Evaluate, TruthLabel Label = TruthLabel.Exact);

    /// <summary>The description.</summary>
    public static StateDescription Describe(string file, string hash, CheckedState state) => new()
    {
        File = file,
        Sha256 = hash,
        Parties = state.Original.Parties,
        Levels = state.Original.Levels,
        IsVector = state.Original.Ket is not null,
        Validity = state.Validity,
        Figures = [.. Definitions(state.Original).Select(d => Evaluate(d, state))],
        Populations = Largest(state),
        MendedBy = state.MendedBy,
        IsStateAsRead = state.IsStateAsRead,
    };

    private static StateFigure Evaluate(Definition definition, CheckedState state)
    {
        double original = definition.Evaluate(state.Original);
        double? mended = state.Mended is null ? null : ReferenceEquals(state.Mended, state.Original) ? original : definition.Evaluate(state.Mended);
        return new(definition.Name, original, mended, definition.Label);
    }

    private static IEnumerable<Definition> Definitions(PreparedState state)
    {
        bool decomposed = state.Ket is not null || StateFigures.Dimension(state) <= HermitianMatrix.LargestDecomposed;
        if (state.Parties == state.Levels)
        {
            yield return new("fidelity", StateFigures.Fidelity);
            yield return new("fidelity after the best local unitaries, at least", StateFigures.FidelityInBestFrames, TruthLabel.Bound);
        }

        yield return new("purity", StateFigures.Purity);
        yield return new("linear entropy", s => 1 - StateFigures.Purity(s));
        if (decomposed)
            yield return new("entropy in bits", StateFigures.Entropy);
        yield return new("single parties from maximally mixed, largest trace distance", StateFigures.LargestSingleDeviation);
        if (state.Levels >= state.Parties)
        {
            yield return new("all levels distinct", s => StateFigures.AllDistinct(s, inFourierBasis: false));
            yield return new("all Fourier outcomes distinct", s => StateFigures.AllDistinct(s, inFourierBasis: true));
        }

        foreach (Bipartition cut in decomposed ? Bipartition.Cuts(state.Parties, state.Parties <= 4 ? 2 : 1) : [])
            yield return new($"negativity {cut}", s => StateFigures.Negativity(s, cut));
    }

    private static IReadOnlyList<StatePopulation> Largest(CheckedState state)
    {
        double[] populations = StateFigures.Populations(state.Original);
        double[]? mended = state.Mended is null ? null : StateFigures.Populations(state.Mended);
        return
        [
            .. Enumerable.Range(0, populations.Length)
                .Where(index => populations[index] >= LeastPopulation)
                .OrderByDescending(index => Math.Round(populations[index], 12))
                .ThenBy(index => index)
                .Take(MostPopulations)
                .Select(index => new StatePopulation(Label(index, state.Original), populations[index], mended?[index])),
        ];
    }

    private static string Label(int index, PreparedState state) => string.Join('-', StateFigures.LevelsOf(index, state));
}
