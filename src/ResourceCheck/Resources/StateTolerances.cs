namespace ResourceCheck.Resources;

/// <summary>How far a file's numbers may be from a state. Common practice, no source: each bound is well above the round-off of its numbers.</summary>
/// <param name="Hermitian">Largest |ρ_rc - ρ*_cr|.</param>
/// <param name="Trace">Largest deviation of the trace, or of a vector's squared norm, from 1; text files often carry six or seven digits.</param>
/// <param name="Negative">Eigenvalues down to minus this count as 0.</param>
internal sealed record StateTolerances(double Hermitian, double Trace, double Negative)
{
    /// <summary>Each of the three deviations up to which a state is mended; more is no noise of a measurement but another matrix.</summary>
    public const double Mendable = 0.05;

    /// <summary>For numbers of double precision and texts.</summary>
    public static StateTolerances Double { get; } = new(1e-9, 1e-6, 1e-9);

    /// <summary>For numbers of single precision.</summary>
    public static StateTolerances Single { get; } = new(1e-6, 1e-5, 1e-6);

    /// <summary>Those for a file's numbers.</summary>
    public static StateTolerances For(RawState state) => state.SinglePrecision ? Single : Double;
}
