namespace ResourceCheck.Conditions;

/// <summary>A world in which some parties' own apparatus is without noise; what they do takes as long as before.</summary>
internal static class PerfectHardware
{
    /// <summary>The world with these parties' way, memory, gates and detectors perfect; the state's preparation and storage stay as they are.</summary>
    public static World Of(World world, IReadOnlyList<int> parties) => world with { Parties = [.. world.Parties.Select((p, i) => parties.Contains(i) ? Perfect(p, world.Levels) : p)] };

    private static PartyWorld Perfect(PartyWorld party, int levels)
    {
        PartyWorld ideal = PartyWorld.Ideal(levels);
        return ideal with
        {
            Flight = ideal.Flight with { Length = party.Flight.Length, Time = party.Flight.Time },
            Operations = ideal.Operations with { Time = party.Operations.Time },
            Detection = ideal.Detection with { Time = party.Detection.Time },
        };
    }
}
