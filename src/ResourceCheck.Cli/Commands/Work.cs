using System.CommandLine;
using System.Globalization;
using ResourceCheck.Cli.Files;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Reports;

namespace ResourceCheck.Cli.Commands;

/// <summary>What commands that compute have in common: request, work, findings, result, exit code.</summary>
internal static class Work
{
    private const string NothingComputed = "nothing was computed";

    /// <summary>The request that the words and options of a command make; null when any of them is wrong.</summary>
    public static RunRequest? Request(Invocation use, Options o)
    {
        string? script = use.Only("a script");
        InputText? protocol = use.Read(script);
        InputText? conditions = Uses(o.Under) ? use.Read(use.Text(o.Under)) : null;
        IReadOnlyList<KeyValuePair<string, string>> overrides = Uses(o.Set) ? use.Pairs(o.Set, "flight.Dov.length=\"5 km\"") : [];
        IReadOnlyList<KeyValuePair<string, string>> parameters = use.Pairs(o.Parameter, "n=4");
        string? engine = Uses(o.Engine) ? use.Choice(o.Engine, Options.Engines) : null;
        double? memory = use.Memory(o.Memory);
        long seed = use.Whole(o.Seed, long.MinValue, long.MaxValue, otherwise: 1);
        int threads = (int)use.Whole(o.Threads, 0, MostThreads, otherwise: 0);
        if (protocol is null)
            return null;
        RunRequest request = new()
        {
            Script = protocol,
            Conditions = conditions,
            Overrides = overrides,
            Parameters = parameters,
            Engine = engine,
            MemoryLimit = memory,
            Seed = seed,
            Threads = threads,
        };
        if (use.Findings.Count == 0)
            return request;
        if (conditions is not null || !Uses(o.Under) || use.Text(o.Under) is null)
            use.Findings.AddRange(use.Session.Library.Inspect(request with { Engine = null }).Findings.Where(f => f.Severity == Severity.Error)); // all mistakes in one run
        return null;

        bool Uses(Option option) => use.Command.Options.Contains(option);
    }

    private const string FigureEnding = ".svg", DataEnding = ".dat";

    /// <summary>More threads than any machine has cores would only cost memory.</summary>
    public const int MostThreads = 4096;

    /// <summary>Whether and how uncertainties are carried through; null where that is not asked for.</summary>
    public static UncertaintyRequest? Uncertainty(Invocation use, Options o)
    {
        bool drawn = use.Command.Options.Contains(o.Draws);
        int samples = drawn ? (int)use.Whole(o.Draws, 0, MostSamples, otherwise: UncertaintyRequest.DefaultSamples) : 0;
        return use.Has(o.Uncertainty) ? new UncertaintyRequest(samples) : null;
    }

    /// <summary>More draws than this tell nothing more about conditions.</summary>
    private const int MostSamples = 1_000_000;

    /// <summary>Computes apart from the waiting task, so that an interruption is answered at once; what still runs ends with the process.</summary>
    public static Task<Outcome<T>> Compute<T>(Func<Outcome<T>> compute, CancellationToken token)
        where T : class => Task.Run(compute, token).WaitAsync(token);

    /// <summary>Where and how the result is to be written; whatever is wrong with that becomes a finding of the use.</summary>
    public static Target TargetOf(Invocation use, Options o)
    {
        string? format = use.Choice(o.Format, Options.Formats);
        return new Target(format switch
        {
            "json" => ReportFormat.Json,
            "csv" => ReportFormat.Csv,
            "markdown" => ReportFormat.Markdown,
            "latex" => ReportFormat.Latex,
            _ => ReportFormat.Text,
        }, FileOf(use, o, o.Out), use.Has(o.Quiet), use.Command.Options.Contains(o.Figure) ? FigureOf(use, o) : null);
    }

    /// <summary>The file that an option names, checked as far as can be before writing; null for standard output.</summary>
    public static string? FileOf(Invocation use, Options o, Option<string[]> option)
    {
        string? file = use.Text(option) is "-" ? null : use.Text(option);
        if (file is not null && OutputFile.Check(file) is { } finding)
            use.Findings.Add(finding);
        else if (file is not null && Inputs(use, o).Any(input => Path.GetFullPath(input) == Path.GetFullPath(file)))
            use.Findings.Add(Findings.OverInput(option.Name, file));
        return file;
    }

