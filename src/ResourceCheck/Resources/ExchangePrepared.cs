using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>Builds a state by exchange pulses, one step per further party; errors of an early step stay in all later ones.</summary>
internal static class ExchangePrepared
{
    /// <summary>The state after steps 1→2, …, N-1→N.</summary>
    public static Outcome<PreparedState> From(ExchangePreparation exchange, int parties)
    {
        List<Diagnostic> findings = [.. Check(exchange, parties)];
        return findings.Count > 0
            ? Outcome<PreparedState>.Failed(findings)
            : Outcome<PreparedState>.Of(new() { Parties = parties, Levels = parties, Ket = Lay(Build(exchange), parties) });
    }

    private static IEnumerable<Diagnostic> Check(ExchangePreparation exchange, int parties)
    {
        if (parties > ExchangePulse.MostParties)
            yield return StateMessages.ExchangeTooManyParties(parties);
        else if (exchange.Steps.Count != parties - 1)
            yield return StateMessages.ExchangeSteps(exchange.Steps.Count, parties);
        for (int s = 0; s < exchange.Steps.Count; s++)
        {
            if (!Fits(exchange.Steps[s], s + 2))
                yield return StateMessages.ExchangeCouplings(s + 1, s + 2);
        }
    }

    private static bool Fits(ExchangeStep step, int m) =>
        double.IsFinite(step.TimeError) && double.IsFinite(step.PhaseError)
        && step.Couplings.GetLength(0) == m && step.Couplings.GetLength(1) == m
        && step.Couplings.Cast<double>().All(double.IsFinite) && IsSymmetric(step.Couplings);

    private static bool IsSymmetric(double[,] j)
    {
        int m = j.GetLength(0);
        return Enumerable.Range(0, m * m).All(at => j[at / m, at % m] == j[at % m, at / m]);
    }

    private static Complex[] Build(ExchangePreparation exchange)
    {
        Complex[] state = [Complex.One];
        for (int s = 0; s < exchange.Steps.Count; s++)
        {
            ExchangeStep step = exchange.Steps[s];
            state = ExchangePulse.Apply(state, s + 2, step.Couplings, step.TimeError, step.PhaseError);
        }

        return state;
    }

    private static Complex[] Lay(Complex[] amplitudes, int parties)
    {
        Complex[] ket = new Complex[AntisymmetricState.Power(parties, parties)];
        int next = 0;
        foreach ((int[] levels, _) in Permutations.Of(parties))
            ket[Permutations.IndexOf(levels, parties)] = amplitudes[next++];
        return ket;
    }
}
