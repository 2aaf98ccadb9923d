using System.Numerics;
using System.Runtime.CompilerServices;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// All ways to hand given numbers of letters to N emitters, numbered. A word lists the letter of each emitter; letter 0 is the excited
/// level. Words are ordered by the places of letter 0, then of letter 1 and so on, each set of places in lexicographic order: two words
/// that differ by one swap then stand in long parallel runs, which is what makes the swap kernel fast.
/// </summary>
internal sealed class WordBlock
{
    /// <summary>Bits for the letter of one emitter in a code.</summary>
    private const int Bits = 4;

    /// <summary>Most emitters and most letters that a code can hold.</summary>
    public const int Most = 16;

    /// <summary>Ways to place each letter once the letters before it have their places.</summary>
    private readonly int[] _choices;

    private WordBlock(int[] counts, ulong[] codes)
    {
        Counts = counts;
        Codes = codes;
        Emitters = counts.Sum();
        _choices = Choices(counts);
    }

    /// <summary>How often each letter occurs.</summary>
    public int[] Counts { get; }

    /// <summary>N.</summary>
    public int Emitters { get; }

    /// <summary>The words in order, as packed letters: read them with <see cref="Letter"/>.</summary>
    public ulong[] Codes { get; }

    /// <summary>Number of words.</summary>
    public int Size => Codes.Length;

    /// <summary>The block with the given counts of letters 0, 1, ….</summary>
    public static WordBlock Of(int[] counts)
    {
        ulong[] codes = new ulong[checked((int)Multinomial(counts))];
        int next = 0;
        Fill(counts, 0, (1 << counts.Sum()) - 1, 0, codes, ref next);
        return new WordBlock([.. counts], codes);
    }

    /// <summary>N!/(Π counts!), exact.</summary>
    public static long Multinomial(ReadOnlySpan<int> counts)
    {
        long product = 1;
        int places = 0;
        foreach (int count in counts)
        {
            places += count;
            product = checked(product * Choose(places, count));
        }

        return product;
    }

    /// <summary>Letter of one emitter.</summary>
    public static int Letter(ulong code, int emitter) => (int)(code >> (Bits * emitter)) & 15;

    /// <summary>The word with another letter at one emitter; it may belong to another block.</summary>
    public static ulong With(ulong code, int emitter, int letter) =>
        (code & ~(15UL << (Bits * emitter))) | ((ulong)letter << (Bits * emitter));

    /// <summary>Number of a word of this block.</summary>
    public int Rank(ulong code)
    {
        Span<int> places = stackalloc int[Counts.Length];
        for (int i = 0; i < Emitters; i++)
            places[Letter(code, i)] |= 1 << i;
        return Rank(places);
    }

    /// <summary>Number of the word whose letters are at the given places: bits of emitters, for each letter.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public int Rank(ReadOnlySpan<int> places)
    {
        int free = (1 << Emitters) - 1, rank = 0;
        for (int letter = 0; letter < places.Length; letter++)
        {
            int within = Counts[letter] == 1
                ? BitOperations.PopCount((uint)(free & (places[letter] - 1)))
                : SubsetRank(places[letter], free, Counts[letter]);
            rank = (rank * _choices[letter]) + within;
            free &= ~places[letter];
        }

        return rank;
    }

    /// <summary>Index among all d^N words; the first emitter is the most significant digit.</summary>
    public int FullIndex(ulong code, int d)
    {
        int index = 0;
        for (int i = 0; i < Emitters; i++)
            index = (index * d) + Letter(code, i);
        return index;
    }

    /// <summary>Code of the word with a given index among all d^N.</summary>
    public static ulong FromFullIndex(int index, int d, int emitters)
    {
        ulong code = 0;
        for (int i = emitters - 1; i >= 0; i--)
        {
            code = With(code, i, index % d);
            index /= d;
        }

        return code;
    }

    /// <summary>Lexicographic number of a subset among those of its size within the free places.</summary>
    private static int SubsetRank(int places, int free, int left)
    {
        int rank = 0;
        for (int room = BitOperations.PopCount((uint)free); left > 0; room--)
        {
            int lowest = free & -free;
            free &= ~lowest;
            if ((places & lowest) != 0)
                left--;
            else
                rank += (int)Choose(room - 1, left - 1);
        }

        return rank;
    }

    private static void Fill(int[] counts, int letter, int free, ulong code, ulong[] codes, ref int next)
    {
        if (letter == counts.Length)
        {
            codes[next++] = code;
            return;
        }

        foreach (int places in Subsets(free, counts[letter]))
            Fill(counts, letter + 1, free & ~places, Placed(code, places, letter), codes, ref next);
    }

    private static IEnumerable<int> Subsets(int free, int size)
    {
        if (size == 0)
        {
            yield return 0;
            yield break;
        }

        for (int rest = free; BitOperations.PopCount((uint)rest) >= size;)
        {
            int lowest = rest & -rest;
            rest &= ~lowest;
            foreach (int others in Subsets(rest, size - 1))
                yield return lowest | others;
        }
    }

    private static ulong Placed(ulong code, int places, int letter)
    {
        for (int rest = places; rest != 0; rest &= rest - 1)
            code = With(code, BitOperations.TrailingZeroCount(rest), letter);
        return code;
    }

    private static int[] Choices(int[] counts)
    {
        int free = counts.Sum();
        int[] choices = new int[counts.Length];
        for (int letter = 0; letter < counts.Length; free -= counts[letter++])
            choices[letter] = (int)Choose(free, counts[letter]);
        return choices;
    }

    private static long Choose(int n, int k)
    {
        long product = 1;
        for (int i = 1; i <= k; i++)
            product = product * (n - k + i) / i;
        return product;
    }
}
