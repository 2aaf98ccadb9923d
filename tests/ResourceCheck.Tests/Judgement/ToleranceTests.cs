using System.Globalization;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>Values at which a goal is just met.</summary>
public sealed class ToleranceTests
{
    private const string Pair = "protocol \"p\"\nparties A, B\nresource antisymmetric on all\nround \"r\"\n  A measures level as a\nend\nsuccess when true\n";

    /// <summary>Total decay Γt at a rate of 1/s in equal branches: level basis -ln F, Fourier basis a root of the dense reference (tests/reference/tolerance.py).</summary>
    [Fact]
    public void Tolerated_decay_of_removal_is_that_of_the_reference_in_both_bases()
    {
        foreach (TableRow row in TableRow.Of("tolerance"))
        {
            ToleranceResult found = Find(Removal(row.N, row.Name.Split('-')[1]), Decay(row.N), "flight.time", "0 s..1.5 s", $"\"after\" >= {row.Parameters["goal"]}");
            Crossing crossing = Assert.Single(found.Crossings);
            Assert.Equal(row.Value, crossing.Value, 1e-9);
            Assert.True(crossing.MetBelow);
            Assert.Equal(row.Number("goal", 0), crossing.Figure.Value, 1e-12);
        }
    }

    /// <summary>A fixed rotation by x of one qudit of a pair turns its fidelity into cos²x: at least 1/2 up to π/4 and again from 3π/4 on.</summary>
    [Fact]
    public void A_curve_that_is_not_monotonic_shows_every_crossing()
    {
        ToleranceResult found = Find(Pair, """{ "flight": { "A": { "rotation": { "levels": [0, 1], "angle": "0 rad" } } } }""", "flight.A.rotation.angle", "0 rad..3 rad", "\"arrived\" >= 0.5");
        Assert.Equal([Math.PI / 4, 3 * Math.PI / 4], found.Crossings.Select(c => c.Value), (a, b) => Math.Abs(a - b) < 1e-10);
        Assert.Equal([true, false], found.Crossings.Select(c => c.MetBelow));
        Assert.Equal((true, true), found.MetAt);
    }

    [Fact]
    public void A_length_comes_with_its_time_of_flight()
    {
        ToleranceResult found = Find(
            Pair, """{ "levels": { "decay": [ { "from": 0, "to": 1, "lifetime": "1 ms" } ] }, "flight": { "length": "1 km", "speed": "2e8 m/s" } }""",
            "flight.length", "0 km..100 km", "\"arrived\" >= 0.9");
        Crossing crossing = Assert.Single(found.Crossings);
        Assert.Equal(-Math.Log(0.9) * 1e-3 * 2e8 / 1000, crossing.Value, 1e-8); // one of two qudits is excited
        Assert.Equal((crossing.Value * 1000, crossing.Value * 1000 / 2e8), crossing.Flight!.Value, (a, b) => Math.Abs(a.Item1 - b.Item1) < 1e-6 && Math.Abs(a.Item2 - b.Item2) < 1e-12);
    }

    [Theory]
    [InlineData("0..0.01", 0, true)]
    [InlineData("0.9..1", 0, false)]
    public void Every_value_or_none_is_said_plainly(string range, int crossings, bool met)
    {
        ToleranceResult found = Find(Pair, "{}", "flight.depolarising", range, "\"arrived\" >= 0.9");
        Assert.Equal((crossings, met), (found.Crossings.Count, found.MetAt.From));
    }

    [Theory]
    [InlineData("flight.time", "1 s", "success >= 0.5", "J001")]
    [InlineData("flight.time", "1 s..2 ms", "success >= 0.5", "J002")]
    [InlineData("flight.time", "2 s..1 s", "success >= 0.5", "J003")]
    [InlineData("flight.time", "0 s..1 s:log 5", "success >= 0.5", "J004")]
    [InlineData("flight.time", "0 s..1 s:1", "success >= 0.5", "J005")]
    [InlineData("flight.time", "0 s..1 s", null, "J009")]
    [InlineData("flight.depolarising", "0..2", "success >= 0.5", "C017")]
    [InlineData("flight.depolarising", "0..1", "sucess >= 0.5", "S069")]
    public void What_does_not_fit_is_told(string path, string range, string? goal, string code)
    {
        Outcome<ToleranceResult> outcome = Judge.Tolerance(new ToleranceRequest(Request(Pair, "{}"), [new(path, range)], goal));
        Assert.Contains(code, outcome.Findings.Select(f => f.Code));
        Assert.False(outcome.Succeeded);
    }

    private static string Removal(int n, string basis) => $"""
        protocol "p"
        parties P[1..{n}]
        resource antisymmetric on all
        round "r"
          P[{n}] measures {basis} as k
          P[{n}] announces k
          P[1..{n - 1}] apply complement({basis}, k)
        end
        checkpoint "after": fidelity with antisymmetric on P[1..{n - 1}]
        success when true
        """ + "\n";

    private static string Decay(int n) => $$"""{ "levels": { "decay": [ {{string.Join(", ", Enumerable.Range(1, n - 1).Select(b => $$"""{ "from": 0, "to": {{b}}, "rate": "{{(1.0 / (n - 1)).ToString("R", CultureInfo.InvariantCulture)}} /s" }"""))}} ] } }""";

    private static RunRequest Request(string script, string conditions) => new() { Script = new InputText("p.protocol", script, ""), Conditions = new InputText("c.json", conditions, "") };

    private static ToleranceResult Find(string script, string conditions, string path, string range, string goal)
    {
        Outcome<ToleranceResult> outcome = Judge.Tolerance(new ToleranceRequest(Request(script, conditions), [new(path, range)], goal));
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
