using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Parsing;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts;

/// <summary>The front end's steps, from text to tree.</summary>
internal static class ScriptParser
{
    public static (ScriptTree Tree, IReadOnlyList<Diagnostic> Findings) Run(SourceText source)
    {
        FindingList findings = new(source);
        var (lines, comments) = Lexer.Run(source, findings);
        IReadOnlyList<Statement> statements = BlockParser.Run(lines, findings);
        return (new ScriptTree(source, statements, comments), findings.ToList());
    }
}
