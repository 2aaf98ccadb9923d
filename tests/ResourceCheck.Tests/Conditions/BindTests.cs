using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

public sealed class BindTests
{
    private const string Winter = """
        {
          "about": "Valleys under snow",
          "resource": { "white": 0.02 },
          "levels": {
            "decay": [ { "from": 0, "to": 1, "lifetime": "100 us" }, { "from": 0, "to": 2, "linewidth": "1 kHz" } ],
            "dephasingTime": "400 us"
          },
          "flight": {
            "default": { "length": "2.5 km", "speed": "2e8 m/s", "attenuation": "0.2 dB/km", "insertionLoss": "1 dB", "heralded": true,
                         "depolarising": 0.01, "dephasing": 0.02 },
            "Dov": { "length": "6 km", "heralded": false }
          },
          "waiting": { "coherence": "5 ms", "depolarisingRate": "20 /s" },
          "operations": { "duration": "2 us", "depolarising": 0.003, "overRotation": -0.01 },
          "detection": { "duration": "5 us", "efficiency": 0.92, "confusion": 0.03, "dark": 1e-5 },
          "messages": { "speed": "2e8 m/s", "processing": "1 us", "distances": { "Ben-Dov": "3 km" } },
          "preparation": { "attempts": "10 kHz", "success": 0.2 }
        }
        """;

    private static readonly Protocol Valleys = TestProtocol.Of(["Ada", "Ben", "Cyd", "Dov"], ["Eve"]);

    [Fact]
    public void Flight_numbers_are_those_computed_by_hand()
    {
        World world = ValleyWorld.Of(Winter, Valleys);
        FlightModel ada = world.Parties[0].Flight, dov = world.Parties[3].Flight;
        Assert.Equal(12.5e-6, ada.Time.Seconds, 1e-18);
        Assert.Equal(30e-6, dov.Time.Seconds, 1e-18);
        // 0.2 dB/km over 2.5 km and 1 dB: 1.5 dB; over 6 km: 2.2 dB
        Assert.All(ada.Transmission, eta => Assert.Equal(Math.Pow(10, -0.15), eta, 1e-15));
        Assert.All(dov.Transmission, eta => Assert.Equal(Math.Pow(10, -0.22), eta, 1e-15));
        Assert.Equal((0.01, 0.02, true), (ada.Depolarising, ada.Dephasing, ada.Heralded));
        Assert.Equal((0.01, 0.02, false), (dov.Depolarising, dov.Dephasing, dov.Heralded));
    }

    [Fact]
    public void Levels_decay_in_flight_and_waiting_replaces_them()
    {
        PartyWorld ada = ValleyWorld.Of(Winter, Valleys).Parties[0];
        Assert.Equal(1e4, ada.Flight.Dynamics.Jumps[0, 1], 1e-9);
        Assert.Equal(2 * Math.PI * 1000, ada.Flight.Dynamics.Jumps[0, 2], 1e-9);
        Assert.Equal(2500, ada.Flight.Dynamics.Dephasing[2, 3], 1e-9);
        Assert.Equal(0, ada.Waiting.Dynamics.Jumps[0, 1]);
        Assert.Equal(200, ada.Waiting.Dynamics.Dephasing[0, 3], 1e-9);
        Assert.Equal(0, ada.Waiting.Dynamics.Dephasing[1, 2]);
        Assert.Equal(20, ada.Waiting.Dynamics.DepolarisingRate);
    }

    [Fact]
    public void Messages_go_by_way_of_the_source_unless_a_distance_is_given()
    {
        MessageModel messages = ValleyWorld.Of(Winter, Valleys).Messages;
        Assert.Equal(8500, messages.Distance[0, 3]);
        Assert.Equal(43.5e-6, messages.Delay[0, 3], 1e-18);
        Assert.Equal(3000, messages.Distance[3, 1]);
        Assert.Equal(16e-6, messages.Delay[1, 3], 1e-18);
        Assert.Equal(0, messages.Delay[2, 2]);
        Assert.All(Enumerable.Range(0, 5), p => Assert.Equal((0.0, 0.0), (messages.Delay[4, p], messages.Delay[p, 4])));
    }

