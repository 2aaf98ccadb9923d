using ResourceCheck.Cli.Files;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Studies;

namespace ResourceCheck.Cli.Commands;

/// <summary><c>report</c>. Finished points of sweeps are kept in the folder until the report is written, and used again after an interruption.</summary>
internal static class ReportCommand
{
    private const string FolderEnding = "-report", StudyEnding = ".study", Journals = "points";

    /// <summary>Executes it.</summary>
    public static async Task<int> Execute(Invocation use, Options o, CancellationToken token)
    {
        string? name = use.Only("a study file");
        InputText? file = use.Read(name);
        long seed = use.Whole(o.Seed, long.MinValue, long.MaxValue, otherwise: 1);
        int threads = (int)use.Whole(o.Threads, 0, Work.MostThreads, otherwise: 0);
        string folder = use.Text(o.Folder) is { Length: > 0 } named ? named : FolderOf(name ?? "");
        if (File.Exists(folder))
            use.Findings.Add(Findings.NotAFolder(folder));
        if (file is null)
            return Work.Refuse(use);
        Outcome<Study> study = StudyFile.Read(file, use.ReadBeside);
        use.Findings.AddRange(study.Findings);
        if (study.Value is not { } read || use.Findings.Any(f => f.Severity == Severity.Error))
            return Work.Refuse(use);
        return OutputFolder.Make(folder, [StudyFiles.Tables, StudyFiles.Figures, Journals]) is { } refused
            ? use.Session.Terminal.Fail([refused], ExitCodes.WrongInput, "nothing was computed")
            : await Compute(use, o, new StudyRequest(read, Path.Combine(folder, Journals), use.Has(o.Quiet) ? null : new Teller(use.Session.Terminal), threads, seed, token), folder);
    }

    private static async Task<int> Compute(Invocation use, Options o, StudyRequest request, string folder)
    {
        Outcome<StudyResult> outcome = await Work.Compute(() => Judge.Study(request), request.Cancellation);
        Terminal terminal = use.Session.Terminal;
        if (outcome.Value is not { } result)
        {
            OutputFolder.RemoveEmpty(folder, [StudyFiles.Tables, StudyFiles.Figures, Journals]);
            return Work.Refuse(use, outcome.Findings);
        }

        (string, string)[] files = [.. StudyFiles.Of(result).Select(f => (Path.Combine([folder, .. f.Name.Split('/')]), f.Text))];
        if (OutputFile.Write(files) is { } finding)
            return terminal.Fail([finding], ExitCodes.WrongInput, "nothing was written");
        Directory.Delete(Path.Combine(folder, Journals), recursive: true);
        if (!use.Has(o.Quiet))
            terminal.Show([.. result.Parts.SelectMany(p => p.Failures.SelectMany(f => f.Findings)).Distinct()]);
        return terminal.Write(Summary(result, folder), result.AnyMissed ? ExitCodes.NotMet : ExitCodes.Done);
    }

    private static string Summary(StudyResult result, string folder)
    {
        IEnumerable<string> verdicts = result.Parts.Select(p => $"{p.Part.Title}: {p.Run?.VerdictText ?? "not computed."}");
        int failed = result.Parts.Sum(p => p.Failures.Count);
        return $"{string.Join('\n', verdicts)}\n\n{(failed == 0 ? "" : $"{failed} of the results asked for could not be computed; the report says which.\n")}Report: {Path.Combine(folder, "report.html")}; tables and figures beside it.\n";
    }

    private static string FolderOf(string study)
    {
        string stem = Path.Combine(Path.GetDirectoryName(study) ?? "", Path.GetFileNameWithoutExtension(study));
        return (stem.EndsWith(StudyEnding, StringComparison.OrdinalIgnoreCase) ? stem[..^StudyEnding.Length] : stem) + FolderEnding;
    }

    /// <summary>Tells every step that begins, with the time left once something can be said.</summary>
    private sealed class Teller(Terminal terminal) : IProgress<StudyProgress>
    {
        public void Report(StudyProgress value) => terminal.Note(
            $"{value.Step} of {value.Steps}: {value.Part}, {value.What}{(value.Remaining is { } left ? $" (about {Math.Ceiling(left)} s left)" : "")}");
    }
}
