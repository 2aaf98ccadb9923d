using System.Numerics;
using ResourceCheck.Conditions;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary><c>resource.levels</c> [2, 0, 1]: value 0 is played by physical level 2, value 1 by 0, value 2 by 1.</summary>
public sealed class LevelOrderTests
{
    private const string Order = "\"resource\": { \"levels\": [2, 0, 1] }";

    [Fact]
    public void Noise_of_physical_levels_is_told_in_values_of_the_script()
    {
        PartyWorld ada = ValleyWorld.Of($$"""
            { {{Order}},
              "levels": { "decay": [ { "from": 0, "to": 2, "rate": "7 /s" } ], "coherence": "10 ms" },
              "flight": { "transmission": [1, 0.8, 0.5], "leakage": [ { "from": 2, "probability": 0.1 }, { "from": 1, "rate": "3 /s" } ] },
              "detection": { "confusion": [[0.9, 0.1, 0], [0, 1, 0], [0, 0, 1]] } }
            """).Parties[0];
        Assert.Equal(7, ada.Flight.Dynamics.Jumps[1, 0]);
        Assert.Equal((96.5, 96.5, 0.0), (ada.Flight.Dynamics.Dephasing[1, 0], ada.Flight.Dynamics.Dephasing[1, 2], ada.Flight.Dynamics.Dephasing[0, 2]));
        Assert.Equal([0.5, 1, 0.8], ada.Flight.Transmission);
        Assert.Equal([0.1, 0, 0], ada.Flight.LeakageProbability);
        Assert.Equal([0, 0, 3.0], ada.Flight.Dynamics.Leakage);
        Assert.Equal(0.1, ada.Detection.Confusion[0, 1]);
    }

    [Fact]
    public void Phase_noise_counts_physical_steps()
    {
        FlightModel flight = ValleyWorld.Of($$"""{ {{Order}}, "flight": { "phaseNoise": "0.3 rad" } }""").Parties[0].Flight;
        Assert.Equal(0.3, flight.PhaseNoise);
        Assert.Equal(Math.Exp(-0.18), flight.PhaseFactors![0, 1], 1e-15);
        Assert.Equal(Math.Exp(-0.045), flight.PhaseFactors[1, 2], 1e-15);
        Assert.Equal(Math.Exp(-0.045), flight.PhaseFactors[0, 2], 1e-15);
        Assert.Equal(1, flight.PhaseFactors[2, 2]);
    }

    [Fact]
    public void Rotations_turn_physical_levels()
    {
        Complex[,] u = ValleyWorld.Of($$"""{ {{Order}}, "flight": { "rotation": { "levels": [0, 2], "angle": "30 deg" } } }""").Parties[0].Flight.Rotation!;
        // physical 0 goes to cos 0 + sin 2: value 1 to cos 1 + sin 0
        Assert.Equal(Math.Sqrt(3) / 2, u[1, 1].Real, 1e-15);
        Assert.Equal(0.5, u[0, 1].Real, 1e-15);
        Assert.Equal(-0.5, u[1, 0].Real, 1e-15);
        Assert.Equal(1, u[2, 2].Real);
    }

    [Fact]
    public void The_order_is_handed_to_the_preparation() =>
        Assert.Equal([2, 0, 1], ValleyWorld.Of($"{{ {Order} }}").Resource.PhysicalLevels!);
}
