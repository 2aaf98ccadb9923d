namespace ResourceCheck.Resources;

/// <summary>What <c>state</c> tells of a prepared state.</summary>
public sealed record StateDescription
{
    /// <summary>File name as the user gave it.</summary>
    public required string File { get; init; }

    /// <summary>SHA-256 of the file's bytes.</summary>
    public required string Sha256 { get; init; }

    /// <summary>Number of qudits.</summary>
    public required int Parties { get; init; }

    /// <summary>Levels of each.</summary>
    public required int Levels { get; init; }

    /// <summary>Whether the file held a state vector.</summary>
    public required bool IsVector { get; init; }

    /// <summary>Largest deviation from a Hermitian matrix, of the trace from 1, and the lowest eigenvalue, as read.</summary>
    public required (double Hermitian, double Trace, double LowestEigenvalue) Validity { get; init; }

    /// <summary>Figures in order; the second value is of the mended state when one was asked for.</summary>
    public required IReadOnlyList<StateFigure> Figures { get; init; }

    /// <summary>Populations of the basis states that hold most.</summary>
    public required IReadOnlyList<StatePopulation> Populations { get; init; }

    /// <summary>Trace distance between the state as read and the mended one; null when none was asked for.</summary>
    public required double? MendedBy { get; init; }

    /// <summary>Whether the numbers are a state as they are, within the tolerances, so that mending only moves round-off.</summary>
    public bool IsStateAsRead { get; init; } = true;
}

/// <summary>A population of a basis state.</summary>
/// <param name="Levels">Its levels, such as <c>0-2-1</c>.</param>
/// <param name="Value">Its population as read.</param>
/// <param name="Mended">Its population in the mended state; null when none was asked for.</param>
public sealed record StatePopulation(string Levels, double Value, double? Mended);

/// <summary>A figure of a state.</summary>
/// <param name="Name">Its name, such as <c>fidelity</c> or <c>negativity Ada | others</c>.</param>
/// <param name="Value">Its value for the state as read.</param>
/// <param name="Mended">Its value for the mended state; null when none was asked for.</param>
/// <param name="Label">Its truth label.</param>
public sealed record StateFigure(string Name, double Value, double? Mended, Engines.TruthLabel Label);
