using System.Globalization;

namespace ResourceCheck.Cli.Usage;

/// <summary>Memory sizes as users write them.</summary>
internal static class MemorySize
{
    private static readonly Dictionary<string, double> Units = new(StringComparer.Ordinal)
    {
        ["B"] = 1,
        ["kB"] = 1e3,
        ["KB"] = 1e3,
        ["MB"] = 1e6,
        ["GB"] = 1e9,
        ["TB"] = 1e12,
        ["KiB"] = 1024.0,
        ["MiB"] = 1048576.0,
        ["GiB"] = 1073741824.0,
        ["TiB"] = 1099511627776.0,
    };

    /// <summary>Bytes of a text such as <c>4 GB</c>; null when it is no memory size above 0.</summary>
    public static double? Parse(string text)
    {
        string trimmed = text.Trim();
        int unit = trimmed.AsSpan().LastIndexOfAnyInRange('0', '9') + 1;
        bool known = Units.TryGetValue(trimmed[unit..].Trim(), out double factor);
        bool read = double.TryParse(trimmed[..unit], NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent, CultureInfo.InvariantCulture, out double number);
        return known && read && number > 0 && double.IsFinite(number * factor) ? number * factor : null;
    }
}
