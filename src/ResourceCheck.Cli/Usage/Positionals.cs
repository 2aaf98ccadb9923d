using System.CommandLine;
using System.CommandLine.Parsing;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Usage;

/// <summary>Tells a command's own words from options that it does not know.</summary>
internal static class Positionals
{
    /// <summary>The words of the command; unknown options become findings. A word behind an unknown option is taken for its value.</summary>
    public static IReadOnlyList<string> Read(ParseResult parsed, Words words, List<Diagnostic> findings)
    {
        Command command = parsed.CommandResult.Command;
        string[] known = [.. command.Options.Where(o => !o.Hidden).Select(o => o.Name).Append(Options.Help.Name)];
        List<string> kept = [];
        bool onlyWords = false, afterUnknown = false;
        foreach (Token token in parsed.Tokens)
        {
            onlyWords |= token.Type == TokenType.DoubleDash;
            if (token.Type != TokenType.Argument || !IsOwn(parsed, token))
            {
                afterUnknown = false;
            }
            else if (!onlyWords && LooksLikeOption(token.Value))
            {
                findings.Add(Findings.UnknownOption(words, token.Value, command.Name, known));
                afterUnknown = !token.Value.Contains('=', StringComparison.Ordinal);
            }
            else
            {
                if (!afterUnknown || kept.Count == 0)
                    kept.Add(token.Value);
                afterUnknown = false;
            }
        }

        return kept;
    }

    private static bool IsOwn(ParseResult parsed, Token token) =>
        parsed.CommandResult.Tokens.Any(t => ReferenceEquals(t, token)) || parsed.CommandResult.Children.OfType<ArgumentResult>().Any(a => a.Tokens.Any(t => ReferenceEquals(t, token)));

    private static bool LooksLikeOption(string word) => word.Length > 1 && word[0] == '-' && !char.IsAsciiDigit(word[1]);
}
