using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>
/// What the world does to a protocol's qudits and messages, resolved for its parties and number of levels.
/// Everything that a conditions file leaves out is ideal here.
/// </summary>
public sealed record World
{
    /// <summary>One-line description; empty when there is none.</summary>
    public string About { get; init; } = "";

    /// <summary>Levels of each qudit.</summary>
    public required int Levels { get; init; }

    /// <summary>How the shared state starts.</summary>
    public ResourceModel Resource { get; init; } = ResourceModel.Ideal;

    /// <summary>Collective decay before the particles part; null when there is no storage.</summary>
    public CollectiveModel? Storage { get; init; }

    /// <summary>Preparation rate; null when the conditions do not give it.</summary>
    public PreparationModel? Preparation { get; init; }

    /// <summary>What happens to each party's qudit, indexed like the protocol's parties (outsiders included, as ideal).</summary>
    public required IReadOnlyList<PartyWorld> Parties { get; init; }

    /// <summary>Classical messages.</summary>
    public required MessageModel Messages { get; init; }

    /// <summary>The ideal world: nothing decays, everything is instant.</summary>
    /// <param name="parties">Number of parties.</param>
    /// <param name="levels">Levels of each qudit.</param>
    public static World Ideal(int parties, int levels) => new()
    {
        Levels = levels,
        Parties = [.. Enumerable.Repeat(PartyWorld.Ideal(levels), parties)],
        Messages = MessageModel.Instant(parties),
    };
}

/// <summary>Preparation attempts and their success.</summary>
/// <param name="Attempts">Attempts per second.</param>
/// <param name="Success">Probability that an attempt gives a copy.</param>
public sealed record PreparationModel(Rate Attempts, Probability Success);

/// <summary>Everything that acts on one party's qudit.</summary>
public sealed record PartyWorld
{
    /// <summary>The way from the source.</summary>
    public required FlightModel Flight { get; init; }

    /// <summary>Transfer from emitter to flying encoding; null when the emitter itself travels.</summary>
    public InterfaceModel? Interface { get; init; }

    /// <summary>What acts while the qudit is held.</summary>
    public required HoldingModel Waiting { get; init; }

    /// <summary>Local unitaries.</summary>
    public required OperationModel Operations { get; init; }

    /// <summary>Measurements.</summary>
    public required DetectionModel Detection { get; init; }

    /// <summary>A party to whom nothing bad happens.</summary>
    public static PartyWorld Ideal(int levels) => new()
    {
        Flight = FlightModel.Ideal(levels),
        Waiting = HoldingModel.Ideal(levels),
        Operations = OperationModel.Ideal,
        Detection = DetectionModel.Ideal(levels),
    };
}

/// <summary>The transfer of a qudit from its emitter.</summary>
/// <param name="Efficiency">Probability that the qudit is transferred; else it is lost.</param>
/// <param name="Depolarising">Depolarising probability of the transfer.</param>
public sealed record InterfaceModel(double Efficiency, double Depolarising);
