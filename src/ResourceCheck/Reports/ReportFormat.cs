namespace ResourceCheck.Reports;

/// <summary>How a result is written.</summary>
public enum ReportFormat
{
    /// <summary>For people at a terminal.</summary>
    Text,

    /// <summary>The whole result document, for programs; its schema is published.</summary>
    Json,

    /// <summary>One table with full precision, for spreadsheets and scripts.</summary>
    Csv,

    /// <summary>Tables for notes and issues.</summary>
    Markdown,

    /// <summary>Tables for papers: booktabs and siunitx.</summary>
    Latex,
}
