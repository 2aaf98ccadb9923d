using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// |S_N⟩, or its counterpart with all signs +, in words of <see cref="LevelGroups"/>. A word stands for the normalised (anti)symmetric
/// combination of each group's levels over that group's places.
/// </summary>
internal sealed class PermutationState(LevelGroups groups, WordBlock block, ExchangeSign sign)
{
    /// <summary>Amplitudes of the state itself: ±√(Π g!/N!).</summary>
    public Complex[] Amplitudes()
    {
        double weight = Math.Sqrt(1.0 / block.Size);
        return [.. block.Codes.Select(code => new Complex(weight * Sign(Levels(code)), 0))];
    }

    /// <summary>The d^N amplitudes of a vector of words; the first emitter is the most significant digit.</summary>
    public Complex[] Expand(Complex[] words, int d)
    {
        Complex[] ket = new Complex[AntisymmetricState.Power(d, block.Emitters)];
        double weight = Math.Sqrt(block.Size / AntisymmetricState.Factorial(block.Emitters));
        foreach ((int[] levels, int parity) in Permutations.Of(block.Emitters))
        {
            ulong code = Code(levels);
            int relative = sign == ExchangeSign.Odd ? parity * Sign(Levels(code)) : 1;
            ket[Permutations.IndexOf(levels, d)] = words[block.Rank(code)] * (relative * weight);
        }

        return ket;
    }

    private ulong Code(int[] levels)
    {
        ulong code = 0;
        for (int i = 0; i < levels.Length; i++)
            code = WordBlock.With(code, i, groups.Letter(levels[i]));
        return code;
    }

    /// <summary>The word with each group's levels in ascending order.</summary>
    private int[] Levels(ulong code)
    {
        int[] used = new int[groups.Groups.Length], levels = new int[block.Emitters];
        for (int i = 0; i < levels.Length; i++)
        {
            int letter = WordBlock.Letter(code, i);
            levels[i] = letter == 0 ? 0 : groups.Groups[letter - 1][used[letter - 1]++];
        }

        return levels;
    }

    private int Sign(int[] levels)
    {
        int inversions = 0;
        for (int i = 0; sign == ExchangeSign.Odd && i < levels.Length; i++)
        {
            for (int k = i + 1; k < levels.Length; k++)
                inversions += levels[i] > levels[k] ? 1 : 0;
        }

        return inversions % 2 == 0 ? 1 : -1;
    }
}
