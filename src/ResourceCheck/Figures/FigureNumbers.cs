using System.Globalization;

namespace ResourceCheck.Figures;

/// <summary>Numbers on axes and in data files.</summary>
internal static class FigureNumbers
{
    private const double LeastFixed = 1e-3;
    private const double GreatestFixed = 1e5;

    /// <summary>A number beside an axis; steps of an axis are round, so that what is beyond the tenth digit is round-off.</summary>
    public static string Tick(double value)
    {
        value = double.Parse(value.ToString("G10", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        double size = Math.Abs(value);
        if (size < 1e-300)
            return "0";
        return size is < LeastFixed or >= GreatestFixed
            ? value.ToString("0.####e0", CultureInfo.InvariantCulture)
            : value.ToString("0.##########", CultureInfo.InvariantCulture);
    }

    /// <summary>A number with all its digits, <c>nan</c> and <c>inf</c> as pgfplots writes them.</summary>
    public static string Data(double value) => value switch
    {
        double.NaN => "nan",
        double.PositiveInfinity => "inf",
        double.NegativeInfinity => "-inf",
        _ => value.ToString("R", CultureInfo.InvariantCulture),
    };
}
