using System.Numerics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Values as scripts write them.</summary>
internal static class Written
{
    // Longer decimals are harder to read than the fraction they stand for.
    private const int MostDecimals = 9;

    /// <summary>A number as scripts write it: a finite decimal where there is a short one, else a fraction.</summary>
    public static string Number(Rational value)
    {
        for (int places = 0; places <= MostDecimals; places++)
        {
            Rational scaled = value * Rational.From(BigInteger.Pow(10, places));
            if (scaled.IsWhole)
                return Decimal(scaled.Numerator, places);
        }

        return value.ToString();
    }

    /// <summary>A value as scripts write it.</summary>
    public static string Write(Value value) => value is NumberValue number ? Number(number.Number) : value.ToString()!;

    private static string Decimal(BigInteger scaled, int places)
    {
        if (places == 0)
            return scaled.ToString();
        string digits = BigInteger.Abs(scaled).ToString().PadLeft(places + 1, '0');
        return $"{(scaled.Sign < 0 ? "-" : "")}{digits[..^places]}.{digits[^places..]}";
    }
}
