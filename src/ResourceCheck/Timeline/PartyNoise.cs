using ResourceCheck.Conditions;
using ResourceCheck.Quantities;

namespace ResourceCheck.Timeline;

/// <summary>The noise of a party's world as plan steps; what does nothing gives no step.</summary>
internal static class PartyNoise
{
    /// <summary>Everything on the way from the source, the herald last.</summary>
    public static IEnumerable<PlanStep> Flight(int party, PartyWorld world)
    {
        FlightModel flight = world.Flight;
        if (world.Interface is { } transfer)
            yield return new NoisePlanStep(party, Transfer(transfer, flight.Transmission.Length), Source.Interface);
        if (!flight.Dynamics.IsStill && flight.Time > Duration.Zero)
            yield return new NoisePlanStep(party, new SiteNoise { Dynamics = flight.Dynamics, Time = flight.Time }, Source.FlightDecay);
        if (HasFlightNoise(flight))
            yield return new NoisePlanStep(party, FlightNoise(flight), Source.FlightNoise);
        if (flight.Transmission.Any(t => t < 1))
            yield return new NoisePlanStep(party, new SiteNoise { Transmission = flight.Transmission }, Source.Loss);
        if (flight.Heralded)
            yield return new HeraldPlanStep(party);
    }

    /// <summary>A held qudit for a time; null when nothing happens to it.</summary>
    public static NoisePlanStep? Waiting(int party, HoldingModel model, Duration time)
    {
        bool still = model.Dynamics.IsStill && model.Kraus is null && model.LeakageProbability.All(p => p == 0);
        return still || time <= Duration.Zero
            ? null
            : new NoisePlanStep(
                party,
                new SiteNoise { Dynamics = model.Dynamics, Time = time, LeakageProbability = model.LeakageProbability, Kraus = model.Kraus },
                Source.Waiting);
    }

    /// <summary>Whether anything in a party's world can empty its levels.</summary>
    public static bool CanLose(PartyWorld world) =>
        world.Interface is { Efficiency: < 1 }
        || world.Flight.Transmission.Any(t => t < 1)
        || world.Flight.LeakageProbability.Any(p => p > 0)
        || world.Flight.Dynamics.Leaks
        || world.Waiting.Dynamics.Leaks
        || world.Waiting.LeakageProbability.Any(p => p > 0);

    private static SiteNoise Transfer(InterfaceModel transfer, int levels) => new()
    {
        Depolarising = transfer.Depolarising,
        Transmission = [.. Enumerable.Repeat(transfer.Efficiency, levels)],
    };

    private static bool HasFlightNoise(FlightModel f) =>
        f.Rotation is not null || f.PhaseFactors is not null || f.Dephasing > 0 || f.Depolarising > 0 || f.Kraus is not null || f.LeakageProbability.Any(p => p > 0);

    /// <summary>Noise on the way, without decay and loss.</summary>
    internal static SiteNoise FlightNoise(FlightModel flight) => new()
    {
        LeakageProbability = flight.LeakageProbability,
        Rotation = flight.Rotation,
        PhaseFactors = flight.PhaseFactors,
        Dephasing = flight.Dephasing,
        Depolarising = flight.Depolarising,
        Kraus = flight.Kraus,
    };
}