    private static string? FigureOf(Invocation use, Options o)
    {
        if (use.Text(o.Figure) is not { } file)
            return null;
        if (!file.EndsWith(FigureEnding, StringComparison.OrdinalIgnoreCase) || file.Length == FigureEnding.Length)
            use.Findings.Add(Findings.NoSvg(file));
        return FileOf(use, o, o.Figure);
    }

    private static IEnumerable<string> Inputs(Invocation use, Options o)
    {
        IEnumerable<string> read = use.Command.Options.Contains(o.Under) && use.Text(o.Under) is { } under ? [.. use.Positional, under] : use.Positional;
        return read.Where(name => name.Length > 0 && name != InputFiles.StandardInput);
    }

    /// <summary>Tells wrong usage.</summary>
    public static int Refuse(Invocation use, string closing = NothingComputed) =>
        use.Session.Terminal.Fail(use.Findings, ExitCodes.WrongInput, closing);

    /// <summary>Tells why there is no result.</summary>
    public static int Refuse(Invocation use, IReadOnlyList<Diagnostic> findings) => use.Session.Terminal.Fail(findings, CodeOf(findings), NothingComputed);

    /// <summary>Shows an outcome's findings and writes its value, if there is one.</summary>
    public static int Finish<T>(Invocation use, Target target, Outcome<T> outcome, Action<T, TextWriter, bool> write, Func<T, int> code, Func<T, IReadOnlyList<Diagnostic>> warnings, Func<T, IReadOnlyList<FigureImage>>? figures = null)
        where T : class
    {
        Terminal terminal = use.Session.Terminal;
        if (outcome.Value is not { } value)
            return terminal.Fail(outcome.Findings, CodeOf(outcome.Findings), NothingComputed);
        bool shownAlready = target is { Format: ReportFormat.Text, File: null } && terminal.Host.OutputIsTerminal;
        Diagnostic[] told = [.. outcome.Findings.Concat(warnings(value)).Distinct()];
        if (!target.Quiet && !shownAlready)
            terminal.Show(told);
        using StringWriter text = new();
        write(value, text, target.File is null && terminal.Host.Colour);
        return Deliver(use, target.File, text.ToString(), code(value), target.Figure is { } file && figures is not null ? Files(file, figures(value), terminal) : []);
    }

    /// <summary>A figure's drawing and data; further figures of the same result get a number behind the name.</summary>
    private static IReadOnlyList<(string Name, string Text)> Files(string file, IReadOnlyList<FigureImage> figures, Terminal terminal)
    {
        if (figures.Count == 0)
            terminal.Note("there is nothing to draw, so no figure was written");
        return [.. figures.SelectMany((figure, i) =>
        {
            string name = file[..^FigureEnding.Length] + (i == 0 ? "" : string.Create(CultureInfo.InvariantCulture, $"-{i + 1}"));
            return new[] { (name + FigureEnding, figure.Svg + "\n"), (name + DataEnding, figure.Data) };
        })];
    }

    /// <summary>Writes a text to a file or to standard output, and files beside it: all or none.</summary>
    public static int Deliver(Invocation use, string? file, string text, int code, IReadOnlyList<(string Name, string Text)>? beside = null)
    {
        (string, string)[] files = [.. beside ?? [], .. file is null ? [] : new[] { (file, text) }];
        if (files.Length > 0 && OutputFile.Write(files) is { } finding)
            return use.Session.Terminal.Fail([finding], ExitCodes.WrongInput, "nothing was written");
        return file is null ? use.Session.Terminal.Write(text, code) : code;
    }

    // Only when nothing is wrong with the input does "no trustworthy result" say what to look into.
    private static int CodeOf(IReadOnlyList<Diagnostic> findings)
    {
        Diagnostic[] errors = [.. findings.Where(f => f.Severity == Severity.Error)];
        return errors.Length > 0 && errors.All(f => f.Code.StartsWith('E')) ? ExitCodes.NoResult : ExitCodes.WrongInput;
    }
}
