using System.Diagnostics;
using Xunit;

namespace ResourceCheck.PageTests;

/// <summary>The report's tables and data in a paper.</summary>
public sealed class LatexTests(WrittenReport report) : IClassFixture<WrittenReport>
{
    /// <summary>A mistake in what LaTeX reads can make it run for ever.</summary>
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(2);

    [Fact]
    public async Task Tables_and_data_compile_as_written()
    {
        Assert.SkipWhen(OutsidePrograms.PdfLatex is null, "needs pdflatex");
        string[] tables = [.. Directory.GetFiles(report.Folder, "*.tex", SearchOption.AllDirectories).Order(StringComparer.Ordinal)];
        Assert.True(tables.Length > 5);
        await File.WriteAllTextAsync(
            Path.Combine(report.Folder, "paper.tex"),
            "\\documentclass{article}\n\\usepackage{booktabs}\n\\usepackage{siunitx}\n\\usepackage{pgfplots}\n\\pgfplotsset{compat=1.18}\n\\begin{document}\n"
                + string.Concat(tables.Select(t => $"\\input{{{Path.GetRelativePath(report.Folder, t)}}}\n\\clearpage\n"))
                + "\\begin{tikzpicture}\\begin{axis}\\addplot table[x=x, y=y1] {figures/part-1-sweep-1.dat};\\end{axis}\\end{tikzpicture}\n\\end{document}\n",
            TestContext.Current.CancellationToken);
        ProcessStartInfo start = new(OutsidePrograms.PdfLatex!, ["-interaction=nonstopmode", "-halt-on-error", "paper.tex"]) { WorkingDirectory = report.Folder, RedirectStandardOutput = true, RedirectStandardInput = true };
        using Process process = Process.Start(start)!;
        process.StandardInput.Close();
        using CancellationTokenSource patience = CancellationTokenSource.CreateLinkedTokenSource(TestContext.Current.CancellationToken);
        patience.CancelAfter(Patience);
        try
        {
            string said = await process.StandardOutput.ReadToEndAsync(patience.Token);
            await process.WaitForExitAsync(patience.Token);
            Assert.True(process.ExitCode == 0, said);
            Assert.Contains("Output written on paper.pdf", said, StringComparison.Ordinal);
        }
        finally
        {
            if (!process.HasExited)
                process.Kill();
        }
    }
}
