namespace ResourceCheck.Figures;

/// <summary>A figure ready to be written.</summary>
/// <param name="Id">Name of its files and beginning of all ids inside, so that several figures can stand in one page.</param>
/// <param name="Title">Title in words.</param>
/// <param name="Description">What there is to see, for readers who cannot.</param>
/// <param name="Svg">An <c>svg</c> element with title and description, without a declaration before it.</param>
/// <param name="Data">The numbers as a table that pgfplots reads: a heading, columns separated by blanks, <c>nan</c> where there is none.</param>
public sealed record FigureImage(string Id, string Title, string Description, string Svg, string Data);
