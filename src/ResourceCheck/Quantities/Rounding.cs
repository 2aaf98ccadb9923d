namespace ResourceCheck.Quantities;

/// <summary>Which way a shown number may differ from the computed one.</summary>
internal enum Rounding
{
    /// <summary>To the nearest shown digit.</summary>
    Nearest,

    /// <summary>Never above the computed number: what a lower bound needs to stay one.</summary>
    Down,

    /// <summary>Never below the computed number: what an upper bound needs to stay one.</summary>
    Up,
}
