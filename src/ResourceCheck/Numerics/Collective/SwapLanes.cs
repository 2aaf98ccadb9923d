using System.Numerics;

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
        List<SwapLane> lanes = [];
        for (int letter = 1; letter < block.Counts.Length; letter++)
        {
            for (int place = 0; place < block.Counts[letter]; place++)
            {
                for (int excited = 0; excited < block.Counts[0]; excited++)
                    lanes.Add(Lane(block, letter, place, excited, sign, longest));
            }
        }

        return [.. lanes];
    }

    private static SwapLane Lane(WordBlock block, int letter, int place, int excited, ExchangeSign sign, int longest)
    {
        int n = block.Emitters, negative = (block.Counts.Length - 1) * n * n;
        int[] targets = new int[block.Size];
        ushort[] coefficients = new ushort[block.Size];
        for (int q = 0; q < block.Size; q++)
        {
            ulong code = block.Codes[q];
            int places = block.Places(code, letter);
            int i = Nth(places, place), e = Nth(block.Places(code, 0), excited);
            targets[q] = block.Rank(WordBlock.With(WordBlock.With(code, i, 0), e, letter));
            bool flips = sign == ExchangeSign.Odd && BitOperations.PopCount((uint)(places & Between(i, e))) % 2 == 1;
            coefficients[q] = (ushort)(((((letter - 1) * n) + e) * n) + i + (flips ? negative : 0));
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
