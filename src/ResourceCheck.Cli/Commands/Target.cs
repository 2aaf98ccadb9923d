using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary>Where and how a result is written.</summary>
/// <param name="Format">How.</param>
/// <param name="File">The file; null for standard output.</param>
/// <param name="Quiet">Whether warnings stay off standard error.</param>
/// <param name="Figure">SVG file for the figure; null for none.</param>
internal sealed record Target(ReportFormat Format, string? File, bool Quiet, string? Figure = null);
