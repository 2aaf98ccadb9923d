using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Tests.Reports;
using Xunit;

namespace ResourceCheck.Tests.ProtocolLibrary;

/// <summary>One timeline from emitters side by side over the way to the end of waiting.</summary>
public sealed class StoredProtocolTests
{
    private const string Chain = """{ "storage": { "shape": "chain", "spacing": "0.05 wavelengths", "linewidth": "6 MHz", "duration": "2 ns" } }""";

    private const string Distinct = """
        protocol "p"
        parties A, B, C
        resource antisymmetric on all
        round "r"
          A, B, C measure level as v
        end
        success when distinct(v of A, B, C)
        """;

    /// <summary>
    /// Removal in the demo scenario: 5 ns at 0.1 wavelengths, then 2 km, then waiting for the leaver's word. Each look loses more than
    /// the one before, and what storage alone costs is what the storage command says: a copy with a photon adds nothing to the fidelity.
    /// </summary>
    [Fact]
    public void Looks_after_storage_travel_and_waiting_tell_the_losses_apart()
    {
        InputText conditions = File("removal-stored.conditions.json");
        RunResult run = Run(new RunRequest { Script = File("removal.protocol"), Conditions = conditions });
        double[] ways = [.. run.Checkpoints.Select(c => c.Fidelity.Value)];
        Assert.Equal(["prepared", "stored", "arrived", "after removal"], run.Checkpoints.Select(c => c.Name));
        Assert.Equal(1, ways[0], 1e-12);
        Assert.True(ways[1] < 0.97 && ways[2] < ways[1] - 0.02 && ways[3] < ways[2] - 0.01, string.Join(", ", ways));
        Assert.Equal(Storage(conditions, emitters: 4).Points[^1].Fidelity, ways[1], 1e-10);
    }

    /// <summary>The master equation with photons and the no-photon evolution agree on the fidelity where shifts move the state.</summary>
    [Fact]
    public void A_chain_whose_shifts_differ_is_warned_of_with_the_pair_that_breaks_the_symmetry()
    {
        InputText conditions = new("chain.json", Chain, "");
        StorageResult storage = Storage(conditions, emitters: 3);
        Diagnostic told = Assert.Single(storage.Warnings);
        Assert.Equal("P021", told.Code);
        Assert.Contains("between emitters 1 and 3", told.Message, StringComparison.Ordinal);
        RunResult run = Run(new RunRequest { Script = new InputText("p.protocol", Distinct, ""), Conditions = conditions });
        Assert.Equal(storage.Points[^1].Fidelity, run.Checkpoints.Single(c => c.Name == "stored").Fidelity.Value, 1e-10);
        Assert.Equal(storage.Points[^1].NoPhoton, run.Cases[0].Metrics[0].Estimate.Value, 1e-10); // levels are all distinct until a photon leaves
        Assert.InRange(run.IntegrationError, 1e-16, 1e-9);
        Assert.Contains(run.Warnings, w => w.Code == "P021");
    }

    [Fact]
    public void An_equilateral_triangle_is_warned_of_nothing() =>
        Assert.Empty(Storage(new InputText("ring.json", Chain.Replace("chain", "ring", StringComparison.Ordinal), ""), emitters: 3).Warnings);

    [Fact]
    public void A_tolerance_too_wide_for_exact_figures_is_warned_of()
    {
        InputText rough = new("ring.json", Chain.Replace("chain", "ring", StringComparison.Ordinal).Replace("\"2 ns\"", "\"2 ns\", \"tolerance\": 1e-4", StringComparison.Ordinal), "");
        Assert.Equal("P022", Assert.Single(Storage(rough, emitters: 3).Warnings).Code);
        Assert.Equal("P022", Assert.Single(Run(new RunRequest { Script = new InputText("p.protocol", Distinct, ""), Conditions = rough }).Warnings).Code);
    }

    /// <summary>Shifts grow as the inverse cube of the spacing: what would take hours is refused before it begins, wherever it is asked for.</summary>
    [Fact]
    public void Emitters_so_near_that_their_shifts_take_hours_are_refused_with_the_figure()
    {
        InputText near = new("near.json", Chain.Replace("0.05 wavelengths", "0.00002 wavelengths", StringComparison.Ordinal).Replace("2 ns", "2 us", StringComparison.Ordinal), "");
        Assert.Equal("E018", Assert.Single(Judge.Storage(new StorageRequest(near, [], 3, null, 3)).Findings).Code);
        Outcome<RunResult> run = Judge.Run(new RunRequest { Script = new InputText("p.protocol", Distinct, ""), Conditions = near });
        Diagnostic told = Assert.Single(run.Findings);
        Assert.Equal("E018", told.Code);
        Assert.Contains("`storage` would take about", told.Message, StringComparison.Ordinal);
        Assert.NotEmpty(Storage(near with { Text = near.Text.Replace("2 us", "1e-4 ps", StringComparison.Ordinal) }, emitters: 3).Points);
    }

    private static InputText File(string name)
    {
        string path = Path.Combine(Golden.Root, "protocols", name);
        return new InputText(path, System.IO.File.ReadAllText(path), "");
    }

    private static StorageResult Storage(InputText conditions, int emitters) =>
        Value(Judge.Storage(new StorageRequest(conditions, [], emitters, null, 3)));

    private static RunResult Run(RunRequest request) => Value(Judge.Run(request));

    private static T Value<T>(Outcome<T> outcome)
        where T : class
    {
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
