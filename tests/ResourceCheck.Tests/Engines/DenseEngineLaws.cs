using System.Numerics;
using FsCheck.Xunit;
using ResourceCheck.Conditions;
using ResourceCheck.Engines;
using ResourceCheck.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Engines;

/// <summary>Laws that hold under every noise.</summary>
public sealed class DenseEngineLaws
{
    private const string Removal = """
        protocol "removal"
        parties P[1..3]
        resource antisymmetric on all
        round "leave"
          P[3] measures fourier as k
          P[3] announces k
          P[1], P[2] apply complement(fourier, k)
        end
        checkpoint "end": fidelity with antisymmetric on P[1], P[2]
        round "use"
          P[1], P[2] pick b from level, fourier
          P[1], P[2] measure b as v
          P[1], P[2] announce b
        end
        success when P[1].v != P[2].v and P[1].v != none and P[2].v != none and P[3].k != none
        report "every outcome" = probability(true)
        report "one of four" = probability(P[1].b = level)
        """;

    [Property(MaxTest = 40)]
    public bool Probabilities_of_all_histories_add_up_to_one(int seed)
    {
        Protocol protocol = TestScripts.Bind(Removal);
        Evaluation e = TestScripts.Evaluate(protocol, RandomWorld.Of(seed, 3, 3, true));
        double branches = e.Checkpoints[^1].Branches.Sum(b => b.Probability);
        return Near(e.Success.Value + e.Failure.Value, 1) && Near(branches, 1) && Near(e.Reports[0].Value, 1) && Near(e.Reports[1].Value, 0.5) && Near(e.Seen, 1) && Near(e.Kept, 1);
    }

    [Property(MaxTest = 40)]
    public bool Fidelities_are_probabilities_and_average_over_branches(int seed)
    {
        Evaluation e = TestScripts.Evaluate(TestScripts.Bind(Removal), RandomWorld.Of(seed, 3, 3, true));
        return e.Checkpoints.All(c => c.Fidelity.Value is >= -1e-12 and <= 1 + 1e-12 && Near(c.Branches.Sum(b => b.Probability * b.Fidelity!.Value), c.Fidelity.Value));
    }

    /// <summary>Renaming the parties renames nothing but the parties: the resource is antisymmetric, all noise local.</summary>
    [Property(MaxTest = 30)]
    public bool Relabelling_parties_changes_no_figure(int seed)
    {
        const string script = "protocol \"p\"\nparties {0}\nresource antisymmetric on all\nround \"r\"\nall measure fourier as v\nend\nsuccess when distinct(v of all)\nreport \"x\" = guess(Ada.v from Ben.v)\n";
        World world = RandomWorld.Of(seed, 3, 3, false);
        World turned = world with { Parties = [world.Parties[2], world.Parties[0], world.Parties[1]] };
        Evaluation a = TestScripts.Evaluate(TestScripts.Bind(script.Replace("{0}", "Ada, Ben, Cyd", StringComparison.Ordinal)), world);
        Evaluation b = TestScripts.Evaluate(TestScripts.Bind(script.Replace("{0}", "Cyd, Ada, Ben", StringComparison.Ordinal)), turned);
        return Near(a.Success.Value, b.Success.Value) && Near(a.Reports[0].Value, b.Reports[0].Value) && a.Checkpoints.Zip(b.Checkpoints, (x, y) => Near(x.Fidelity.Value, y.Fidelity.Value)).All(x => x);
    }

    /// <summary>A⊗…⊗A|S_N⟩ = det(A)|S_N⟩, for contractions as amplitudes of transmission and for unitaries as common frames.</summary>
    [Property(MaxTest = 30)]
    public bool Common_local_matrix_leaves_the_resource_and_costs_the_squared_determinant(int seed)
    {
        Random random = new(seed);
        Complex[,] frame = RandomWorld.Unitary(random, 3);
        double[] t = [random.NextDouble(), random.NextDouble(), random.NextDouble()];
        PartyWorld party = PartyWorld.Ideal(3) with { Flight = FlightModel.Ideal(3) with { Rotation = frame, Transmission = t, Heralded = true } };
        World world = World.Ideal(3, 3) with { Parties = [party, party, party] };
        const string script = "protocol \"p\"\nparties P[1..3]\nresource antisymmetric on all\ncheckpoint \"end\": fidelity with antisymmetric on all\nsuccess when true\n";
        Evaluation e = TestScripts.Evaluate(TestScripts.Bind(script), world);
        return Near(e.Checkpoints[^1].Fidelity.Value, 1) && Near(e.Yield, t[0] * t[1] * t[2]);
    }

    [Property(MaxTest = 30)]
    public bool Depolarising_never_raises_the_fidelity_of_the_ideal_resource(int seed)
    {
        Random random = new(seed);
        double[] p = [random.NextDouble(), random.NextDouble(), random.NextDouble()];
        double Fidelity(double[] strengths) => TestScripts.Evaluate(
            TestScripts.Bind(Removal),
            World.Ideal(3, 3) with { Parties = [.. strengths.Select(x => PartyWorld.Ideal(3) with { Flight = FlightModel.Ideal(3) with { Depolarising = x } })] }).Checkpoints[^1].Fidelity.Value;
        double before = Fidelity(p);
        p[random.Next(3)] += 0.01;
        return Fidelity([.. p.Select(x => Math.Min(x, 1))]) <= before + 1e-12;
    }

    /// <summary>Amplitude damping of level 0 at equal rates: F = exp(-Γt), whatever the branching.</summary>
    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    public void Decay_of_level_0_leaves_the_exponential(int n)
    {
        LocalDynamics dynamics = LocalDynamics.Still(n);
        for (int b = 1; b < n; b++)
            dynamics.Jumps[0, b] = 0.3 * b / (n * (n - 1) / 2.0);
        PartyWorld party = PartyWorld.Ideal(n) with { Flight = FlightModel.Ideal(n) with { Dynamics = dynamics, Time = Duration.FromSeconds(1) } };
        World world = World.Ideal(n, n) with { Parties = [.. Enumerable.Repeat(party, n)] };
        Evaluation e = TestScripts.Evaluate(TestScripts.Bind($"protocol \"p\"\nparties P[1..{n}]\nresource antisymmetric on all\nsuccess when true\n"), world);
        Assert.Equal(Math.Exp(-0.3), e.Checkpoints.Single(c => c.Label == "arrived").Fidelity.Value, 1e-10);
    }

    [Property(MaxTest = 20)]
    public bool Powers_of_a_unitary_multiply(int seed)
    {
        Complex[,] u = RandomWorld.Unitary(new Random(seed), 4);
        Complex[,] product = MatrixMath.Multiply(UnitaryPower.Of(u, 0.3), UnitaryPower.Of(u, 0.7));
        return product.Cast<Complex>().Zip(u.Cast<Complex>(), (a, b) => (a - b).Magnitude).Max() < 1e-10;
    }

    private static bool Near(double a, double b) => Math.Abs(a - b) < 1e-10;
}
