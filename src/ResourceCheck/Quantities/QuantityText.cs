using System.Globalization;

namespace ResourceCheck.Quantities;

/// <summary>Prints times and lengths in the unit that reads best, such as <c>41.3 us</c>.</summary>
public static class QuantityText
{
    private static readonly (int Power, string Symbol)[] TimeUnits = [(-12, "ps"), (-9, "ns"), (-6, "us"), (-3, "ms"), (0, "s")];
    private static readonly (int Power, string Symbol)[] LengthUnits = [(-9, "nm"), (-6, "um"), (-3, "mm"), (0, "m"), (3, "km")];
    private static readonly (int Power, string Symbol)[] RateUnits = [(0, "/s")];
    private static readonly (int Power, string Symbol)[] SpeedUnits = [(0, "m/s")];

    /// <summary>More places than this before or behind the point are written as an exponent.</summary>
    private const int MostPlaces = 6;

    /// <summary>A time, rounded to <paramref name="digits"/> significant digits.</summary>
    public static string Of(Duration time, int digits = 3) => Print(Rounded(time.Seconds, digits), TimeUnits);

    /// <summary>A length, rounded to <paramref name="digits"/> significant digits.</summary>
    public static string Of(Length length, int digits = 3) => Print(Rounded(length.Metres, digits), LengthUnits);

    /// <summary>A rate, rounded to <paramref name="digits"/> significant digits.</summary>
    public static string Of(Rate rate, int digits = 3) => Print(Rounded(rate.PerSecond, digits), RateUnits);

    /// <summary>A time with all its digits: reading the text gives the same number.</summary>
    public static string Exact(Duration time) => Print(Shortest(time.Seconds), TimeUnits);

    /// <summary>A length with all its digits: reading the text gives the same number.</summary>
    public static string Exact(Length length) => Print(Shortest(length.Metres), LengthUnits);

    /// <summary>A rate with all its digits: reading the text gives the same number.</summary>
    public static string Exact(Rate rate) => Print(Shortest(rate.PerSecond), RateUnits);

    /// <summary>A speed with all its digits: reading the text gives the same number.</summary>
    public static string Exact(Speed speed) => Print(Shortest(speed.MetresPerSecond), SpeedUnits);

    private static string Rounded(double value, int digits) => value.ToString($"E{Math.Clamp(digits, 1, 17) - 1}", CultureInfo.InvariantCulture);

    private static string Shortest(double value)
    {
        // E16 always reads back; a shorter one that does is preferred
        for (int digits = 1; digits < 17; digits++)
        {
            string text = Rounded(value, digits);
            if (double.Parse(text, CultureInfo.InvariantCulture).Equals(value))
                return text;
        }

        return Rounded(value, 17);
    }

    private static string Print(string scientific, (int Power, string Symbol)[] units)
    {
        int e = scientific.IndexOf('E', StringComparison.Ordinal);
        string sign = scientific[0] == '-' ? "-" : "";
        string digits = scientific[sign.Length..e].Replace(".", "", StringComparison.Ordinal).TrimEnd('0');
        if (digits.Length == 0)
            return $"0 {units.First(u => u.Power == 0).Symbol}";
        int exponent = int.Parse(scientific[(e + 1)..], NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        (int power, string symbol) = units.LastOrDefault(u => u.Power <= exponent, units[0]);
        return $"{sign}{Place(digits, exponent - power)} {symbol}";
    }

    /// <summary>Digits d₁d₂… as d₁.d₂… times 10^<paramref name="exponent"/>.</summary>
    private static string Place(string digits, int exponent)
    {
        if (exponent is < -MostPlaces or > MostPlaces)
            return digits.Length == 1 ? $"{digits}e{exponent}" : $"{digits[..1]}.{digits[1..]}e{exponent}";
        if (exponent < 0)
            return $"0.{new string('0', -exponent - 1)}{digits}";
        if (digits.Length <= exponent + 1)
            return digits + new string('0', exponent + 1 - digits.Length);
        return $"{digits[..(exponent + 1)]}.{digits[(exponent + 1)..]}";
    }
}
