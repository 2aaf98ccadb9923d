using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>Builds the state that a protocol starts from.</summary>
public static class Resource
{
    /// <summary>The state a resource model gives, without its white noise (which engines mix in).</summary>
    /// <param name="model">How the state is prepared; files are read here.</param>
    /// <param name="parties">Number of qudits, and of levels of each.</param>
    public static Outcome<PreparedState> Prepare(ResourceModel model, int parties)
    {
        ArgumentNullException.ThrowIfNull(model);
        ArgumentOutOfRangeException.ThrowIfLessThan(parties, 1);
        Outcome<PreparedState> prepared = model.Preparation switch
        {
            IdealPreparation => Ideal(parties),
            ExchangePreparation exchange => ExchangePrepared.From(exchange, parties),
            RelaxedPreparation relaxed => RelaxedPrepared.From(relaxed, parties),
            FilePreparation file => Fit(StateFile.Read(file.File, file.Mend), file.File, parties),
            _ => throw new NotSupportedException($"No way to prepare {model.Preparation.GetType().Name} is known."),
        };
        return prepared.Value is { } state && model.PhysicalLevels is { } levels
            ? new Outcome<PreparedState>(LevelOrdering.Of(state, levels), prepared.Findings)
            : prepared;
    }

    private static Outcome<PreparedState> Ideal(int parties) =>
        parties <= AntisymmetricState.MostParties
            ? Outcome<PreparedState>.Of(new() { Parties = parties, Levels = parties, Ket = AntisymmetricState.Ket(parties) })
            : Outcome<PreparedState>.Failed([StateMessages.TooManyParties(parties)]);

    internal static Outcome<PreparedState> Fit(Outcome<PreparedState> read, string file, int parties) =>
        read.Value is { } state && (state.Parties != parties || state.Levels != parties)
            ? Outcome<PreparedState>.Failed([.. read.Findings, StateMessages.OtherSize(file, state, parties)])
            : read;
}
