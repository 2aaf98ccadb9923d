namespace ResourceCheck.Engines;

/// <summary>A number with the label that says how far it can be trusted.</summary>
/// <param name="Value">The number.</param>
/// <param name="Label">How it was found.</param>
/// <param name="Low">Lower end of its interval; the value itself when exact.</param>
/// <param name="High">Upper end of its interval.</param>
/// <param name="Confidence">Confidence of the interval; 1 for exact and bound.</param>
/// <param name="Present">For means: fraction of copies in which the value was present; 1 otherwise.</param>
public sealed record Estimate(double Value, TruthLabel Label, double Low, double High, double Confidence, double Present = 1)
{
    /// <summary>Estimated round-off of an exact number, absolute; 0 where it is far below what anybody would notice.</summary>
    public double RoundOff { get; init; }

    /// <summary>An exact number.</summary>
    public static Estimate Exact(double value) => new(value, TruthLabel.Exact, value, value, 1);

    /// <summary>A rigorous lower bound: the true number is at least this.</summary>
    public static Estimate AtLeast(double value) => new(value, TruthLabel.Bound, value, double.PositiveInfinity, 1);

    /// <summary>A rigorous upper bound: the true number is at most this.</summary>
    public static Estimate AtMost(double value) => new(value, TruthLabel.Bound, double.NegativeInfinity, value, 1);
}

/// <summary>How far a number can be trusted.</summary>
public enum TruthLabel
{
    /// <summary>Exact up to round-off.</summary>
    Exact,

    /// <summary>A rigorous one-sided bound; the interval says its side.</summary>
    Bound,

    /// <summary>From samples; the interval holds with the stated confidence.</summary>
    Sampled,
}
