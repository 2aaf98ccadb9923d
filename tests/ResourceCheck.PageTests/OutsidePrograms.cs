namespace ResourceCheck.PageTests;

/// <summary>Programs that a machine may have; tests that need one are skipped, and said to be, where it is missing.</summary>
internal static class OutsidePrograms
{
    public static string? Chromium { get; } = Find("chromium") ?? Find("chromium-browser");

    public static string? PdfLatex { get; } = Find("pdflatex");

    private static string? Find(string name) =>
        (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator).Select(folder => Path.Combine(folder, name)).FirstOrDefault(File.Exists);
}
