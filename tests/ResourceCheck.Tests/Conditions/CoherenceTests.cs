using ResourceCheck.Conditions;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary>Pure dephasing that follows from coherence times; T2 ≤ 2 T1 as in Nielsen and Chuang, ch. 8.</summary>
public sealed class CoherenceTests
{
    private static readonly Protocol Three = TestProtocol.Of(["Ada", "Ben", "Cyd"]);

    [Theory]
    [InlineData("100 us", 0)]
    [InlineData("80 us", 12500 - 10000)]
    [InlineData("50 us", 20000 - 10000)]
    public void Dephasing_is_what_decay_leaves_of_the_coherence_time(string coherence, double expected)
    {
        // Γ_0 = 2/(100 us), so that T2 may be at most 100 us
        double[,] phi = ValleyWorld.Of(Decaying($"\"coherence\": \"{coherence}\"")).Parties[0].Flight.Dynamics.Dephasing;
        Assert.Equal(expected, phi[0, 1], 1e-8);
        Assert.Equal(expected, phi[2, 0], 1e-8);
        Assert.Equal(0, phi[1, 2]);
    }

    [Fact]
    public void Coherence_above_what_decay_allows_is_refused() =>
        Assert.Equal(["C055"], ValleyWorld.BindCodes(Decaying("\"coherence\": \"100.1 us\""), Three));

    [Fact]
    public void A_pair_loses_half_of_both_outflows()
    {
        double[,] phi = ValleyWorld.Of("""
            { "levels": { "decay": [ { "from": 0, "to": 1, "rate": "100 /s" }, { "from": 1, "to": 2, "rate": "60 /s" } ],
                          "coherence": { "0-1": "10 ms", "0-2": "10 ms", "2-1": "10 ms" } } }
            """).Parties[0].Flight.Dynamics.Dephasing;
        Assert.Equal(100 - 80, phi[0, 1], 1e-12);
        Assert.Equal(100 - 50, phi[0, 2], 1e-12);
        Assert.Equal(100 - 30, phi[1, 2], 1e-12);
    }

    [Fact]
    public void Coherence_and_dephasing_may_share_out_the_pairs()
    {
        double[,] phi = ValleyWorld.Of("""{ "levels": { "coherence": "10 ms", "dephasingTime": { "1-2": "20 ms" } } }""").Parties[0].Flight.Dynamics.Dephasing;
        Assert.Equal((100.0, 100.0, 50.0), (phi[0, 1], phi[0, 2], phi[2, 1]));
    }

    // squares of distances between points are conditionally negative definite (Schoenberg, Trans. Am. Math. Soc. 44, 522 (1938)):
    // 1, 1, 4 lie on a line; above 4 no points do
    [Theory]
    [InlineData("0.25 s", true)]
    [InlineData("0.24 s", false)]
    public void Rates_per_pair_pass_exactly_when_they_are_squared_distances(string outer, bool passes)
    {
        string text = $$"""{ "waiting": { "dephasingTime": { "0-1": "1 s", "1-2": "1 s", "0-2": "{{outer}}" } } }""";
        Assert.Equal(passes ? [] : ["C056"], ValleyWorld.BindCodes(text, Three));
    }

    [Fact]
    public void Thermal_exchange_and_leakage_count_as_outflow()
    {
        const string text = """{ "waiting": { "thermal": { "levels": [0, 1], "rate": "50 /s", "ratio": 0.5 }, "leakage": { "from": 0, "rate": "30 /s" }, "coherence": "10 ms" } }""";
        Assert.Equal(100 - 40, ValleyWorld.Of(text).Parties[0].Waiting.Dynamics.Dephasing[0, 2], 1e-12);
    }

    private static string Decaying(string coherence) =>
        $$"""{ "levels": { "decay": [ { "from": 0, "to": 1, "lifetime": "100 us" }, { "from": 0, "to": 2, "lifetime": "100 us" } ], {{coherence}} } }""";
}
