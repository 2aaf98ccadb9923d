namespace ResourceCheck.Quantities;

/// <summary>A speed, held in metres per second; finite. Equality compares the stored number; the default value is 0.</summary>
public readonly record struct Speed : IComparable<Speed>
{
    private Speed(double value) => MetresPerSecond = value;

    /// <summary>The speed in metres per second.</summary>
    public double MetresPerSecond { get; }

    /// <summary>A speed of 0.</summary>
    public static Speed Zero => default;

    /// <summary>A speed from its number of metres per second. Throws <see cref="ArgumentOutOfRangeException"/> when it is not finite.</summary>
    public static Speed FromMetresPerSecond(double value) =>
        double.IsFinite(value) ? new(value) : throw new ArgumentOutOfRangeException(nameof(value), value, "A speed is finite.");

    /// <summary>Sum.</summary>
    public static Speed operator +(Speed a, Speed b) => FromMetresPerSecond(a.MetresPerSecond + b.MetresPerSecond);

    /// <summary>Difference.</summary>
    public static Speed operator -(Speed a, Speed b) => FromMetresPerSecond(a.MetresPerSecond - b.MetresPerSecond);

    /// <summary>Less than.</summary>
    public static bool operator <(Speed a, Speed b) => a.MetresPerSecond < b.MetresPerSecond;

    /// <summary>Greater than.</summary>
    public static bool operator >(Speed a, Speed b) => a.MetresPerSecond > b.MetresPerSecond;

    /// <summary>Less than or equal.</summary>
    public static bool operator <=(Speed a, Speed b) => a.MetresPerSecond <= b.MetresPerSecond;

    /// <summary>Greater than or equal.</summary>
    public static bool operator >=(Speed a, Speed b) => a.MetresPerSecond >= b.MetresPerSecond;

    /// <summary>The larger of two.</summary>
    public static Speed Max(Speed a, Speed b) => a >= b ? a : b;

    /// <inheritdoc/>
    public int CompareTo(Speed other) => MetresPerSecond.CompareTo(other.MetresPerSecond);

    /// <summary>The number of metres per second with all its digits.</summary>
    public override string ToString() => $"{MetresPerSecond:R}";
}
