using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>Size of a prepared state.</summary>
/// <param name="Parties">Number of qudits N.</param>
/// <param name="Levels">Levels d of each.</param>
/// <param name="IsVector">Whether it is a state vector.</param>
internal sealed record StateShape(int Parties, int Levels, bool IsVector)
{
    /// <summary>A density matrix of 3125 × 3125 takes 149 MiB; the next size, 46656, would take 32 GiB.</summary>
    public const int LargestDensity = 3125;

    /// <summary>Vectors of seven parties with seven levels: 823543 amplitudes.</summary>
    public const int LargestVector = 823543;

    /// <summary>d^N.</summary>
    public int Dimension => AntisymmetricState.Power(Levels, Parties);

    /// <summary>Length of the vector or of a row of the matrix times the number of rows.</summary>
    public int Count => IsVector ? Dimension : Dimension * Dimension;

    /// <summary>The shape with as many levels as parties for a dimension N^N; null for any other or too large a dimension.</summary>
    public static StateShape? WithEqualLevels(long dimension, bool isVector)
    {
        for (int n = 2; n <= AntisymmetricState.MostParties; n++)
        {
            if (AntisymmetricState.Power(n, n) == dimension && dimension <= Largest(isVector))
                return new(n, n, isVector);
        }

        return null;
    }

    /// <summary>The shape of given parties and levels; null when it is too large.</summary>
    public static StateShape? Of(int parties, int levels, bool isVector) =>
        Math.Pow(levels, parties) <= Largest(isVector) + 0.5 ? new(parties, levels, isVector) : null;

    /// <summary>Largest dimension that is read.</summary>
    public static int Largest(bool isVector) => isVector ? LargestVector : LargestDensity;
}
