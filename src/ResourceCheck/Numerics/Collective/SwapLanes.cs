using System.Numerics;
using System.Runtime.CompilerServices;

namespace ResourceCheck.Numerics.Collective;

/// <summary>Lists the swaps of a block: for every word, each excited emitter with each emitter that holds a lower letter.</summary>
internal static class SwapLanes
{
    /// <summary>Coefficients -iΩ - γ/2 for letter, excited emitter and other emitter, then the same with the opposite sign.</summary>
    public static Complex[] Coefficients(Couplings couplings, int[] transitions)
    {
        int n = couplings.Emitters, half = transitions.Length * n * n;
        Complex[] table = new Complex[2 * half];
        for (int at = 0; at < half; at++)
        {
            (int letter, int e, int i) = (at / (n * n), at / n % n, at % n);
            int j = transitions[letter] - 1;
            table[at] = new Complex(-couplings.Decay[j][e, i] / 2, -couplings.Shift[j][e, i]);
            table[half + at] = -table[at];
        }

        return table;
    }

    /// <summary>The lanes of a block: a lane for each choice of letter, which of its places, and which excited place.</summary>
    public static SwapLane[] Of(WordBlock block, ExchangeSign sign, int longest)
    {
        int[] places = AllPlaces(block);
        List<(int Letter, int Place, int Excited)> choices = [];
        for (int letter = 1; letter < block.Counts.Length; letter++)
        {
            for (int at = 0; at < block.Counts[letter] * block.Counts[0]; at++)
                choices.Add((letter, at / block.Counts[0], at % block.Counts[0]));
        }

        SwapLane[] lanes = new SwapLane[choices.Count];
        Parallel.For(0, lanes.Length, at => lanes[at] = Lane(block, places, choices[at], sign, longest));
        return lanes;
    }

    /// <summary>For each word and letter the emitters that hold it, as bits.</summary>
    private static int[] AllPlaces(WordBlock block)
    {
        int letters = block.Counts.Length;
        int[] places = new int[block.Size * letters];
        for (int q = 0; q < block.Size; q++)
        {
            for (int i = 0; i < block.Emitters; i++)
                places[(q * letters) + WordBlock.Letter(block.Codes[q], i)] |= 1 << i;
        }

        return places;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static SwapLane Lane(
        WordBlock block, int[] places, (int Letter, int Place, int Excited) choice, ExchangeSign sign, int longest)
    {
        int n = block.Emitters, letters = block.Counts.Length, negative = (letters - 1) * n * n;
        int[] targets = new int[block.Size];
        ushort[] coefficients = new ushort[block.Size];
        Span<int> moved = stackalloc int[letters];
        for (int q = 0; q < block.Size; q++)
        {
            places.AsSpan(q * letters, letters).CopyTo(moved);
            int i = Nth(moved[choice.Letter], choice.Place), e = Nth(moved[0], choice.Excited), both = (1 << i) | (1 << e);
            int passed = sign == ExchangeSign.Odd ? BitOperations.PopCount((uint)(moved[choice.Letter] & Between(i, e))) % 2 : 0;
            moved[0] ^= both;
            moved[choice.Letter] ^= both;
            targets[q] = block.Rank(moved);
            coefficients[q] = (ushort)(((((choice.Letter - 1) * n) + e) * n) + i + (passed * negative));
        }

        return SwapLane.From(targets, coefficients, longest);
    }

    private static int Nth(int places, int n)
    {
        for (; n > 0; n--)
            places &= places - 1;
        return BitOperations.TrailingZeroCount(places);
    }

    /// <summary>Bits strictly between two places.</summary>
    private static int Between(int i, int k)
    {
        int low = Math.Min(i, k), high = Math.Max(i, k);
        return ((1 << high) - 1) & ~((2 << low) - 1);
    }
}
