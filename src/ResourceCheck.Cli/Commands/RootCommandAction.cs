using System.CommandLine;
using ResourceCheck.Cli.Usage;

namespace ResourceCheck.Cli.Commands;

/// <summary>What happens without a command: help, version, or a finding.</summary>
internal static class RootCommandAction
{
    /// <summary>Executes it.</summary>
    public static int Execute(ParseResult parsed, RootCommand root, Options options, Session session)
    {
        string[] commands = [.. root.Subcommands.Where(c => !c.Hidden).Select(c => c.Name)];
        Words words = new(session.Args);
        string? word = parsed.UnmatchedTokens.Count > 0 ? parsed.UnmatchedTokens[0] : null;
        if (word is null && parsed.GetValue(Options.Help))
            return session.Terminal.Write(HelpPage.Of(root), ExitCodes.Done);
        if (word is null && parsed.GetValue(options.Version))
            return session.Terminal.Write($"resourcecheck {CommandLineTool.Version}\n", ExitCodes.Done);
        return session.Terminal.Fail([word switch
        {
            null => Findings.NoCommand(commands),
            ['-', ..] => Findings.UnknownOption(words, word, Findings.Program, [.. root.Options.Select(o => o.Name)]),
            _ => Findings.UnknownCommand(words, word, commands),
        }], ExitCodes.WrongInput, "nothing was done");
    }
}
