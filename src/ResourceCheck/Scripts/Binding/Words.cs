using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Small helpers for sentences: lists, plurals, numbers, near names.</summary>
internal static class Words
{
    // Longer decimals are harder to read than the fraction they stand for.
    private const int MostDecimals = 9;

    /// <summary>Items as a list with commas and a final word: <c>Ada, Ben and Cyd</c>.</summary>
    public static string List(IEnumerable<string> items, string last = "and")
    {
        string[] all = [.. items.Distinct()];
        return all.Length switch
        {
            0 => "nobody",
            1 => all[0],
            _ => $"{string.Join(", ", all[..^1])} {last} {all[^1]}",
        };
    }

    /// <summary>A verb that follows a list: the first form for one, the second for several.</summary>
    public static string Verb(int count, string one, string several) => count == 1 ? one : several;

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

    /// <summary>The known name nearest to a wrong one, or null when none is near.</summary>
    public static string? Near(string wrong, IEnumerable<string> known)
    {
        string[] others = [.. known.Where(k => k != wrong).Distinct()];
        return others.Length == 0 ? null : NearWords.Find(wrong, others);
    }

    private static string Decimal(BigInteger scaled, int places)
    {
        if (places == 0)
            return scaled.ToString();
        string digits = BigInteger.Abs(scaled).ToString().PadLeft(places + 1, '0');
        return $"{(scaled.Sign < 0 ? "-" : "")}{digits[..^places]}.{digits[^places..]}";
    }
}
