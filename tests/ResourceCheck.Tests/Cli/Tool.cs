using System.Text;
using ResourceCheck.Cli;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Syntax;
using ResourceCheck.Tests.Reports;

namespace ResourceCheck.Tests.Cli;

/// <summary>Runs the tool in-process in a folder of its own, with made-up results in place of the library's.</summary>
internal sealed class Tool : IDisposable
{
    public Tool()
    {
        Directory.CreateDirectory(Folder);
        Write("removal.protocol", "protocol \"Party removal\"\n");
        Write("winter.conditions.json", "{}\n");
    }

    public string Folder { get; } = Path.Combine(Path.GetTempPath(), $"resourcecheck-{Guid.NewGuid():N}");

    public string Script => At("removal.protocol");

    public string Conditions => At("winter.conditions.json");

    public RunRequest? Asked { get; private set; }

    public Outcome<RunResult> Run { get; set; } = Outcome<RunResult>.Of(Samples.Full with { Verdict = Verdict.Met });

    public Outcome<VerifyResult> Verify { get; set; } = Outcome<VerifyResult>.Of(Samples.Verification);

    public Action BeforeRun { get; set; } = () => { };

    public IReadOnlyList<Diagnostic> ParseFindings { get; set; } = [];

    public string Printed { get; set; } = "protocol \"Party removal\"\n";

    public string Input { get; set; } = "";

    public Action BeforeInput { get; set; } = () => { };

    public bool OutputIsTerminal { get; set; }

    public bool Trace { get; set; }

    public TextWriter? Output { get; set; }

    public string At(string name) => Path.Combine(Folder, name);

    public string Write(string name, string text)
    {
        File.WriteAllText(At(name), text);
        return At(name);
    }

    public Task<Said> Say(params string[] args) => Say(CancellationToken.None, args);

    public async Task<Said> Say(CancellationToken token, params string[] args)
    {
        using StringWriter output = new(), error = new();
        ToolHost host = new(Output ?? output, error, OpenInput, OutputIsTerminal, OutputIsTerminal, Trace);
        int code = await CommandLineTool.RunAsync(args, host, Steps(), token);
        return new Said(code, output.ToString(), error.ToString());
    }

    public void Dispose() => Directory.Delete(Folder, recursive: true);

    private MemoryStream OpenInput()
    {
        BeforeInput();
        return new MemoryStream(Encoding.UTF8.GetBytes(Input));
    }

    private Library Steps() => new()
    {
        Run = request =>
        {
            Asked = request;
            BeforeRun();
            return Run;
        },
        Verify = request =>
        {
            Asked = request;
            return Verify;
        },
        Inspect = request =>
        {
            Asked = request;
            return Outcome<InspectResult>.Of(Samples.Inspection);
        },
        Describe = (_, _) => Outcome<StateDescription>.Of(Samples.State),
        Parse = source => (new ScriptTree(source, [], []), ParseFindings),
        Print = _ => Printed,
    };
}

/// <summary>What the tool answered.</summary>
internal sealed record Said(int Code, string Output, string Error);
