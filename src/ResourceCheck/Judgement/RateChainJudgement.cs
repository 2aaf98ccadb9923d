using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Quantities;

namespace ResourceCheck.Judgement;

/// <summary>Builds the rate chain of a run from its evaluation with the lowest rate.</summary>
internal static class RateChainJudgement
{
    /// <summary>Behind <c>prepared</c> comes <c>stored</c>.</summary>
    private const int Stored = 1;

    /// <summary>A probability nearer to 1 is 1.</summary>
    private const double RoundOff = 1e-12;

    public static RateChain Of(IReadOnlyList<Evaluated> all)
    {
        Evaluated worst = all.MaxBy(e => RunJudgement.SecondsPerKeptCopy(e.Setting, e.Actual.Yield) ?? (1 / e.Actual.Yield))!;
        PreparationModel? preparation = worst.Setting.World.Preparation;
        double occupied = worst.Setting.Plan.Duration.Seconds;
        double? period = preparation is null ? null : RunJudgement.PreparationPeriod(preparation);
        return new RateChain
        {
            Stages = [.. WithRates(preparation, [.. Copies(worst, preparation, period, occupied)], worst)],
            PreparationPeriod = period,
            Occupied = occupied,
            Pace = period is { } time ? Pace(time, occupied) : null,
            At = worst.At,
        };
    }

    /// <summary>The stages that a copy passes, without rates.</summary>
    private static IEnumerable<RateStage> Copies(Evaluated worst, PreparationModel? preparation, double? period, double occupied)
    {
        Evaluation found = worst.Actual;
        PartyWorld[] holders = [.. worst.Setting.Protocol.Holders.Select(p => worst.Setting.World.Parties[p])];
        double photonless = found.Checkpoints[Stored].Kept, transferred = holders.Where(h => h.Flight.Heralded).Aggregate(1.0, (p, h) => p * (h.Interface?.Efficiency ?? 1));
        yield return new("attempts", null, null, preparation is null ? "the conditions give no rate" : "attempts to prepare a copy");
        yield return new("preparation", Exact(preparation?.Success.Value ?? 1), null, "an attempt gives a copy");
        yield return new("parties free", Exact(period is { } time ? Math.Min(1, time / occupied) : 1), null, Free(period, occupied));
        if (photonless < 1 - RoundOff)
            yield return new("no photon", Exact(photonless), null, "copies that emitted a photon are dropped");
        yield return new("interface", Exact(transferred), null, holders.Any(h => h.Interface is not null) ? "all heralded qudits leave their emitters" : "no interface");
        yield return new("flight", Exact(found.Heralded / photonless / transferred), null, "all heralded qudits arrive");
        yield return new("herald", Exact(1), null, Heralds(worst));
        yield return new("detection", Exact(found.Seen), null, found.Seen < 1 - RoundOff ? "copies with a missing click are dropped by announcement" : "no copy is dropped for a missing click");
        yield return new("sifting", Exact(found.Kept), null, found.Kept < 1 - RoundOff ? "what the script keeps" : "the script keeps all");
    }

    /// <summary>The stages with the rates behind them, followed by list and verdict.</summary>
    private static IEnumerable<RateStage> WithRates(PreparationModel? preparation, IReadOnlyList<RateStage> stages, Evaluated worst)
    {
        double? rate = preparation?.Attempts.PerSecond;
        foreach (RateStage stage in stages)
        {
            rate *= stage.Probability?.Value ?? 1;
            yield return stage with { Rate = rate };
        }

        if (RunJudgement.ListOf(worst.Setting, worst.Actual.Yield) is { } list)
        {
            rate = 1 / list.Seconds;
            yield return new("list", null, rate, $"{FigureText.Number(list.Copies)} kept copies make one list, and the discussion follows");
        }

        yield return new("verdict", worst.Actual.Success, rate * worst.Actual.Success.Value, "success");
    }

    private static Estimate Exact(double probability) => Estimate.Exact(Math.Min(1, probability)); // a quotient of equal numbers may exceed 1 by round-off

    private static string Free(double? period, double occupied) => period switch
    {
        null => "not known without a preparation rate",
        _ when period < occupied => "copies prepared while an earlier one occupies the parties are not used",
        _ => "the parties are done with a copy before the next is prepared",
    };

    private static string Heralds(Evaluated worst)
    {
        World world = worst.Setting.World;
        ILookup<bool, string> parties = worst.Setting.Protocol.Holders.Where(p => Loses(world.Parties[p])).ToLookup(p => world.Parties[p].Flight.Heralded, p => worst.Setting.Protocol.Parties[p]);
        string unheralded = $"losses on the way to {Words.And(parties[false])} are not heralded: they show as missing clicks";
        return (parties[true].Any(), parties[false].Any()) switch
        {
            (false, false) => "nothing is lost on the way",
            (true, false) => "copies with a loss are dropped, all parties know which",
            (true, true) => $"copies with a loss on the way to {Words.And(parties[true])} are dropped; {unheralded}",
            _ => unheralded,
        };
    }

    private static bool Loses(PartyWorld party) => party.Interface is { Efficiency: < 1 } || party.Flight.Transmission.Any(t => t < 1);

    private static string Pace(double period, double occupied) => period >= occupied
        ? $"A copy is prepared every {FigureText.Time(period)} and occupies the parties for {FigureText.Time(occupied)}: preparation sets the pace."
        : $"A copy occupies the parties for {FigureText.Time(occupied)}, longer than the {FigureText.Time(period)} between two prepared copies: the parties set the pace.";
}
