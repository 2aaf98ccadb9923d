using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>explain</c>.</summary>
internal static class ExplainCommand
{
    /// <summary>Executes it.</summary>
    public static Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        bool markdown = use.Choice(o.PageFormat, Options.PageFormats) == "markdown";
        string? file = Work.FileOf(use, o, o.Out);
        string? code = use.Only("a code", optional: true);
        Explanation? found = Catalogue.All.FirstOrDefault(e => string.Equals(e.Code, code, StringComparison.OrdinalIgnoreCase));
        if (code is not null && found is null)
            use.Findings.Add(Findings.UnknownCode(code, [.. Catalogue.All.Select(e => e.Code)]));
        return Task.FromResult(use.Findings.Count > 0
            ? Work.Refuse(use, "nothing was explained")
            : Work.Deliver(use, file, TextOf(found, markdown), ExitCodes.Done));
    }

    private static string TextOf(Explanation? one, bool markdown) => (one, markdown) switch
    {
        (null, true) => MessagesPage.Markdown(Catalogue.All),
        (null, false) => MessagesPage.List(Catalogue.All),
        ({ } e, true) => MessagesPage.Entry(e),
        ({ } e, false) => MessagesPage.Text(e),
    };
}
