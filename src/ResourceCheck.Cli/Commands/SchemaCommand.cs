using ResourceCheck.Cli.Usage;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>schema</c>.</summary>
internal static class SchemaCommand
{
    /// <summary>Executes it.</summary>
    public static Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        string? name = use.Only($"a name: {ResourceCheck.Diagnostics.Words.Or(Schemas.Names)}");
        string? schema = name is null ? null : Schemas.Find(name);
        if (name is not null && schema is null)
            use.Findings.Add(Findings.UnknownSchema(name, Schemas.Names));
        string? file = Work.FileOf(use, o);
        return Task.FromResult(use.Findings.Count > 0
            ? Work.Refuse(use, "nothing was written")
            : Work.Deliver(use, file, schema!.TrimEnd('\n') + "\n", ExitCodes.Done));
    }
}
