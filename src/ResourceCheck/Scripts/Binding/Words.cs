using System.Numerics;
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
        int limit = Math.Max(1, wrong.Length / 3);
        return known.Distinct()
            .Select(name => (Name: name, Distance: string.Equals(name, wrong, StringComparison.OrdinalIgnoreCase) ? 0 : Distance(wrong, name)))
            .Where(pair => pair.Distance <= limit && pair.Distance < wrong.Length)
            .OrderBy(pair => pair.Distance).ThenBy(pair => pair.Name, StringComparer.Ordinal)
            .Select(pair => pair.Name).FirstOrDefault();
    }

    private static string Decimal(BigInteger scaled, int places)
    {
        if (places == 0)
            return scaled.ToString();
        string digits = BigInteger.Abs(scaled).ToString().PadLeft(places + 1, '0');
        return $"{(scaled.Sign < 0 ? "-" : "")}{digits[..^places]}.{digits[^places..]}";
    }

    // Edit distance with neighbours exchanged counting once: Damerau, Commun. ACM 7, 171 (1964), in its restricted form.
    private static int Distance(string a, string b)
    {
        int[,] table = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
            table[i, 0] = i;
        for (int j = 0; j <= b.Length; j++)
            table[0, j] = j;
        for (int i = 1; i <= a.Length; i++)
        {
            for (int j = 1; j <= b.Length; j++)
            {
                int change = table[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                table[i, j] = Math.Min(change, Math.Min(table[i - 1, j], table[i, j - 1]) + 1);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                    table[i, j] = Math.Min(table[i, j], table[i - 2, j - 2] + 1);
            }
        }

        return table[a.Length, b.Length];
    }
}
