namespace ResourceCheck.Cli;

/// <summary>The streams and facts of the process that the tool depends on.</summary>
/// <param name="Output">Takes the result and nothing else.</param>
/// <param name="Error">Takes everything else.</param>
/// <param name="OpenInput">Opens standard input, for the file name <c>-</c>.</param>
/// <param name="OutputIsTerminal">Whether a person reads the output as it comes.</param>
/// <param name="Colour">Whether the output may hold colours.</param>
/// <param name="Trace">Whether a mistake of the program shows its details.</param>
internal sealed record ToolHost(TextWriter Output, TextWriter Error, Func<Stream> OpenInput, bool OutputIsTerminal, bool Colour, bool Trace)
{
    /// <summary>Whether a person reads the errors as they come, who wants to know how far long work is.</summary>
    public bool ErrorIsTerminal { get; init; }

    /// <summary>The host of the running process.</summary>
    public static ToolHost OfProcess()
    {
        bool terminal = !Console.IsOutputRedirected;
        bool plain = !string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR")) || Environment.GetEnvironmentVariable("TERM") is null or "" or "dumb";
        return new(
            Utf8(Console.OpenStandardOutput()),
            Utf8(Console.OpenStandardError()),
            Console.OpenStandardInput,
            terminal,
            terminal && !plain,
            Environment.GetEnvironmentVariable("RESOURCECHECK_TRACE") == "1")
        {
            ErrorIsTerminal = !Console.IsErrorRedirected,
        };
    }

    private static StreamWriter Utf8(Stream stream) => new(stream, new System.Text.UTF8Encoding(encoderShouldEmitUTF8Identifier: false)) { NewLine = "\n" };
}
