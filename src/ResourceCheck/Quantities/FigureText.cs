using System.Globalization;

namespace ResourceCheck.Quantities;

/// <summary>Numbers as people read them: the one place where digits are dropped. Files for programs never come here.</summary>
internal static class FigureText
{
    /// <summary>Unit of probabilities, fidelities and other plain numbers.</summary>
    public const string One = "1";

    /// <summary>Four digits tell any two figures apart that a laboratory could; more would suggest a better knowledge of the conditions.</summary>
    private const int Significant = 4;

    /// <summary>Exact engines add up to some thousand rounded terms; a distance from 1 below this is theirs and not the protocol's.</summary>
    private const double RoundOff = 1e-12;

    private const int RoundOffDecimals = 12;
    private const double LeastFixed = 1e-4;
    private const double GreatestFixed = 1e6;
    private const double GreatestWhole = 1e15;

    private static readonly (double Size, string Name)[] Times =
        [(86400, "d"), (3600, "h"), (60, "min"), (1, "s"), (1e-3, "ms"), (1e-6, "us"), (1e-9, "ns"), (1e-12, "ps")];

    // Below ten minutes seconds are the more familiar unit, and below two of the larger unit the smaller one.
    private static readonly double[] TimesFrom = [172800, 7200, 600, 1, 1e-3, 1e-6, 1e-9, 0];

    private static readonly (double Size, string Name)[] Sizes = [(1e12, "TB"), (1e9, "GB"), (1e6, "MB"), (1e3, "kB")];

    /// <summary>A number in its unit: <c>1</c>, <c>s</c>, <c>B</c>; any other unit is put behind the number.</summary>
    public static string Of(double value, string unit, Rounding rounding = Rounding.Nearest) => unit switch
    {
        One or "" => Number(value, rounding),
        "s" => Time(value),
        "B" => Bytes(value),
        _ => $"{Number(value, rounding)} {unit}",
    };

    /// <summary>A plain number with four significant digits, more where it is close to 1, all of them where there are no more.</summary>
    public static string Number(double value, Rounding rounding = Rounding.Nearest)
    {
        if (!double.IsFinite(value))
            return NonFinite(value);
        if (rounding == Rounding.Nearest && Math.Abs(value - 1) < RoundOff)
            return "1";
        string shortest = value.ToString("R", CultureInfo.InvariantCulture);
        double size = Math.Abs(value);
        if (value == 0)
            return "0";
        if (size >= LeastFixed && size < GreatestWhole && value == Math.Floor(value))
            return shortest;
        return size is < LeastFixed or >= GreatestFixed ? Scientific(value, rounding) : Fixed(value, shortest, rounding);
    }

    /// <summary>A difference of two figures of order one, so that rounding errors of the two do not show.</summary>
    public static string Difference(double value, Rounding rounding = Rounding.Nearest) =>
        Math.Abs(value) < RoundOff ? "0" : Number(rounding == Rounding.Nearest && Math.Abs(value) < 1 ? Math.Round(value, RoundOffDecimals) : value, rounding);

    /// <summary>A standard uncertainty: two significant digits, since the third says nothing (JCGM 100:2008, 7.2.6).</summary>
    public static string Uncertainty(double value)
    {
        if (!double.IsFinite(value) || value == 0)
            return Number(value);
        string text = value.ToString("E1", CultureInfo.InvariantCulture);
        double rounded = double.Parse(text, CultureInfo.InvariantCulture);
        int exponent = int.Parse(text[(text.IndexOf('E', StringComparison.Ordinal) + 1)..], CultureInfo.InvariantCulture);
        return Math.Abs(rounded) is < LeastFixed or >= GreatestFixed
            ? $"{text[..text.IndexOf('E', StringComparison.Ordinal)]}e{exponent.ToString(CultureInfo.InvariantCulture)}"
            : rounded.ToString($"F{Math.Max(0, 1 - exponent)}", CultureInfo.InvariantCulture);
    }

    /// <summary>A rough size, such as an estimated amount of work.</summary>
    public static string About(double value) =>
        double.IsFinite(value) ? value.ToString(Math.Abs(value) < GreatestFixed ? "0.##" : "0.#e0", CultureInfo.InvariantCulture) : NonFinite(value);

    /// <summary>A time in the unit that suits it.</summary>
    public static string Time(double seconds)
    {
        if (!double.IsFinite(seconds))
            return NonFinite(seconds);
        if (seconds == 0)
            return "0 s";
        int i = Array.FindIndex(TimesFrom, from => Math.Abs(seconds) >= from);
        return $"{Trim(Number(seconds / Times[i].Size))} {Times[i].Name}";
    }

    /// <summary>An estimated time, with two digits.</summary>
    public static string AboutTime(double seconds) =>
        Time(double.IsFinite(seconds) ? double.Parse(seconds.ToString("E1", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture) : seconds);

    /// <summary>A memory size in decimal units.</summary>
    public static string Bytes(double bytes)
    {
        if (!double.IsFinite(bytes))
            return NonFinite(bytes);
        foreach ((double size, string name) in Sizes)
        {
            if (Math.Abs(bytes) >= size)
                return $"{Trim(Number(bytes / size))} {name}";
        }

        return $"{Trim(Number(bytes))} B";
    }

    /// <summary>Words for a number that is none.</summary>
    public static string NonFinite(double value) =>
        double.IsNaN(value) ? "undefined" : value > 0 ? "infinite" : "minus infinite";

    private static string Fixed(double value, string shortest, Rounding rounding)
    {
        double rounded = double.Parse(value.ToString("E3", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        int decimals = Significant - 1 - (int)Math.Floor(Math.Log10(Math.Abs(rounded)));
        if (value is > 0.9 and < 1)
            decimals = Math.Max(Significant, (int)Math.Ceiling(-Math.Log10(1 - value)) + 1);
        decimals = Math.Max(decimals, 0);
        if (shortest.Length - 1 - shortest.IndexOf('.', StringComparison.Ordinal) <= decimals)
            return shortest;
        decimal shown = decimal.Parse(value.ToString($"F{decimals}", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return Direct(shown, (double)shown, value, decimals, rounding);
    }

    private static string Scientific(double value, Rounding rounding)
    {
        string text = value.ToString("E3", CultureInfo.InvariantCulture);
        int e = text.IndexOf('E', StringComparison.Ordinal);
        decimal mantissa = decimal.Parse(text[..e], CultureInfo.InvariantCulture);
        int exponent = int.Parse(text[(e + 1)..], CultureInfo.InvariantCulture);
        double shown = double.Parse(text, CultureInfo.InvariantCulture);
        return $"{Trim(Direct(mantissa, shown, value, Significant - 1, rounding))}e{exponent.ToString(CultureInfo.InvariantCulture)}";
    }

    private static string Direct(decimal digits, double shown, double value, int decimals, Rounding rounding)
    {
        decimal last = new(1, 0, 0, false, (byte)decimals);
        if (rounding == Rounding.Down && shown > value)
            digits -= last;
        if (rounding == Rounding.Up && shown < value)
            digits += last;
        return digits.ToString($"F{decimals}", CultureInfo.InvariantCulture);
    }

    private static string Trim(string number) =>
        number.Contains('.', StringComparison.Ordinal) && !number.Contains('e', StringComparison.Ordinal) ? number.TrimEnd('0').TrimEnd('.') : number;
}
