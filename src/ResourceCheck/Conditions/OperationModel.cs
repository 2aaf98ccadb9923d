using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>How a party's local unitaries come out.</summary>
/// <param name="Time">Duration; the qudit waits that long, then the unitary acts.</param>
/// <param name="Depolarising">Depolarising probability behind each unitary.</param>
/// <param name="OverRotation">ε: U^(1+ε) by the principal logarithm acts in place of U.</param>
public sealed record OperationModel(Duration Time, double Depolarising, double OverRotation)
{
    /// <summary>Instant and perfect.</summary>
    public static OperationModel Ideal { get; } = new(Duration.Zero, 0, 0);
}