    [Fact]
    public void Everything_else_arrives_as_written()
    {
        World world = ValleyWorld.Of(Winter, Valleys);
        Assert.Equal("Valleys under snow", world.About);
        Assert.Equal((0.02, typeof(IdealPreparation)), (world.Resource.White, world.Resource.Preparation.GetType()));
        Assert.Equal((1e4, 0.2), (world.Preparation!.Attempts.PerSecond, world.Preparation.Success.Value));
        Assert.Equal(new OperationModel(ResourceCheck.Quantities.Duration.FromSeconds(2e-6), 0.003, -0.01), world.Parties[2].Operations);
        DetectionModel detection = world.Parties[2].Detection;
        Assert.Equal((5e-6, 0.92, 1e-5), (detection.Time.Seconds, detection.Efficiency, detection.Dark));
        Assert.Equal(0.97, detection.Confusion[1, 1], 1e-15);
        Assert.Equal(0.01, detection.Confusion[1, 2], 1e-15);
    }

    [Fact]
    public void Outsiders_are_left_alone()
    {
        PartyWorld eve = ValleyWorld.Of(Winter, Valleys).Parties[4];
        Assert.Equal((0.0, true, 1.0, false), (eve.Flight.Time.Seconds, eve.Flight.Dynamics.IsStill, eve.Detection.Efficiency, eve.Flight.Heralded));
    }

    [Fact]
    public void An_empty_file_is_the_ideal_world()
    {
        World world = ValleyWorld.Of("{}", Valleys);
        Assert.All(world.Parties, p => Assert.True(p.Flight.Dynamics.IsStill && p.Waiting.Dynamics.IsStill && p.Interface is null && p.Flight.Transmission.All(t => t == 1)));
        Assert.Equal((0.0, null), (world.Messages.Delay[0, 1], world.Preparation));
        Assert.Null(world.Resource.PhysicalLevels);
    }

    [Fact]
    public void Waiting_is_ideal_when_empty_and_the_levels_when_absent()
    {
        const string levels = "\"levels\": { \"decay\": [ { \"from\": 0, \"to\": 1, \"rate\": \"5 /s\" } ] }";
        Assert.Equal(5, ValleyWorld.Of($"{{ {levels} }}").Parties[0].Waiting.Dynamics.Jumps[0, 1]);
        Assert.True(ValleyWorld.Of($"{{ {levels}, \"waiting\": {{}} }}").Parties[0].Waiting.Dynamics.IsStill);
        World mixed = ValleyWorld.Of($"{{ {levels}, \"waiting\": {{ \"Ben\": {{ \"depolarisingRate\": \"7 /s\" }} }} }}");
        Assert.Equal((5.0, 0.0), (mixed.Parties[0].Waiting.Dynamics.Jumps[0, 1], mixed.Parties[0].Waiting.Dynamics.DepolarisingRate));
        Assert.Equal((0.0, 7.0), (mixed.Parties[1].Waiting.Dynamics.Jumps[0, 1], mixed.Parties[1].Waiting.Dynamics.DepolarisingRate));
    }

    [Fact]
    public void An_interface_stops_the_levels_in_flight_but_not_what_the_flight_adds()
    {
        PartyWorld ada = ValleyWorld.Of("""
            { "levels": { "decay": [ { "from": 0, "to": 1, "rate": "5 /s" } ] },
              "flight": { "interface": { "efficiency": 0.9 }, "thermal": { "levels": [0, 2], "rate": "4 /s", "ratio": 0.25 },
                          "leakage": [ { "from": 1, "rate": "3 /s" }, { "from": 2, "probability": 0.1 }, { "from": 2, "probability": 0.2 } ] } }
            """).Parties[0];
        Assert.Equal(new InterfaceModel(0.9, 0), ada.Interface);
        Assert.Equal((0.0, 4.0, 1.0), (ada.Flight.Dynamics.Jumps[0, 1], ada.Flight.Dynamics.Jumps[0, 2], ada.Flight.Dynamics.Jumps[2, 0]));
        Assert.Equal([0, 3.0, 0], ada.Flight.Dynamics.Leakage);
        Assert.Equal(0.28, ada.Flight.LeakageProbability[2], 1e-15);
        Assert.Equal(5, ada.Waiting.Dynamics.Jumps[0, 1]);
    }

