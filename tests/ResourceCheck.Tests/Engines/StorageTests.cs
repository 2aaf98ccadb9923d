using ResourceCheck.Conditions;
using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Tests.Conditions;
using Xunit;

namespace ResourceCheck.Tests.Engines;

/// <summary>Collective decay from a conditions file to the dense engine's checkpoints; values of the design's page on physics, there computed independently.</summary>
public sealed class StorageTests
{
    private const string Script = "protocol \"p\"\nparties P[1..3]\nresource antisymmetric on all\nround \"r\"\n  all measure level as v\nend\nsuccess when distinct(v of all)\n";

    /// <summary>Linewidth 1/2π Hz makes Γ = 1/s.</summary>
    private const string UnitRate = "0.15915494309189535 Hz";

    /// <summary>Equilateral triangle of spacing 0.1 λ, dipoles normal, Σ Γ = 2Γ: |S_3⟩ decays at 0.154606303235 Γ.</summary>
    [Fact]
    public void Triangle_decays_at_its_subradiant_rate()
    {
        Evaluation e = Evaluate($$"""{ "storage": { "shape": "ring", "spacing": "0.1 wavelengths", "linewidth": "{{UnitRate}}", "duration": "2 s" } }""");
        Assert.Equal(Math.Exp(-2 * 0.154606303235), Fidelity(e, "stored"), 1e-9);
        Assert.Equal(1, Fidelity(e, "prepared"), 1e-12);
        Assert.InRange(e.IntegrationError, 0, 1e-8);
    }

    /// <summary>Zero distance: the antisymmetric state is dark.</summary>
    [Fact]
    public void At_one_point_the_antisymmetric_state_is_dark() =>
        Assert.Equal(1, Fidelity(Evaluate($$"""{ "storage": { "shape": "point", "linewidth": "{{UnitRate}}", "duration": "5 s" } }"""), "stored"), 1e-10);

    /// <summary>General geometry: no-photon probability 0.123855361114, fidelity 0.115611030730 of all copies.</summary>
    [Fact]
    public void General_geometry_heralded_on_no_photon_keeps_what_the_permutation_space_says()
    {
        Evaluation e = Evaluate("""
            { "storage": { "positions": [ [ "0 wavelengths", "0 wavelengths", "0 wavelengths" ], [ "0.21 wavelengths", "0.05 wavelengths", "0.1 wavelengths" ], [ "-0.1 wavelengths", "0.3 wavelengths", "0.02 wavelengths" ] ],
              "dipoles": [ [0, 0, 1], [1, 1, 0] ], "linewidth": [ "0.15915494309189535 Hz", "0.11140846016432674 Hz" ], "duration": "2 s", "heralded": true } }
            """);
        CheckpointEvaluation stored = e.Checkpoints.Single(c => c.Label == "stored");
        Assert.Equal(0.123855361114, stored.Kept, 1e-9);
        Assert.Equal(0.115611030730, stored.Kept * stored.Fidelity.Value, 1e-9);
    }

    /// <summary>Far-apart emitters decay each alone: exp(-Σ_j Γ_j t).</summary>
    [Fact]
    public void Far_apart_emitters_decay_each_alone() =>
        Assert.Equal(Math.Exp(-0.6), Fidelity(Evaluate($$"""{ "storage": { "shape": "chain", "spacing": "1e5 wavelengths", "linewidth": "{{UnitRate}}", "duration": "0.3 s" } }"""), "stored"), 1e-5);

    /// <summary>From (|01⟩-|10⟩)/√2 with a bystander in level 2 relaxation at one point ends at overlap 1/3, from a bystander in level 1 at 0.</summary>
    [Theory]
    [InlineData(2, 1.0 / 3)]
    [InlineData(1, 0)]
    public void Relaxation_of_a_pair_ends_at_a_third_or_nothing(int bystander, double overlap)
    {
        Evaluation e = Evaluate($$"""{ "resource": { "relaxed": { "shape": "point", "linewidth": "{{UnitRate}}", "start": { "bystanders": [{{bystander}}] }, "time": "60 s" } } }""");
        Assert.Equal(overlap, Fidelity(e, "prepared"), 1e-8);
        Assert.InRange(e.IntegrationError, 1e-16, 1e-8);
    }

    /// <summary>The tolerance is the user's: a wider one shows in the estimated error, which still covers the true one.</summary>
    [Theory]
    [InlineData("storage", "duration")]
    [InlineData("resource.relaxed", "time")]
    public void The_error_that_is_told_follows_the_tolerance_and_covers_the_true_error(string section, string time)
    {
        Evaluation rough = Evaluate(Uneven(section, time, 1e-4)), fine = Evaluate(Uneven(section, time, 1e-14));
        Assert.InRange(fine.IntegrationError, 1e-16, 1e-9);
        Assert.InRange(rough.IntegrationError, 1e-6, 1);
        Assert.InRange(Math.Abs(Fidelity(rough, "stored") - Fidelity(fine, "stored")), 0, rough.IntegrationError);
        Assert.InRange(Math.Abs(rough.Success.Value - fine.Success.Value), 1e-14, rough.IntegrationError);
    }

    private static string Uneven(string section, string time, double tolerance)
    {
        string inside = FormattableString.Invariant(
            $$"""{ "shape": "chain", "spacing": "0.1 wavelengths", "linewidth": "{{UnitRate}}", "tolerance": {{tolerance}}, "{{time}}": "1.3 s"{{(section == "storage" ? "" : ", \"start\": \"excited\"")}} }""");
        return section == "storage" ? $$"""{ "storage": {{inside}} }""" : $$"""{ "resource": { "relaxed": {{inside}} } }""";
    }

    [Theory]
    [InlineData("""{ "storage": { "shape": "pair", "spacing": "0.1 wavelengths", "linewidth": "6 MHz", "duration": "5 ns" } }""", "C063")]
    [InlineData("""{ "storage": { "shape": "ring", "linewidth": "6 MHz", "duration": "5 ns" } }""", "C062")]
    [InlineData("""{ "storage": { "shape": "ring", "spacing": "80 nm", "linewidth": "6 MHz", "duration": "5 ns" } }""", "C064")]
    [InlineData("""{ "storage": { "shape": "ring", "spacing": "0.1 wavelengths", "linewidth": [ "6 MHz" ], "duration": "5 ns" } }""", "C061")]
    [InlineData("""{ "storage": { "shape": "ring", "spacing": "0.1 wavelengths", "linewidth": "6 MHz", "wavelength": [ "780 nm", "780 nm" ], "duration": "5 ns" } }""", "C065")]
    [InlineData("""{ "storage": { "shape": "ring", "spacing": "1e-9 wavelengths", "linewidth": "6 MHz", "duration": "5 ns" } }""", "C065")]
    [InlineData("""{ "storage": { "shape": "ring", "spacing": "0.1 wavelengths", "dipoles": [ [0, 0, 0], [0, 0, 1] ], "linewidth": "6 MHz", "duration": "5 ns" } }""", "C065")]
    public void Unfit_geometry_is_one_clear_error(string text, string code) => Assert.Equal([code], ValleyWorld.BindCodes(text, TestScripts.Bind(Script)));

    private static Evaluation Evaluate(string conditions)
    {
        Protocol protocol = TestScripts.Bind(Script);
        return TestScripts.Evaluate(protocol, ValleyWorld.Of(conditions, protocol));
    }

    private static double Fidelity(Evaluation e, string label) => e.Checkpoints.Single(c => c.Label == label).Fidelity.Value;
}
