namespace ResourceCheck.Quantities;

/// <summary>A rate, held in per second; finite. Equality compares the stored number; the default value is 0.</summary>
public readonly record struct Rate : IComparable<Rate>
{
    private Rate(double value) => PerSecond = value;

    /// <summary>The rate in per second.</summary>
    public double PerSecond { get; }

    /// <summary>A rate of 0.</summary>
    public static Rate Zero => default;

    /// <summary>A rate from its number of per second. Throws <see cref="ArgumentOutOfRangeException"/> when it is not finite.</summary>
    public static Rate FromPerSecond(double value) =>
        double.IsFinite(value) ? new(value) : throw new ArgumentOutOfRangeException(nameof(value), value, "A rate is finite.");

    /// <summary>Sum.</summary>
    public static Rate operator +(Rate a, Rate b) => FromPerSecond(a.PerSecond + b.PerSecond);

    /// <summary>Difference.</summary>
    public static Rate operator -(Rate a, Rate b) => FromPerSecond(a.PerSecond - b.PerSecond);

    /// <summary>Less than.</summary>
    public static bool operator <(Rate a, Rate b) => a.PerSecond < b.PerSecond;

    /// <summary>Greater than.</summary>
    public static bool operator >(Rate a, Rate b) => a.PerSecond > b.PerSecond;

    /// <summary>Less than or equal.</summary>
    public static bool operator <=(Rate a, Rate b) => a.PerSecond <= b.PerSecond;

    /// <summary>Greater than or equal.</summary>
    public static bool operator >=(Rate a, Rate b) => a.PerSecond >= b.PerSecond;

    /// <summary>The larger of two.</summary>
    public static Rate Max(Rate a, Rate b) => a >= b ? a : b;

    /// <inheritdoc/>
    public int CompareTo(Rate other) => PerSecond.CompareTo(other.PerSecond);

    /// <summary>The number of per second with all its digits.</summary>
    public override string ToString() => $"{PerSecond:R}";
}
