using System.CommandLine;
using System.CommandLine.Parsing;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Usage;

/// <summary>Tells a command's own words from options that it does not know.</summary>
internal static class Positionals
{
    /// <summary>The words of the command; unknown options become findings. When there are too many, one behind an unknown option is taken for its value.</summary>
    public static IReadOnlyList<string> Read(ParseResult parsed, Words words, List<Diagnostic> findings)
    {
        Command command = parsed.CommandResult.Command;
        string[] known = [.. command.Options.Where(o => !o.Hidden).Select(o => o.Name).Append(Options.Help.Name)];
        List<(string Word, bool BehindUnknown)> kept = [];
        bool onlyWords = false, behindUnknown = false;
        foreach (Token token in parsed.Tokens)
        {
            onlyWords |= token.Type == TokenType.DoubleDash;
            bool own = token.Type == TokenType.Argument && IsOwn(parsed, token);
            bool unknown = own && !onlyWords && LooksLikeOption(token.Value);
            if (unknown)
                findings.Add(Findings.UnknownOption(words, token.Value, command.Name, known));
            else if (own)
                kept.Add((token.Value, behindUnknown));
            behindUnknown = unknown && !token.Value.Contains('=', StringComparison.Ordinal);
        }

        while (kept.Count > 1 && kept.FindIndex(k => k.BehindUnknown) is >= 0 and int index)
            kept.RemoveAt(index);
        return [.. kept.Select(k => k.Word)];
    }

    private static bool IsOwn(ParseResult parsed, Token token) =>
        parsed.CommandResult.Tokens.Any(t => ReferenceEquals(t, token)) || parsed.CommandResult.Children.OfType<ArgumentResult>().Any(a => a.Tokens.Any(t => ReferenceEquals(t, token)));

    private static bool LooksLikeOption(string word) => word.Length > 1 && word[0] == '-' && !char.IsAsciiDigit(word[1]);
}
