using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Printing;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts;

/// <summary>The steps from a script's text to a checked protocol.</summary>
public static class Script
{
    /// <summary>Reads a script. Findings hold every mistake of form; the tree is returned even then, with broken lines marked.</summary>
    public static (ScriptTree Tree, IReadOnlyList<Diagnostic> Findings) Parse(SourceText source) => ScriptParser.Run(source);

    /// <summary>The script in its one shape: the formatter's output. Parsing it gives the same tree.</summary>
    public static string Print(ScriptTree tree) => ScriptPrinter.Print(tree);

    /// <summary>The parameters a script declares, with default and domain, without checking the rest.</summary>
    public static IReadOnlyList<ParameterInfo> ParametersOf(ScriptTree tree) => ParameterReader.Read(tree);

    /// <summary>Checks a script at given parameter values (absent ones take their default) and resolves its names.</summary>
    public static Outcome<Protocol> Bind(ScriptTree tree, IReadOnlyDictionary<string, Rational> parameters) =>
        ProtocolBinder.Bind(tree, parameters);
}
