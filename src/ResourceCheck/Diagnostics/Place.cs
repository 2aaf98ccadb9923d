namespace ResourceCheck.Diagnostics;

/// <summary>Where in an input something was found. Lines and columns count from 1; line 0 means the input has no lines.</summary>
/// <param name="File">File name as the user gave it, or a description such as <c>--set flight.Dov.length</c>.</param>
/// <param name="Line">Line, from 1; 0 when the input has no lines.</param>
/// <param name="Column">Column, from 1; 0 when the input has no lines.</param>
/// <param name="LineText">The offending line as written; null when there is none to quote.</param>
/// <param name="MarkStart">Zero-based start of the marked words within <paramref name="LineText"/>.</param>
/// <param name="MarkLength">Length of the marked words; 0 marks nothing.</param>
public sealed record Place(string File, int Line, int Column, string? LineText, int MarkStart, int MarkLength)
{
    /// <summary>A place that names an input without lines, such as an option of the command line.</summary>
    public static Place Of(string input) => new(input, 0, 0, null, 0, 0);
}
