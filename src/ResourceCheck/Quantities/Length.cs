namespace ResourceCheck.Quantities;

/// <summary>A length, held in metres; finite. Equality compares the stored number; the default value is 0.</summary>
public readonly record struct Length : IComparable<Length>
{
    private Length(double value) => Metres = value;

    /// <summary>The length in metres.</summary>
    public double Metres { get; }

    /// <summary>A length of 0.</summary>
    public static Length Zero => default;

    /// <summary>A length from its number of metres. Throws <see cref="ArgumentOutOfRangeException"/> when it is not finite.</summary>
    public static Length FromMetres(double value) =>
        double.IsFinite(value) ? new(value) : throw new ArgumentOutOfRangeException(nameof(value), value, "A length is finite.");

    /// <summary>Sum.</summary>
    public static Length operator +(Length a, Length b) => FromMetres(a.Metres + b.Metres);

    /// <summary>Difference.</summary>
    public static Length operator -(Length a, Length b) => FromMetres(a.Metres - b.Metres);

    /// <summary>Less than.</summary>
    public static bool operator <(Length a, Length b) => a.Metres < b.Metres;

    /// <summary>Greater than.</summary>
    public static bool operator >(Length a, Length b) => a.Metres > b.Metres;

    /// <summary>Less than or equal.</summary>
    public static bool operator <=(Length a, Length b) => a.Metres <= b.Metres;

    /// <summary>Greater than or equal.</summary>
    public static bool operator >=(Length a, Length b) => a.Metres >= b.Metres;

    /// <summary>The larger of two.</summary>
    public static Length Max(Length a, Length b) => a >= b ? a : b;

    /// <inheritdoc/>
    public int CompareTo(Length other) => Metres.CompareTo(other.Metres);

    /// <summary>The number of metres with all its digits.</summary>
    public override string ToString() => $"{Metres:R}";
}
