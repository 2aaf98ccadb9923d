namespace ResourceCheck.Timeline;

/// <summary>Sources of loss that a budget tells apart.</summary>
public enum Source
{
    /// <summary>The prepared state.</summary>
    Preparation,

    /// <summary>Collective decay before the particles part.</summary>
    Storage,

    /// <summary>Transfer from emitter to flying encoding.</summary>
    Interface,

    /// <summary>Decay of levels on the way.</summary>
    FlightDecay,

    /// <summary>Rotation, phase noise, dephasing, depolarising and Kraus operators on the way.</summary>
    FlightNoise,

    /// <summary>Lost on the way.</summary>
    Loss,

    /// <summary>Decay while held.</summary>
    Waiting,

    /// <summary>Imperfect local unitaries.</summary>
    Operations,

    /// <summary>Imperfect measurements.</summary>
    Detection,
}
