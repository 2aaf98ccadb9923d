using System.Numerics;

namespace ResourceCheck.Resources;

/// <summary>Rewrites a state in the values of a script: value v of every qudit is the physical level given for it.</summary>
internal static class LevelOrdering
{
    /// <summary>The state with every index digit v read from physical level <paramref name="physical"/>[v].</summary>
    public static PreparedState Of(PreparedState state, IReadOnlyList<int> physical)
    {
        int[] source = SourceIndices(state, physical);
        if (state.Ket is { } ket)
            return state with { Ket = [.. source.Select(i => ket[i])] };
        int size = source.Length;
        Complex[] density = new Complex[size * size];
        for (int row = 0; row < size; row++)
        {
            for (int column = 0; column < size; column++)
                density[(row * size) + column] = state.Density![(source[row] * size) + source[column]];
        }

        return state with { Density = density };
    }

    /// <summary>The order that undoes another one.</summary>
    public static int[] Inverse(IReadOnlyList<int> physical)
    {
        int[] inverse = new int[physical.Count];
        for (int value = 0; value < physical.Count; value++)
            inverse[physical[value]] = value;
        return inverse;
    }

    private static int[] SourceIndices(PreparedState state, IReadOnlyList<int> physical)
    {
        int[] source = [0];
        for (int qudit = 0; qudit < state.Parties; qudit++)
            source = [.. source.SelectMany(prefix => physical.Select(level => (prefix * state.Levels) + level))];
        return source;
    }
}
