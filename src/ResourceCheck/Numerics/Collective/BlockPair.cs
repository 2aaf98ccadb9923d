namespace ResourceCheck.Numerics.Collective;

/// <summary>The part of a density operator between two blocks of words.</summary>
/// <param name="Row">Key of the block that its rows belong to.</param>
/// <param name="Column">Key of the block of its columns.</param>
/// <param name="Start">First entry among those of its sector, row after row.</param>
/// <param name="Rows">Words of the row block.</param>
/// <param name="Columns">Words of the column block.</param>
internal sealed record BlockPair(ulong Row, ulong Column, int Start, int Rows, int Columns)
{
    /// <summary>Number of entries.</summary>
    public int Size => Rows * Columns;
}
