using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.Collective;

namespace ResourceCheck.Resources;

/// <summary>What collective decay leaves of a start.</summary>
internal static class RelaxedPrepared
{
    /// <summary>A density operator of five emitters takes 149 MiB; six would take 32 GiB.</summary>
    public const int MostParties = 5;

    /// <summary>Less than this is left of copies without a photon only by rounding.</summary>
    private const double Nothing = 1e-14;

    public static Outcome<PreparedState> From(RelaxedPreparation relaxed, int parties)
    {
        if (parties > MostParties)
            return Outcome<PreparedState>.Failed([StateMessages.RelaxedTooManyParties(parties, MostParties)]);
        Outcome<PreparedState> start = Start(relaxed.Start, parties);
        if (start.Value is not { } state)
            return start;
        (Complex[] density, double error) = CollectiveDecay.Evolve(relaxed.Decay, state.Density ?? StartStates.Operator(state.Ket!));
        int size = (int)Math.Round(Math.Sqrt(density.Length));
        double kept = CollectiveDecay.Trace(density, size);
        if (!(kept > Nothing))
            return Outcome<PreparedState>.Failed([StateMessages.NothingWithoutPhoton()]);
        return new Outcome<PreparedState>(
            new PreparedState
            {
                Parties = parties,
                Levels = parties,
                Density = [.. density.Select(x => x / kept)],
                Probability = Math.Min(kept, 1),
                IntegrationError = error,
            },
            start.Findings);
    }

    /// <summary>The state that relaxation starts from; a file is read here.</summary>
    public static Outcome<PreparedState> Start(RelaxedStart start, int parties)
    {
        if (start.File is { } file)
            return Resource.Fit(StateFile.Read(file, false), file, parties);
        Complex[] ket = start.Levels is { } levels ? StartStates.Product(levels, parties) : StartStates.Pair(start.Bystanders!, parties);
        return Outcome<PreparedState>.Of(new PreparedState { Parties = parties, Levels = parties, Ket = ket });
    }
}
