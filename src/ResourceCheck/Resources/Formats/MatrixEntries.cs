using System.Collections;
using System.Numerics;

namespace ResourceCheck.Resources.Formats;

/// <summary>A matrix that is filled entry by entry, with those above the diagonal following from symmetry.</summary>
internal sealed class MatrixEntries(int rows, int columns, MatrixSymmetry symmetry)
{
    private readonly BitArray _given = new(rows * columns);
    private int _row;
    private int _column;

    public int Rows => rows;

    public int Columns => columns;

    /// <summary>The numbers so far, row after row.</summary>
    public Complex[] Numbers { get; } = new Complex[rows * columns];

    /// <summary>Row and column of the next entry of a dense array: down the columns, from the diagonal where the rest follows.</summary>
    public (int Row, int Column) Next()
    {
        (int Row, int Column) next = (_row, _column);
        if (++_row == rows)
        {
            _column++;
            _row = symmetry == MatrixSymmetry.General ? 0 : _column;
        }

        return next;
    }

    /// <summary>Enters a number, and its mirror image where the symmetry gives one.</summary>
    public MatrixEntryFault Set(long row, long column, Complex number)
    {
        if (row < 0 || column < 0 || row >= rows || column >= columns)
            return MatrixEntryFault.Outside;
        if (symmetry != MatrixSymmetry.General && row < column)
            return MatrixEntryFault.AboveDiagonal;
        if (symmetry == MatrixSymmetry.Hermitian && row == column && number.Imaginary != 0)
            return MatrixEntryFault.DiagonalNotReal;
        int index = (int)(row * columns + column);
        if (_given[index])
            return MatrixEntryFault.Twice;
        _given[index] = true;
        if (symmetry != MatrixSymmetry.General)
            Numbers[column * columns + row] = symmetry == MatrixSymmetry.Hermitian ? Complex.Conjugate(number) : number;
        Numbers[index] = number;
        return MatrixEntryFault.None;
    }
}

/// <summary>What keeps an entry out of a matrix.</summary>
internal enum MatrixEntryFault
{
    /// <summary>Nothing.</summary>
    None,

    /// <summary>Its row or column does not exist.</summary>
    Outside,

    /// <summary>It lies above the diagonal of a matrix of which only the lower triangle is stored.</summary>
    AboveDiagonal,

    /// <summary>It lies on the diagonal of a Hermitian matrix and has an imaginary part.</summary>
    DiagonalNotReal,

    /// <summary>It was given before.</summary>
    Twice,
}
