using System.Collections.Frozen;

namespace ResourceCheck.Quantities;

/// <summary>Every unit that quantities may carry. The first of a dimension's spellings is the one shown in messages; micro is also written µ (U+00B5) and μ (U+03BC).</summary>
internal static class UnitTable
{
    private static readonly Unit[] Units =
    [
        new("s", Dimension.Time, 0),
        new("ms", Dimension.Time, -3),
        new("us", Dimension.Time, -6),
        new("\u00b5s", Dimension.Time, -6),
        new("\u03bcs", Dimension.Time, -6),
        new("ns", Dimension.Time, -9),
        new("ps", Dimension.Time, -12),
        new("min", Dimension.Time, 0, 60),
        new("m", Dimension.Length, 0),
        new("km", Dimension.Length, 3),
        new("cm", Dimension.Length, -2),
        new("mm", Dimension.Length, -3),
        new("um", Dimension.Length, -6),
        new("\u00b5m", Dimension.Length, -6),
        new("\u03bcm", Dimension.Length, -6),
        new("nm", Dimension.Length, -9),
        new("wavelengths", Dimension.Wavelengths, 0),
        new("wavelength", Dimension.Wavelengths, 0),
        new("Hz", Dimension.Frequency, 0),
        new("mHz", Dimension.Frequency, -3),
        new("kHz", Dimension.Frequency, 3),
        new("MHz", Dimension.Frequency, 6),
        new("GHz", Dimension.Frequency, 9),
        new("THz", Dimension.Frequency, 12),
        new("/s", Dimension.Rate, 0),
        new("1/s", Dimension.Rate, 0),
        new("/ms", Dimension.Rate, 3),
        new("1/ms", Dimension.Rate, 3),
        new("/us", Dimension.Rate, 6),
        new("1/us", Dimension.Rate, 6),
        new("/\u00b5s", Dimension.Rate, 6),
        new("/\u03bcs", Dimension.Rate, 6),
        new("/ns", Dimension.Rate, 9),
        new("1/ns", Dimension.Rate, 9),
        new("m/s", Dimension.Speed, 0),
        new("km/s", Dimension.Speed, 3),
        new("dB", Dimension.Loss, 0),
        new("dB/km", Dimension.LossPerLength, -3),
        new("dB/m", Dimension.LossPerLength, 0),
        new("rad", Dimension.Angle, 0),
        new("mrad", Dimension.Angle, -3),
        new("deg", Dimension.Angle, 0, Math.PI / 180),
    ];

    private static readonly FrozenDictionary<string, Unit> BySymbol = Units.ToFrozenDictionary(u => u.Symbol, StringComparer.Ordinal);

    /// <summary>The unit of a plain number.</summary>
    public static Unit None { get; } = new("", Dimension.None, 0);

    /// <summary>All units, in the order of the table.</summary>
    public static IReadOnlyList<Unit> All => Units;

    /// <summary>The unit with a symbol; null when there is none.</summary>
    public static Unit? Find(string symbol) => BySymbol.GetValueOrDefault(symbol);

    /// <summary>Symbols of a dimension, every spelling.</summary>
    public static IEnumerable<string> SymbolsOf(Dimension dimension) => Units.Where(u => u.Dimension == dimension).Select(u => u.Symbol);

    /// <summary>Symbols of a dimension that can be typed on any keyboard, one spelling each, for messages and pages.</summary>
    public static IEnumerable<string> ShownSymbolsOf(Dimension dimension) =>
        SymbolsOf(dimension).Where(s => s.All(char.IsAscii) && !s.StartsWith("1/", StringComparison.Ordinal));

    /// <summary>Symbol of the unit in which values of a dimension are held; empty for plain numbers.</summary>
    public static string BaseSymbolOf(Dimension dimension) => Units.FirstOrDefault(u => u.Dimension == dimension && u.PowerOfTen == 0)?.Symbol ?? "";

    /// <summary>The dimension in words, with its article.</summary>
    public static string NameOf(Dimension dimension) => dimension switch
    {
        Dimension.Time => "a time",
        Dimension.Length => "a length",
        Dimension.Wavelengths => "a length in wavelengths",
        Dimension.Frequency => "a frequency",
        Dimension.Rate => "a rate",
        Dimension.Speed => "a speed",
        Dimension.Loss => "a loss in dB",
        Dimension.LossPerLength => "a loss per length",
        Dimension.Angle => "an angle",
        _ => "a plain number",
    };
}
