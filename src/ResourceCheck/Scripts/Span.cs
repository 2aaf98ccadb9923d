namespace ResourceCheck.Scripts;

/// <summary>A run of characters of a script, from <paramref name="Start"/> (zero-based) over <paramref name="Length"/> characters.</summary>
/// <param name="Start">Zero-based offset of the first character.</param>
/// <param name="Length">Number of characters.</param>
public readonly record struct Span(int Start, int Length)
{
    /// <summary>Offset behind the last character.</summary>
    public int End => Start + Length;

    /// <summary>The smallest span that covers both.</summary>
    public Span Through(Span last) => new(Math.Min(Start, last.Start), Math.Max(End, last.End) - Math.Min(Start, last.Start));
}
