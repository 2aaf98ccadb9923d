using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using ResourceCheck.Timeline;
using Xunit;

namespace ResourceCheck.Tests;

/// <summary>Short ways from script text to protocols and evaluations; findings fail the test with their text.</summary>
internal static class TestScripts
{
    public static Protocol Bind(string script, params (string Name, int Value)[] parameters)
    {
        (ScriptTree tree, IReadOnlyList<Diagnostic> findings) = Script.Parse(new SourceText("test.protocol", script));
        Assert.True(findings.Count == 0, string.Join("\n\n", findings) + "\n" + script);
        Outcome<Protocol> bound = Script.Bind(tree, parameters.ToDictionary(p => p.Name, p => (Rational)p.Value));
        Assert.True(bound.Succeeded, string.Join("\n\n", bound.Findings) + "\n" + script);
        return bound.Value!;
    }

    public static Evaluation Evaluate(Protocol protocol, World world, params Value[] inputs)
    {
        Plan plan = Planner.Lay(protocol, world);
        PreparedState state = Resource.Prepare(world.Resource, protocol.Levels).Value!;
        return DenseEngine.Evaluate(plan, state, inputs, DenseEngine.Estimate(plan, "test"), new Dictionary<string, Complex[,]>(), default);
    }

    public static Evaluation EvaluateIdeal(Protocol protocol, params Value[] inputs) =>
        Evaluate(protocol, World.Ideal(protocol.Parties.Count, protocol.Levels), inputs);
}
