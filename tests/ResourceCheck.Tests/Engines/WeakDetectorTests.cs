using ResourceCheck.Conditions;
using ResourceCheck.Engines;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Engines;

/// <summary>Without dark counts the efficiency only thins copies out: what the kept ones show does not depend on it, however small it is.</summary>
public sealed class WeakDetectorTests
{
    private const string Script = """
        protocol "p"
        parties P[1..4]
        resource antisymmetric on all
        round "r"
          all pick b from level, fourier
          all measure b as v
          all announce b
        end
        keep when same(b of all)
        success when distinct(v of all)
        report "first sees 0" = probability(P[1].v = 0)
        """;

    [Theory]
    [InlineData(0.5)]
    [InlineData(1e-2)]
    [InlineData(1e-4)]
    [InlineData(1e-9)]
    public void Efficiency_thins_out_copies_and_changes_nothing_else(double efficiency)
    {
        Evaluation perfect = Evaluate(1), weak = Evaluate(efficiency);
        Assert.Equal(perfect.Success.Value, weak.Success.Value, 1e-12);
        Assert.Equal(perfect.Reports[0].Value, weak.Reports[0].Value, 1e-12);
        Assert.Equal(1, weak.Seen / Math.Pow(efficiency, 4), 1e-12);
        Assert.Equal(perfect.Kept, weak.Kept, 1e-12);
    }

    private static Evaluation Evaluate(double efficiency)
    {
        PartyWorld party = PartyWorld.Ideal(4) with
        {
            Flight = FlightModel.Ideal(4) with { Depolarising = 0.1 },
            Detection = DetectionModel.Ideal(4) with { Efficiency = efficiency },
        };
        return TestScripts.Evaluate(TestScripts.Bind(Script), World.Ideal(4, 4) with { Parties = [party, party, party, party] });
    }

    /// <summary>With certain loss on a heralded flight nothing is kept, and that is said instead of a figure.</summary>
    [Fact]
    public void Nothing_kept_is_no_figure()
    {
        PartyWorld lost = PartyWorld.Ideal(3) with { Flight = FlightModel.Ideal(3) with { Transmission = [0, 0, 0], Heralded = true, Time = Duration.Zero } };
        Protocol protocol = TestScripts.Bind("protocol \"p\"\nparties P[1..3]\nresource antisymmetric on all\nround \"r\"\nP[3] measures level as k\nend\ncheckpoint \"end\": fidelity with antisymmetric on P[1], P[2]\nsuccess when true\nclaim \"end\" = 1\n");
        Evaluation e = TestScripts.Evaluate(protocol, World.Ideal(3, 3) with { Parties = [lost, lost, lost] });
        Assert.Equal(0, e.Heralded);
        Assert.False(e.Yield > 0);
    }
}
