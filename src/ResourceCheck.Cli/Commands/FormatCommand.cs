using ResourceCheck.Cli.Files;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>format</c>: a script with mistakes is left alone.</summary>
internal static class FormatCommand
{
    private const string NothingFormatted = "nothing was formatted";

    /// <summary>Executes it.</summary>
    public static Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        string? name = use.Only("a script");
        use.Exclude(o.Check, o.Write);
        use.Exclude(o.Write, o.Out);
        string? target = Work.FileOf(use, o, o.Out);
        InputText? script = use.Read(name);
        return Task.FromResult(script is null || use.Findings.Count > 0 ? Work.Refuse(use, NothingFormatted) : Format(use, o, name!, script, target));
    }

    private static int Format(Invocation use, Options o, string name, InputText script, string? target)
    {
        (ScriptTree tree, IReadOnlyList<Diagnostic> findings) = use.Session.Library.Parse(new SourceText(script.Name, script.Text));
        if (findings.Any(f => f.Severity == Severity.Error))
            return use.Session.Terminal.Fail(findings, ExitCodes.WrongInput, NothingFormatted);
        if (!use.Has(o.Quiet))
            use.Session.Terminal.Show(findings);
        string formatted = use.Session.Library.Print(tree);
        bool same = formatted == script.Text;
        if (use.Has(o.Check))
            return Compare(use, same, script.Name);
        if (use.Has(o.Write) && name != InputFiles.StandardInput)
            return same ? ExitCodes.Done : Work.Deliver(use, name, formatted, ExitCodes.Done);
        return Work.Deliver(use, target, formatted, ExitCodes.Done);
    }

    private static int Compare(Invocation use, bool same, string name)
    {
        if (!same)
            use.Session.Terminal.Note($"{name} is not in its one shape; resourcecheck format --write {name} brings it there.");
        return same ? ExitCodes.Done : ExitCodes.NotMet;
    }
}
