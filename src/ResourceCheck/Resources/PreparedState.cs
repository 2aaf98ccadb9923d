using System.Numerics;

namespace ResourceCheck.Resources;

/// <summary>
/// A state of several qudits with as many levels each as the state has qudits or as told. First qudit is the most significant index.
/// At most one of <see cref="Ket"/> and <see cref="Density"/> is set; none for the antisymmetric state where nobody needs its amplitudes.
/// </summary>
public sealed record PreparedState
{
    /// <summary>Number of qudits N.</summary>
    public required int Parties { get; init; }

    /// <summary>Levels d of each qudit.</summary>
    public required int Levels { get; init; }

    /// <summary>State vector of d^N amplitudes, norm 1; null for a mixed state.</summary>
    public Complex[]? Ket { get; init; }

    /// <summary>Probability that the preparation succeeded where it was heralded; the state itself has trace 1.</summary>
    public double Probability { get; init; } = 1;

    /// <summary>Estimated error of probabilities found in it, from integrating collective decay; 0 where none was integrated.</summary>
    public double IntegrationError { get; init; }

    /// <summary>Density matrix, d^N × d^N, row after row, trace 1; null for a pure state.</summary>
    public Complex[]? Density { get; init; }
}