    [Fact]
    public void Branching_shares_out_the_rate_of_the_level()
    {
        double[,] jumps = ValleyWorld.Of("""{ "levels": { "decay": [ { "from": 0, "lifetime": "50 us", "branching": { "1": 0.6, "2": 0.4 } } ] } }""").Parties[0].Flight.Dynamics.Jumps;
        Assert.Equal(12000, jumps[0, 1], 1e-9);
        Assert.Equal(8000, jumps[0, 2], 1e-9);
    }

    [Fact]
    public void A_party_inherits_key_by_key_and_drops_what_it_says_in_another_way()
    {
        World world = ValleyWorld.Of("""
            { "flight": { "default": { "length": "1 km", "speed": "2e8 m/s", "interface": { "efficiency": 0.5, "depolarising": 0.1 }, "rotation": { "generator": "clock", "angle": 0.1 } },
                          "P[1..2]": { "time": "9 us", "interface": { "efficiency": 0.6 } },
                          "P[2]": { "rotation": { "levels": [0, 1] } } },
              "levels": { "default": { "coherence": "1 ms" }, "P[2]": { "dephasingTime": "1 ms" } } }
            """, TestProtocol.Of(["Dov", "P[1]", "P[2]"]));
        Assert.Equal([5e-6, 9e-6, 9e-6], world.Parties.Select(p => p.Flight.Time.Seconds));
        Assert.Equal([1000.0, 1000, 1000], world.Parties.Select(p => p.Flight.Length.Metres));
        Assert.Equal(new InterfaceModel(0.6, 0.1), world.Parties[2].Interface);
        Assert.Equal(Math.Cos(0.1), world.Parties[2].Flight.Rotation![0, 0].Real, 1e-15);
        Assert.Equal(Complex.FromPolarCoordinates(1, -0.2), world.Parties[1].Flight.Rotation![2, 2]);
        Assert.Equal(0, world.Parties[1].Waiting.Dynamics.Dephasing[1, 2]);
        Assert.Equal(1000, world.Parties[2].Waiting.Dynamics.Dephasing[1, 2], 1e-9);
    }

    [Fact]
    public void Parties_without_a_qudit_have_a_place_and_may_be_named()
    {
        World world = ValleyWorld.Of("""{ "flight": { "Ref": { "length": "2 km", "time": "1 us" } }, "messages": { "processing": "3 us" } }""", TestProtocol.Of(["Ada", "Ben"], null, ["Ref"]));
        Assert.Equal(2000, world.Messages.Distance[0, 2]);
        Assert.Equal(3e-6, world.Messages.Delay[0, 2]);
    }

    [Fact]
    public void Exchange_errors_go_to_the_last_step_or_to_each()
    {
        ExchangePreparation last = (ExchangePreparation)ValleyWorld.Of("""{ "resource": { "exchange": { "timeError": 0.05, "phaseError": "0.1 rad", "couplings": { "1-3": 0 } } } }""").Resource.Preparation;
        Assert.Equal([0, 0.05], last.Steps.Select(s => s.TimeError));
        Assert.Equal([0, 0.1], last.Steps.Select(s => s.PhaseError));
        Assert.Equal(new double[,] { { 0, 1 }, { 1, 0 } }, last.Steps[0].Couplings);
        Assert.Equal(new double[,] { { 0, 1, 0 }, { 1, 0, 1 }, { 0, 1, 0 } }, last.Steps[1].Couplings);
        ExchangePreparation each = (ExchangePreparation)ValleyWorld.Of("""{ "resource": { "exchange": { "steps": [ { "timeError": 0.2 }, {} ] } } }""").Resource.Preparation;
        Assert.Equal([0.2, 0], each.Steps.Select(s => s.TimeError));
    }

    [Fact]
    public void A_prepared_state_is_looked_for_beside_the_conditions()
    {
        World world = ValleyWorld.Of("""{ "resource": { "file": "data/s3.npy", "mend": true } }""", Valleys, Path.Combine("valley", "winter.conditions.json"));
        Assert.Equal(new FilePreparation(Path.Combine("valley", "data/s3.npy"), true), world.Resource.Preparation);
    }

    [Fact]
    public void Members_above_the_last_are_noted_and_do_not_stop() =>
        Assert.Equal(["C052"], ValleyWorld.BindCodes("""{ "flight": { "P[9]": { "dephasing": 0.1 } } }""", TestProtocol.Of(["P[1]", "P[2]"])));
}
