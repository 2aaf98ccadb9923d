namespace ResourceCheck.Scripts.Parsing;

/// <summary>Names a script gives anywhere, read off the tokens before parsing, so that a misspelt basis is told from a variable.</summary>
internal static class DeclaredNames
{
    private static readonly HashSet<string> Givers = ["as", "set", "sets", "pick", "picks", "parameter", "input", "for", "choose", "chooses"];

    public static IReadOnlySet<string> In(IEnumerable<TokenLine> lines)
    {
        HashSet<string> names = [];
        foreach (TokenLine line in lines)
        {
            bool all = line.Tokens[0].Is("parties") || line.Tokens[0].Is("outsider");
            for (int i = 1; i < line.Tokens.Count; i++)
            {
                if (all || Givers.Contains(line.Tokens[i - 1].Text))
                    names.Add(line.Tokens[i].Text);
            }
        }

        return names;
    }
}
