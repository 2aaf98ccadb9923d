using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using Xunit;

namespace ResourceCheck.Tests.Reference;

/// <summary>
/// Whole runs, script and conditions file together, against the schedules worked by hand in tests/reference/runs.py:
/// flights of different length, announcements, waits, heralds and detectors end in these figures.
/// </summary>
public sealed class ReferenceRunTests
{
    private const double Tolerance = 1e-10;

    public static TheoryData<string> Runs => [.. TableRow.Of("runs").Select(r => r.Name).Distinct()];

    [Theory]
    [MemberData(nameof(Runs))]
    public void Run_gives_the_figures_worked_by_hand(string name)
    {
        string root = Path.GetFullPath(Path.Combine(TableRow.Folder(), "..", ".."));
        Outcome<RunResult> outcome = Judge.Run(new RunRequest
        {
            Script = Read(Path.Combine(root, ScriptOf(name) + ".protocol")),
            Conditions = Read(Path.Combine(root, name + ".conditions.json")),
        });
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        List<string> off = [.. TableRow.Of("runs").Where(r => r.Name == name).Select(r => (Row: r, Value: Figure(outcome.Value!, r)))
            .Where(p => !(Math.Abs(p.Value - p.Row.Value) <= (Label(p.Row) == "Bell value" ? 1e-8 : Tolerance))).Select(p => $"{p.Row} {Label(p.Row)}: {p.Value:R} for {p.Row.Value:R}")];
        Assert.True(off.Count == 0, string.Join('\n', off));
    }

    /// <summary>Conditions that have no script of their own name it.</summary>
    private static string ScriptOf(string name) => TableRow.Of("runs").First(r => r.Name == name).Parameters.GetValueOrDefault("script") ?? name;

    private static InputText Read(string path) => new(path, File.ReadAllText(path), "");

    private static string Label(TableRow row) => row.Parameters.GetValueOrDefault("label") ?? "";

    private static double Figure(RunResult result, TableRow row) => row.Kind switch
    {
        "checkpoint" => result.Checkpoints.Single(c => c.Name == Label(row)).Fidelity.Value,
        "kept" => result.Checkpoints.Single(c => c.Name == Label(row)).Kept,
        "yield" => result.Yield.Value.Value,
        "success" => result.Cases[0].Metrics.Single(m => m.Name == "success").Estimate.Value,
        _ => result.Cases[0].Metrics.Single(m => m.Name == Label(row)).Estimate.Value,
    };
}
