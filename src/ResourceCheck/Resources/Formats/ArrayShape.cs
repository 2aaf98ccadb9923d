using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources.Formats;

/// <summary>Finds parties and levels from the lengths of an array's axes, for files that do not state them.</summary>
internal static class ArrayShape
{
    /// <summary>A vector (one axis, or two of which one has length 1) of N^N amplitudes or a square matrix of N^N rows.</summary>
    public static Outcome<StateShape> From(string file, IReadOnlyList<long> axes)
    {
        if (axes is not ([_] or [1, _] or [_, 1]) && !(axes is [var rows, var columns] && rows == columns))
            return Outcome<StateShape>.Failed([StateMessages.NotVectorNorSquare(file, axes)]);
        bool isVector = axes is [_] or [1, _] or [_, 1];
        long dimension = axes.Max();
        if (StateShape.WithEqualLevels(dimension, isVector) is { } shape)
            return Outcome<StateShape>.Of(shape);
        return Outcome<StateShape>.Failed([dimension > StateShape.Largest(isVector)
            ? StateMessages.TooLarge(file, dimension, isVector)
            : StateMessages.NoPower(file, dimension, isVector)]);
    }
}
