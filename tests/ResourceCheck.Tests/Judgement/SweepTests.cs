using System.Diagnostics;
using ResourceCheck.Cli;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Tests.ProtocolLibrary;
using ResourceCheck.Tests.Reports;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>Figures against varied values.</summary>
public sealed class SweepTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("resourcecheck-sweep-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    /// <summary>Depolarising p of one qudit of a pair leaves the fidelity 1 - 3p/4.</summary>
    [Fact]
    public void Points_follow_the_closed_form_in_order()
    {
        SweepResult sweep = Sweep([new("flight.A.depolarising", "0..0.4:5")]);
        Assert.Equal([0, 0.1, 0.2, 0.3, 0.4], sweep.Points.Select(p => p.Values[0]), (a, b) => Math.Abs(a - b) < 1e-15);
        Assert.All(sweep.Points, p => Assert.Equal(1 - (0.75 * p.Values[0]), p.Figures.Single(f => f.Key == "fidelity arrived").Value.Value, 1e-12));
        Assert.Equal([true, true, false, false, false], sweep.Points.Select(p => p.GoalsMet));
    }

    [Fact]
    public void Two_paths_make_a_grid_with_the_first_slowest_and_logarithms_are_even()
    {
        SweepResult sweep = Sweep([new("flight.A.depolarising", "0..0.1:2"), new("flight.B.depolarising", "0.001..0.1:log 3")]);
        Assert.Equal([(0, 0.001), (0, 0.01), (0, 0.1), (0.1, 0.001), (0.1, 0.01), (0.1, 0.1)], sweep.Points.Select(p => (p.Values[0], p.Values[1])), (a, b) => Math.Abs(a.Item1 - b.Item1) + Math.Abs(a.Item2 - b.Item2) < 1e-15);
    }

    [Fact]
    public void Points_that_cannot_be_computed_are_told_and_the_others_stand()
    {
        RunRequest request = ProtocolLibraryTests.Request("leader-draw.protocol", conditions: false, parameters: false);
        SweepResult sweep = Value(Judge.Sweep(new SweepRequest(request with { MemoryLimit = 1e6, Engine = "dense" }, [new("n", "3..5")], null, null)));
        Assert.Equal([3, 4, 5], sweep.Points.Select(p => p.Values[0]));
        Assert.Equal([false, true, true], sweep.Points.Select(p => p.Failure is not null));
        Assert.EndsWith("(E001)", sweep.Points[2].Failure, StringComparison.Ordinal);
    }

    [Fact]
    public void A_journal_of_another_sweep_or_in_no_folder_is_one_clear_error()
    {
        string journal = Path.Combine(_folder, "points");
        File.WriteAllText(journal, "0123\n");
        Assert.Equal(["J007"], Judge.Sweep(new SweepRequest(Request(), [new("flight.depolarising", "0..0.4:5")], journal, null)).Findings.Select(f => f.Code));
        Assert.Equal(["J008"], Judge.Sweep(new SweepRequest(Request(), [new("flight.depolarising", "0..0.4:5")], Path.Combine(_folder, "none", "points"), null)).Findings.Select(f => f.Code));
        File.WriteAllText(journal, "");
        Assert.True(Judge.Sweep(new SweepRequest(Request(), [new("flight.depolarising", "0..0.4:5")], journal, null)).Succeeded);
        Assert.Equal(6, File.ReadAllLines(journal).Length);
    }

    [Fact]
    public void A_line_that_was_cut_short_is_computed_again()
    {
        string journal = Path.Combine(_folder, "points");
        SweepRequest request = new(Request(), [new("flight.depolarising", "0..0.4:5")], journal, null);
        string whole = Table(Value(Judge.Sweep(request)));
        string[] lines = File.ReadAllLines(journal);
        File.WriteAllText(journal, string.Join('\n', lines[..4]) + "\n" + lines[4][..20]);
        Assert.Equal(whole, Table(Value(Judge.Sweep(request))));
        Assert.Equal(6, File.ReadAllLines(journal).Length);
    }

    /// <summary>The process is killed ten times, each time a little after it has kept further points; the table is the same to the byte.</summary>
    [Fact]
    public async Task A_killed_sweep_goes_on_to_the_same_table()
    {
        string script = Path.Combine(Golden.Root, "protocols", "leader-draw.protocol");
        string[] words = ["sweep", script, "--vary", "flight.depolarising=0..0.2:60", "--parameter", "n=4", "--format", "csv", "--quiet", "--out"];
        string whole = Path.Combine(_folder, "whole.csv"), pieces = Path.Combine(_folder, "pieces.csv");
        await Run([.. words, whole], () => false);
        int kept = 0;
        for (int i = 0; i < 10; i++)
        {
            int before = kept;
            await Run([.. words, pieces], () => Kept(pieces) > before);
            kept = Kept(pieces);
        }

        Assert.True(File.Exists(pieces) || kept > 10, $"{kept} lines were kept");
        await Run([.. words, pieces], () => false);
        Assert.Equal(await File.ReadAllBytesAsync(whole, TestContext.Current.CancellationToken), await File.ReadAllBytesAsync(pieces, TestContext.Current.CancellationToken));
        Assert.False(File.Exists(pieces + ".points"));
    }

    private static int Kept(string table)
    {
        if (!File.Exists(table + ".points"))
            return 0;
        using FileStream file = new(table + ".points", FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        using StreamReader reader = new(file);
        return reader.ReadToEnd().Count(c => c == '\n');
    }

    private static async Task Run(string[] words, Func<bool> kill)
    {
        ProcessStartInfo start = new("dotnet", [typeof(CommandLineTool).Assembly.Location, .. words]);
        using Process process = Process.Start(start)!;
        while (!process.HasExited && !kill())
            await Task.Delay(5);
        if (!process.HasExited)
            process.Kill();
        await process.WaitForExitAsync();
    }

    private static RunRequest Request() => new()
    {
        Script = new InputText("p.protocol", "protocol \"p\"\nparties A, B\nresource antisymmetric on all\nround \"r\"\n  A measures level as a\nend\nsuccess when true\ngoal \"arrived\" >= 0.9\n", ""),
    };

    private static SweepResult Sweep(IReadOnlyList<KeyValuePair<string, string>> vary) => Value(Judge.Sweep(new SweepRequest(Request(), vary, null, null)));

    private static string Table(SweepResult sweep)
    {
        using StringWriter writer = new();
        ResourceCheck.Reports.ReportWriter.Write(sweep, ResourceCheck.Reports.ReportFormat.Json, writer);
        return writer.ToString();
    }

    private static T Value<T>(Outcome<T> outcome)
        where T : class
    {
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
