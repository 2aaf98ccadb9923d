namespace ResourceCheck.Quantities;

/// <summary>A time, held in seconds; finite. Equality compares the stored number; the default value is 0.</summary>
public readonly record struct Duration : IComparable<Duration>
{
    private Duration(double value) => Seconds = value;

    /// <summary>The time in seconds.</summary>
    public double Seconds { get; }

    /// <summary>A time of 0.</summary>
    public static Duration Zero => default;

    /// <summary>A time from its number of seconds. Throws <see cref="ArgumentOutOfRangeException"/> when it is not finite.</summary>
    public static Duration FromSeconds(double value) =>
        double.IsFinite(value) ? new(value) : throw new ArgumentOutOfRangeException(nameof(value), value, "A time is finite.");

    /// <summary>Sum.</summary>
    public static Duration operator +(Duration a, Duration b) => FromSeconds(a.Seconds + b.Seconds);

    /// <summary>Difference.</summary>
    public static Duration operator -(Duration a, Duration b) => FromSeconds(a.Seconds - b.Seconds);

    /// <summary>Less than.</summary>
    public static bool operator <(Duration a, Duration b) => a.Seconds < b.Seconds;

    /// <summary>Greater than.</summary>
    public static bool operator >(Duration a, Duration b) => a.Seconds > b.Seconds;

    /// <summary>Less than or equal.</summary>
    public static bool operator <=(Duration a, Duration b) => a.Seconds <= b.Seconds;

    /// <summary>Greater than or equal.</summary>
    public static bool operator >=(Duration a, Duration b) => a.Seconds >= b.Seconds;

    /// <summary>The larger of two.</summary>
    public static Duration Max(Duration a, Duration b) => a >= b ? a : b;

    /// <inheritdoc/>
    public int CompareTo(Duration other) => Seconds.CompareTo(other.Seconds);

    /// <summary>The number of seconds with all its digits.</summary>
    public override string ToString() => $"{Seconds:R}";
}
