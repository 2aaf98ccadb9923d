using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Tests.ProtocolLibrary;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>Rates from attempts to the verdict.</summary>
public sealed class RateChainTests
{
    private const string Pair = "protocol \"p\"\nparties A, B\nresource antisymmetric on all\nround \"r\"\n  A measures level as a\n  A announces a\n  B measures level as b\n  keep when A.a = 0\nend\nsuccess when distinct(A.a, B.b)\n";

    /// <summary>
    /// 10 kHz of attempts with success 0.2 give 2000 /s. With flights of 1 ms the parties take at most 1000 /s; interfaces of 0.8 leave 640,
    /// arrival of 0.5 each 160, clicks of 0.9 at A before the keep, and at B behind it, of the kept half.
    /// </summary>
    [Theory]
    [InlineData("1 ms", 1000, "the parties set the pace")]
    [InlineData("0.1 ms", 2000, "preparation sets the pace")]
    public void Stages_multiply_as_worked_by_hand(string time, double pace, string words)
    {
        RunResult run = Run(Pair, $$"""
            { "preparation": { "attempts": "10 kHz", "success": 0.2 }, "detection": { "efficiency": 0.9 },
              "flight": { "time": "{{time}}", "transmission": 0.5, "heralded": true, "interface": { "efficiency": 0.8 } } }
            """);
        RateChain chain = run.Rates!;
        Assert.Equal(["attempts", "preparation", "parties free", "interface", "flight", "herald", "detection", "sifting", "verdict"], chain.Stages.Select(s => s.Name));
        Assert.Equal([10000, 2000, pace, 0.64 * pace, 0.16 * pace, 0.16 * pace], chain.Stages.Take(6).Select(s => s.Rate!.Value), (a, b) => Math.Abs(a - b) < 1e-9);
        Assert.Equal(0.0648 * pace, chain.Stages[7].Rate!.Value, 1e-9);
        Assert.Equal(0.81 * 0.5, run.Yield.Seen * run.Yield.Kept, 1e-12);
        Assert.Equal(chain.Stages[7].Rate!.Value, chain.Stages[8].Rate!.Value, 1e-9); // levels of the pair always differ
        Assert.Contains(words, chain.Pace, StringComparison.Ordinal);
        Assert.Equal(5e-4, chain.PreparationPeriod!.Value, 1e-15);
    }

    /// <summary>What holds for every protocol: the chain ends in the cost per copy and in the yield that a run tells.</summary>
    [Theory]
    [InlineData("removal", true)]
    [InlineData("removal", false)]
    [InlineData("leader-draw", true)]
    [InlineData("secret-sharing", true)]
    public void The_chain_meets_the_cost_per_copy_and_the_yield(string name, bool heralded)
    {
        RunRequest request = ProtocolLibraryTests.Request($"{name}.protocol", conditions: true, parameters: false);
        RunResult run = Judge.Run(heralded ? request : request with { Overrides = [new("flight.default.heralded", "false")] }).Value!;
        Dictionary<string, RateStage> stages = run.Rates!.Stages.ToDictionary(s => s.Name);
        Assert.Equal(1 / run.SecondsPerKeptCopy!.Value, stages["sifting"].Rate!.Value, 1e-9 / run.SecondsPerKeptCopy.Value);
        Assert.Equal(run.Yield.Value.Value, new[] { "interface", "flight", "herald", "detection", "sifting" }.Aggregate(1.0, (p, s) => p * stages[s].Probability!.Value), 1e-12);
        Assert.Equal(run.Duration, run.Rates.Occupied);
    }

    [Fact]
    public void Storage_without_a_photon_is_a_stage_and_lists_have_a_rate_of_their_own()
    {
        RunResult stored = Run(Pair, """{ "storage": { "shape": "pair", "spacing": "0.1 wavelengths", "linewidth": "6 MHz", "duration": "5 ns", "heralded": true } }""");
        RateStage photon = stored.Rates!.Stages.Single(s => s.Name == "no photon");
        Assert.InRange(photon.Probability!.Value, 0.5, 0.99999);
        Assert.Equal(stored.Yield.Heralded, photon.Probability.Value, 1e-12);
        Assert.All(stored.Rates.Stages, s => Assert.Null(s.Rate));
        Assert.Null(stored.Rates.Pace);
        RunResult list = Judge.Run(ProtocolLibraryTests.Request("detectable-broadcast.protocol", conditions: true, parameters: false) with { Parameters = [new("M", "12")] }).Value!;
        Assert.Equal(1 / list.List!.Value.Seconds!.Value, list.Rates!.Stages.Single(s => s.Name == "list").Rate!.Value, 1e-9);
    }

    private static RunResult Run(string script, string conditions)
    {
        Outcome<RunResult> outcome = Judge.Run(new RunRequest { Script = new InputText("p.protocol", script, ""), Conditions = new InputText("c.json", conditions, "") });
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
