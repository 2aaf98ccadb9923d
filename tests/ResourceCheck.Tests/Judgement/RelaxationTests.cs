using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>The command that follows relaxation against time; values from tests/reference/collective.py and the closed forms it asserts.</summary>
public sealed class RelaxationTests
{
    private const string Unit = "\"linewidth\": \"0.15915494309189535 Hz\""; // Γ = 1/s

    /// <summary>The population of |S_3⟩ on the way from three inverted emitters in a row is largest at about 1.7 %.</summary>
    [Fact]
    public void The_inverted_chain_passes_its_largest_population()
    {
        RelaxationResult result = Follow(Conditions("\"shape\": \"chain\", \"spacing\": \"0.3 wavelengths\"", "\"excited\"", "2 s"), 3, points: 11);
        RelaxationPoint best = result.Points.MaxBy(p => p.Antisymmetric.Value)!;
        Assert.Equal(0.6, best.Time, 1e-12);
        Assert.Equal(0.0172034832300553, best.Antisymmetric.Value, 1e-10);
        Assert.All(result.Points, p => Assert.Equal((TruthLabel.Exact, TruthLabel.Exact), (p.Antisymmetric.Label, p.Excited.Label)));
        Assert.Equal((3.0, 0.0), (result.Points[0].Excited.Value, result.Points[0].Antisymmetric.Value));
        Assert.Null(result.Seed);
        Assert.InRange(result.ErrorEstimate, 1e-15, 1e-9);
    }

    /// <summary>
    /// Each alone, an inverted emitter is in level 0 with p = e^{-2t} and in each other level with (1-p)/2; the fidelity of a diagonal
    /// product of three alike is p_0 p_1 p_2, since all six terms of |S_3⟩ find the same product.
    /// </summary>
    [Fact]
    public void Each_alone_follows_the_closed_form()
    {
        RelaxationResult result = Follow(Conditions("\"shape\": \"ring\", \"spacing\": \"0.1 wavelengths\"", "\"excited\"", "2 s"), 3, points: 9);
        foreach (RelaxationPoint point in result.Points)
        {
            double p = Math.Exp(-2 * point.Time);
            Assert.Equal(p * Math.Pow((1 - p) / 2, 2), point.Independent.Value, 1e-11);
        }
    }

    /// <summary>Heralding turns the dark share of the pair start into yield 1/3 at fidelity 1; of all copies the fidelity is 1/3.</summary>
    [Fact]
    public void At_one_point_the_pair_start_ends_at_a_third()
    {
        RelaxationPoint end = Follow(Conditions("\"shape\": \"point\"", "{ \"bystanders\": [2] }", "60 s"), 3, points: 2).Points[^1];
        Assert.Equal(1.0 / 3, end.Antisymmetric.Value, 1e-9);
        Assert.Equal(1.0 / 3, end.NoPhoton, 1e-9);
        Assert.Equal(1, end.PhotonFreeFidelity, 1e-9);
        Assert.Equal(0, Follow(Conditions("\"shape\": \"point\"", "{ \"bystanders\": [1] }", "60 s"), 3, points: 2).Points[^1].Antisymmetric.Value, 1e-9);
    }

    /// <summary>What a run starts from is the last point of the curve, heralded or not.</summary>
    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void A_run_starts_where_the_curve_ends(bool heralded)
    {
        string geometry = """
            "positions": [ [ "0 wavelengths", "0 wavelengths", "0 wavelengths" ], [ "0.21 wavelengths", "0.05 wavelengths", "0.1 wavelengths" ], [ "-0.1 wavelengths", "0.3 wavelengths", "0.02 wavelengths" ] ],
            "dipoles": [ [0, 0, 1], [1, 1, 0] ]
            """;
        InputText conditions = Conditions(geometry + (heralded ? ", \"heralded\": true" : ""), "{ \"levels\": [0, 1, 2] }", "0.9 s");
        RelaxationPoint end = Follow(conditions, 3, points: 7).Points[^1];
        const string Script = "protocol \"p\"\nparties A, B, C\nresource antisymmetric on all\nsuccess when true\n";
        RunResult run = Judge.Run(new RunRequest { Script = new InputText("p.protocol", Script, ""), Conditions = conditions }).Value!;
        double prepared = run.Checkpoints.Single(c => c.Name == "prepared").Fidelity.Value;
        Assert.True(prepared > 0.001);
        Assert.Equal(heralded ? end.PhotonFreeFidelity : end.Antisymmetric.Value, prepared, 1e-10);
        Assert.Equal(heralded ? end.NoPhoton : 1, run.Yield.Value.Value, 1e-10);
    }

    [Fact]
    public void Above_the_density_operator_what_photons_add_is_sampled_with_an_interval()
    {
        InputText conditions = Conditions("\"shape\": \"chain\", \"spacing\": \"0.4 wavelengths\"", "{ \"levels\": [0, 0, 1, 2, 3, 4] }", "0.1 s");
        RelaxationResult result = Follow(conditions, 6, points: 3, samples: 60), again = Follow(conditions, 6, points: 3, samples: 60);
        Assert.Equal((1L, 60), (result.Seed, result.Samples));
        RelaxationPoint start = result.Points[0], end = result.Points[^1];
        Assert.Equal((TruthLabel.Exact, 0.0), (start.Antisymmetric.Label, start.Antisymmetric.Value));
        foreach (Estimate sampled in new[] { end.Antisymmetric, end.Symmetric, end.Independent, end.Excited })
        {
            Assert.Equal((TruthLabel.Sampled, 0.99), (sampled.Label, sampled.Confidence));
            Assert.True(sampled.Low <= sampled.Value && sampled.Value <= sampled.High && sampled.Low < sampled.High);
        }

        Assert.InRange(end.Antisymmetric.High, 0, 1 - end.NoPhoton);
        Assert.InRange(2 * Math.Exp(-0.5), end.Excited.Low, end.Excited.High); // nearly each alone at this spacing: 2 exp(-5 · 0.1)
        Assert.Equal(result.Points, again.Points);
    }

    [Theory]
    [InlineData("{}", 3, "C068")]
    [InlineData("""{ "resource": { "relaxed": { "shape": "point", "linewidth": "6 MHz", "start": "excited", "time": "50 ns" } } }""", 9, "E017")]
    [InlineData("""{ "resource": { "relaxed": { "shape": "point", "linewidth": "6 MHz", "start": { "levels": [0, 0] }, "time": "50 ns" } } }""", 3, "C061")]
    public void What_cannot_be_followed_is_one_clear_error(string conditions, int emitters, string code)
    {
        Outcome<RelaxationResult> outcome = Ask(new InputText("c.json", conditions, ""), emitters, 3, 10);
        Assert.Equal([code], outcome.Findings.Select(f => f.Code));
        Assert.False(outcome.Succeeded);
    }

    private static InputText Conditions(string geometry, string start, string time) =>
        new("c.json", $$"""{ "resource": { "relaxed": { {{geometry}}, {{Unit}}, "start": {{start}}, "time": "{{time}}" } } }""", "");

    private static RelaxationResult Follow(InputText conditions, int emitters, int points, int samples = 10)
    {
        Outcome<RelaxationResult> outcome = Ask(conditions, emitters, points, samples);
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }

    private static Outcome<RelaxationResult> Ask(InputText conditions, int emitters, int points, int samples) =>
        Judge.Relaxation(new RelaxationRequest(conditions, [], emitters, null, points, samples, 1, TestContext.Current.CancellationToken));
}
