using System.Numerics;
using FsCheck.Xunit;
using ResourceCheck.Conditions;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Engines.Product;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;
using Xunit;

namespace ResourceCheck.Tests.Engines;

/// <summary>The product engine against the dense one, on the library's protocols and on scripts that make it list, sum and split.</summary>
public sealed class ProductEngineTests
{
    private static readonly Dictionary<string, Complex[,]> NoMatrices = [];

    private const string Adaptive = """
        protocol "adaptive"
        parties P[1..4]
        outsider Eve
        resource antisymmetric on all
        round "leave"
          Eve intercepts P[1] in fourier as g
          P[4] measures fourier as k
          P[4] announces k
          P[1], P[2], P[3] apply complement(fourier, k)
          P[3] aborts when P[4].k = 2
        end
        checkpoint "left": fidelity with antisymmetric on P[1..3]
        round "choose"
          P[3] picks b from level, fourier on 3
          P[3] measures b as v
          P[3] announces v
          when P[3].v = 1
            P[1], P[2] apply shift(1)
          end
          P[1], P[2] measure level as v
          P[1] sets w to if v = none then 0 else v + 1
          P[1], P[2] announce v
          keep when P[1].v != P[2].v or P[3].v = 0
        end
        success when distinct(v of P[1..3]) and P[1].w > 0
        report "mean" = mean(P[1].w given P[3].b = level)
        report "guess" = guess(P[1].v from P[2].v, Eve.g)
        report "information" = information(P[1].v, P[3].b; P[2].v)
        report "none" = probability(P[1].v = none or P[2].v = none)
        report "pair" = bellvalue(P[1], P[2])
        """;

    [Property(MaxTest = 12)]
    public bool Adaptive_scripts_agree_under_every_local_noise(int seed)
    {
        Protocol protocol = TestScripts.Bind(Adaptive);
        return Agree(protocol, RandomWorld.Of(seed, 5, 4, seed % 2 == 0));
    }

    /// <summary>Every protocol of the library on single copies and on lists, under its own conditions.</summary>
    [Theory]
    [MemberData(nameof(Library))]
    public void Library_protocols_agree_under_their_conditions(string name)
    {
        (Protocol protocol, World world) = LibraryFiles.Bind(name);
        Assert.True(Agree(protocol, world with { Resource = new ResourceModel(new IdealPreparation(), 0.03), Storage = null }));
    }

    /// <summary>The same under noise of every kind that differs from party to party.</summary>
    [Theory]
    [MemberData(nameof(Library))]
    public void Library_protocols_agree_under_noise_of_every_party_s_own(string name)
    {
        Protocol protocol = LibraryFiles.Bind(name).Protocol;
        foreach (bool lossy in new[] { false, true })
            Assert.True(Agree(protocol, RandomWorld.Of(name.Length, protocol.Parties.Count, protocol.Levels, lossy)));
    }

    public static TheoryData<string> Library => [.. LibraryFiles.Names];

    private static bool Agree(Protocol protocol, World world)
    {
        Plan plan = Planner.Lay(protocol, world);
        Value[] inputs = [.. protocol.Inputs.Select(i => i.Values[^1])];
        PreparedState state = Resource.Prepare(world.Resource, protocol.Levels).Value!;
        Evaluation dense = DenseEngine.Evaluate(plan, state, inputs, DenseEngine.Estimate(plan, "test"), NoMatrices, default);
        Assert.Null(ProductEngine.Refusal(plan, NoMatrices));
        Evaluation listed = ProductEngine.Evaluate(plan, inputs, ProductEngine.Estimate(plan, NoMatrices, "test"), NoMatrices, default);
        EngineComparison.AssertEqual(dense, listed);
        return true;
    }
}
