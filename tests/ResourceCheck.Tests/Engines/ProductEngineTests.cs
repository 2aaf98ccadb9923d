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

    /// <summary>Sums that list no strings, at a size at which strings can be listed.</summary>
    [Theory]
    [InlineData("stranger-numbering", false)]
    [InlineData("stranger-numbering", true)]
    [InlineData("leader-draw", false)]
    [InlineData("leader-draw", true)]
    [InlineData("secret-sharing", false)]
    [InlineData("secret-sharing-announced", false)]
    [InlineData("secret-sharing-intercepted", false)]
    [InlineData("removal", false)]
    [InlineData("removal", true)]
    public void Sums_without_strings_agree(string name, bool lossy)
    {
        Protocol protocol = LibraryFiles.Bind(name).Protocol;
        World world = RandomWorld.Of(name.Length, protocol.Parties.Count, protocol.Levels, lossy);
        EngineComparison.AssertEqual(Dense(protocol, world), Product(protocol, world, listed: false));
    }

    private const string Conditions = """
        protocol "conditions"
        parties P[1..4]
        resource antisymmetric on all
        round "r"
          P[1], P[2] pick b from level, fourier
          P[1], P[2] measure b as v
          P[3], P[4] measure fourier as v
          all announce v
          keep when not (P[1].v = P[2].v and P[3].v = 0)
        end
        success when distinct(v of P[1..3]) or P[4].v = none
        report "same" = probability(same(v of P[1..4]))
        report "few" = probability(count(v = 0 over all) + count(v = 1 over all) <= 2 given P[1].b = level)
        report "if" = probability(if P[1].v = 0 then distinct(v of P[2..4]) else P[2].v = 1)
        report "not" = probability(not distinct(v of all) and P[1].v != 2)
        report "all but one" = guess(P[1].v from v of P[2..3], P[1].b)
        report "mean" = mean(P[1].v + P[2].v given P[3].v > 0)
        report "bits" = information(P[1].v, P[1].b; P[2].v)
        """;

    [Property(MaxTest = 12)]
    public bool Conditions_of_every_form_agree_without_strings(int seed)
    {
        Protocol protocol = TestScripts.Bind(Conditions);
        World world = RandomWorld.Of(seed, 4, 4, seed % 2 == 0);
        Evaluation dense = Dense(protocol, world);
        EngineComparison.AssertEqual(dense, Product(protocol, world, listed: false));
        EngineComparison.AssertEqual(dense, Product(protocol, world, listed: true));
        return true;
    }

    private static Evaluation Dense(Protocol protocol, World world) => TestScripts.Evaluate(protocol, world, [.. protocol.Inputs.Select(i => i.Values[^1])]);

    private static Evaluation Product(Protocol protocol, World world, bool listed)
    {
        Plan plan = Planner.Lay(protocol, world);
        return ProductEngine.Evaluate(plan, [.. protocol.Inputs.Select(i => i.Values[^1])], ProductEngine.Estimate(plan, NoMatrices, "test"), NoMatrices, listed, null, default);
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
