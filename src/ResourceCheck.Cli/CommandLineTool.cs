using System.CommandLine;
using System.Reflection;
using ResourceCheck.Cli.Commands;
using ResourceCheck.Cli.Usage;

namespace ResourceCheck.Cli;

/// <summary>The tool: parses arguments, calls the library, picks the exit code. No exception leaves it.</summary>
internal static class CommandLineTool
{
    /// <summary>Version of the program, as in every document.</summary>
    public static string Version { get; } =
        typeof(CommandLineTool).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "unknown";

    /// <summary>Runs one command line with given output streams and no standard input.</summary>
    public static Task<int> RunAsync(string[] args, TextWriter output, TextWriter error, CancellationToken token = default) =>
        RunAsync(args, new ToolHost(output, error, () => Stream.Null, OutputIsTerminal: false, Colour: false, Trace: false), new Library(), token);

    /// <summary>Runs one command line.</summary>
    public static async Task<int> RunAsync(string[] args, ToolHost host, Library library, CancellationToken token)
    {
        Terminal terminal = new(host);
        int code;
        try
        {
            code = await InvokeAsync(args, terminal, library, token);
        }
        catch (OperationCanceledException)
        {
            terminal.Note("Interrupted; nothing was written.");
            code = ExitCodes.Interrupted;
        }
        catch (OutOfMemoryException)
        {
            code = terminal.Fail([Findings.OutOfMemory()], ExitCodes.NoResult);
        }
#pragma warning disable CA1031 // The last resort: whatever went wrong, users get one calm message instead of a stack trace.
        catch (Exception mistake)
        {
            code = terminal.Fail([Findings.OwnMistake(mistake, Version)], ExitCodes.OwnMistake);
            if (host.Trace)
                terminal.Note(mistake.ToString());
        }
#pragma warning restore CA1031
        return terminal.Close(code);
    }

    private static Task<int> InvokeAsync(string[] args, Terminal terminal, Library library, CancellationToken token)
    {
        RootCommand root = CommandTree.Build(new Session(args, terminal, library));
        // Response files and bundled letters would give file names that begin with @ or - a second meaning.
        ParserConfiguration parser = new() { EnablePosixBundling = false, ResponseFileTokenReplacer = null };
        InvocationConfiguration invocation = new()
        {
            EnableDefaultExceptionHandler = false,
            ProcessTerminationTimeout = null,
            Output = terminal.Host.Output,
            Error = terminal.Host.Error,
        };
        return root.Parse(args, parser).InvokeAsync(invocation, token);
    }
}
