using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli;

/// <summary>What the tool says: results to standard output, everything else to standard error.</summary>
internal sealed class Terminal(ToolHost host)
{
    private bool _spoken;

    /// <summary>The streams behind it.</summary>
    public ToolHost Host { get; } = host;

    /// <summary>Shows findings and the closing count; returns the exit code.</summary>
    /// <param name="findings">What was found.</param>
    /// <param name="code">The exit code to return.</param>
    /// <param name="closing">What became of the work, such as <c>nothing was computed</c>; null leaves the count out.</param>
    public int Fail(IReadOnlyList<Diagnostic> findings, int code, string? closing = null)
    {
        Show(findings);
        int mistakes = findings.Count(f => f.Severity == Severity.Error);
        if (closing is not null)
            Note(code == ExitCodes.NoResult ? "No trustworthy result could be had." : $"{mistakes} {(mistakes == 1 ? "mistake" : "mistakes")}; {closing}.");
        return code;
    }

    /// <summary>Shows findings, a blank line between any two.</summary>
    public void Show(IReadOnlyList<Diagnostic> findings)
    {
        foreach (Diagnostic finding in findings)
            Note(finding.ToString());
    }

    /// <summary>Says something on standard error, at once.</summary>
    public void Note(string text)
    {
        string separator = _spoken ? "\n" : "";
        _spoken = true;
        Try(() =>
        {
            Host.Error.Write($"{separator}{Visible.InLines(text)}\n");
            Host.Error.Flush();
        });
    }

    /// <summary>Says on standard error how far work is; a file or another program is told nothing.</summary>
    public void Progress(string text)
    {
        if (Host.ErrorIsTerminal)
            Note(text);
    }

    /// <summary>Writes a result to standard output.</summary>
    public int Write(string text, int code)
    {
        try
        {
            Host.Output.Write(text);
            Host.Output.Flush();
            return code;
        }
        catch (IOException failure)
        {
            // A reader that has seen enough, such as head, is no mistake of anybody.
            return IsBrokenPipe(failure) ? code : Fail([Findings.OutputRefused(failure.Message)], ExitCodes.WrongInput);
        }
    }

    /// <summary>Flushes what is left and returns the exit code.</summary>
    public int Close(int code)
    {
        Try(Host.Output.Flush);
        Try(Host.Error.Flush);
        return code;
    }

    private static bool IsBrokenPipe(IOException failure)
    {
        const int brokenPipeOfUnix = 32;
        const int brokenPipeOfWindows = unchecked((int)0x8007006D);
        return failure.HResult is brokenPipeOfUnix or brokenPipeOfWindows;
    }

    private static void Try(Action write)
    {
        try
        {
            write();
        }
        catch (IOException)
        {
            // Nobody listens any more, so there is nobody to tell.
        }
    }
}
