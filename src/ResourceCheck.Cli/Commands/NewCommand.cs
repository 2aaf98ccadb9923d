using ResourceCheck.Cli.Files;
using ResourceCheck.Cli.Usage;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>new</c>: both files or none.</summary>
internal static class NewCommand
{
    private const string ScriptEnding = ".protocol";
    private const string ConditionsEnding = ".conditions.json";

    /// <summary>Executes it.</summary>
    public static Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        string? word = use.Only("a name for the new files");
        if (word is null)
            return Task.FromResult(Work.Refuse(use, "nothing was written"));
        string name = word.EndsWith(ScriptEnding, StringComparison.Ordinal) ? word[..^ScriptEnding.Length] : word;
        Check(use, name, use.Has(o.Force));
        return Task.FromResult(use.Findings.Count > 0 ? Work.Refuse(use, "nothing was written") : Write(use, name));
    }

    private static void Check(Invocation use, string name, bool force)
    {
        if (Path.GetFileName(name).Trim('.').Length == 0)
        {
            use.Findings.Add(Findings.UnfitName(name));
            return;
        }

        foreach (string file in new[] { name + ScriptEnding, name + ConditionsEnding })
        {
            if (OutputFile.Check(file) is { } finding)
                use.Findings.Add(finding);
            else if (!force && File.Exists(file))
                use.Findings.Add(Findings.Exists(file));
        }
    }

    private static int Write(Invocation use, string name)
    {
        string script = name + ScriptEnding, conditions = name + ConditionsEnding;
        if (OutputFile.Write([(script, Starter.Script), (conditions, Starter.Conditions)]) is { } finding)
            return use.Session.Terminal.Fail([finding], ExitCodes.WrongInput, "nothing was written");
        return use.Session.Terminal.Write(
            $"Wrote {script} and {conditions}.\nNext: resourcecheck run {Words.Quoted(script)} --under {Words.Quoted(conditions)}\n", ExitCodes.Done);
    }
}
