namespace ResourceCheck.Quantities;

/// <summary>A probability or fidelity in [0, 1], not in per cent. Equality compares the stored number; the default value is 0.</summary>
public readonly record struct Probability : IComparable<Probability>
{
    /// <summary>Round-off beyond the ends that <see cref="FromComputed"/> still takes for the end itself.</summary>
    private const double RoundOff = 1e-9;

    private Probability(double value) => Value = value;

    /// <summary>The number in [0, 1].</summary>
    public double Value { get; }

    /// <summary>Impossible.</summary>
    public static Probability Zero => default;

    /// <summary>Certain.</summary>
    public static Probability One => new(1);

    /// <summary>1 minus the value.</summary>
    public Probability Complement => new(1 - Value);

    /// <summary>A given probability. Throws <see cref="ArgumentOutOfRangeException"/> outside [0, 1] and for NaN.</summary>
    public static Probability From(double value) =>
        value is >= 0 and <= 1 ? new(value) : throw new ArgumentOutOfRangeException(nameof(value), value, "A probability lies between 0 and 1.");

    /// <summary>A computed probability, of which round-off up to 1e-9 beyond the ends is cut off. Throws for anything further out.</summary>
    public static Probability FromComputed(double value) =>
        value is >= -RoundOff and <= 1 + RoundOff ? new(Math.Clamp(value, 0, 1)) : throw new ArgumentOutOfRangeException(nameof(value), value, "Not a probability.");

    /// <summary>Less than.</summary>
    public static bool operator <(Probability a, Probability b) => a.Value < b.Value;

    /// <summary>Greater than.</summary>
    public static bool operator >(Probability a, Probability b) => a.Value > b.Value;

    /// <summary>Less than or equal.</summary>
    public static bool operator <=(Probability a, Probability b) => a.Value <= b.Value;

    /// <summary>Greater than or equal.</summary>
    public static bool operator >=(Probability a, Probability b) => a.Value >= b.Value;

    /// <inheritdoc/>
    public int CompareTo(Probability other) => Value.CompareTo(other.Value);

    /// <summary>The number with all its digits.</summary>
    public override string ToString() => $"{Value:R}";
}
