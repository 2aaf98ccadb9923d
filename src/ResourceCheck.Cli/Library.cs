using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Resources;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Cli;

/// <summary>The library's steps that commands call; tests put others in their place.</summary>
internal sealed record Library
{
    /// <summary>Evaluates a protocol.</summary>
    public Func<RunRequest, Outcome<RunResult>> Run { get; init; } = Judge.Run;

    /// <summary>Proves or refutes claims.</summary>
    public Func<RunRequest, Outcome<VerifyResult>> Verify { get; init; } = Judge.Verify;

    /// <summary>Tells what would be computed.</summary>
    public Func<RunRequest, Outcome<InspectResult>> Inspect { get; init; } = Judge.Inspect;

    /// <summary>Describes a prepared state.</summary>
    public Func<string, bool, Outcome<StateDescription>> Describe { get; init; } = StateFile.Describe;

    /// <summary>Reads a script.</summary>
    public Func<SourceText, (ScriptTree Tree, IReadOnlyList<Diagnostic> Findings)> Parse { get; init; } = Script.Parse;

    /// <summary>Prints a script in its one shape.</summary>
    public Func<ScriptTree, string> Print { get; init; } = Script.Print;
}
