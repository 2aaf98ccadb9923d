using System.Runtime.CompilerServices;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// One swap for each word: word q receives coefficient times the amplitude of its target. Words come in runs of equal length that
/// share the coefficient and whose targets follow each other.
/// </summary>
/// <param name="Length">Words in a run; divides the number of words.</param>
/// <param name="Targets">First target of each run.</param>
/// <param name="Coefficients">Index into the table of coefficients, for each run.</param>
internal sealed record SwapLane(int Length, int[] Targets, ushort[] Coefficients)
{
    /// <summary>Target of one word.</summary>
    public int Target(int word)
    {
        (int run, int within) = Math.DivRem(word, Length);
        return Targets[run] + within;
    }

    /// <summary>Index of the coefficient of one word.</summary>
    public int Coefficient(int word) => Coefficients[word / Length];

    /// <summary>Finds the longest run that fits everywhere and divides <paramref name="longest"/>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static SwapLane From(int[] targets, ushort[] coefficients, int longest)
    {
        int length = Gcd(targets.Length, longest);
        for (int q = 1; q < targets.Length && length > 1; q++)
        {
            if (targets[q] != targets[q - 1] + 1 || coefficients[q] != coefficients[q - 1])
                length = Gcd(length, q);
        }

        return length == 1
            ? new SwapLane(1, targets, coefficients)
            : new SwapLane(length, EveryNth(targets, length), EveryNth(coefficients, length));
    }

    private static T[] EveryNth<T>(T[] values, int step)
    {
        T[] kept = new T[values.Length / step];
        for (int i = 0; i < kept.Length; i++)
            kept[i] = values[i * step];
        return kept;
    }

    private static int Gcd(int a, int b) => b == 0 ? a : Gcd(b, a % b);
}
