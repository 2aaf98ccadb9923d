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

    /// <summary>F = exp(-t/T) meets 0.9 up to t = -T ln 0.9, in the unit varied whatever unit the conditions are in.</summary>
    [Theory]
    [InlineData("8 us", true)]
    [InlineData("0.009 ms", false)]
    public void Todays_value_comes_with_its_distance_from_the_crossing(string today, bool met)
    {
        ToleranceResult found = Find(Removal(3, "level"), LifetimeAndTime("80 us", today), "flight.time", "0 us..20 us", "\"after\" >= 0.9");
        double tolerated = -80 * Math.Log(0.9), value = met ? 8 : 9;
        Crossing crossing = Assert.Single(found.Crossings);
        Assert.Equal((value, met), (found.Today!.Value, found.Today.Met));
        Assert.Equal(Math.Exp(-value / 80), found.Today.Figure.Value, 1e-12);
        Assert.Equal(tolerated - value, crossing.FromToday!.Value, 1e-9);
        Assert.Equal((tolerated / value) - 1, crossing.Relative!.Value, 1e-9);
        Assert.Null(crossing.Band);
        string text = Written(found);
        Assert.Contains(met ? "8 us, meets the goal; it may grow by" : "9 us, misses the goal; it must fall by", text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("flight.A.depolarising", "{ \"flight\": { \"default\": { \"depolarising\": 0.02 }, \"B\": { \"dephasing\": 0 } } }", 0.02)]
    [InlineData("flight.A.depolarising", "{ \"flight\": { \"depolarising\": 0.02 } }", 0.02)]
    [InlineData("flight.A.depolarising", "{ \"flight\": { \"dephasing\": 0.02 } }", null)]
    [InlineData("flight.A.depolarising", "{}", null)]
    public void An_inherited_value_is_todays_and_an_absent_one_is_none(string path, string conditions, double? today)
    {
        ToleranceResult found = Find(Pair, conditions, path, "0..0.5", "\"arrived\" >= 0.9");
        Assert.Equal(today, found.Today?.Value);
        Assert.All(found.Crossings, c => Assert.Equal(today is null, c.FromToday is null));
    }

    /// <summary>t = -T ln F for T = 80(10) us, and by solving again at lifetimes a little to both sides.</summary>
    [Fact]
    public void A_tolerated_value_carries_the_uncertainty_of_the_other_values()
    {
        Crossing crossing = Assert.Single(Uncertain("80(10) us").Crossings);
        Assert.Equal(-10 * Math.Log(0.9), crossing.Band!.StandardUncertainty, 1e-6);
        Assert.Equal(crossing.Value - (1.959963984540054 * crossing.Band.StandardUncertainty), crossing.Band.Low, 1e-9);
        Assert.Equal(["levels.decay[0].lifetime"], crossing.Band.Sensitivities.Select(s => s.Path)); // that of the value varied does not count
        double above = Uncertain("81 us").Crossings[0].Value, below = Uncertain("79 us").Crossings[0].Value;
        Assert.Equal((above - below) / 2, crossing.Band.Sensitivities[0].Derivative, 1e-7);

        static ToleranceResult Uncertain(string lifetime)
        {
            RunRequest request = Request(Removal(3, "level"), LifetimeAndTime(lifetime, "8.0(5) us")) with { Uncertainty = new(0) };
            return Judge.Tolerance(new ToleranceRequest(request, [new("flight.time", "0 us..20 us")], "\"after\" >= 0.9")).Value!;
        }
    }

    [Fact]
    public void Every_value_and_none_are_headlines()
    {
        Assert.StartsWith("Every value of flight.depolarising from 0 to 0.01 meets", Written(Find(Pair, "{}", "flight.depolarising", "0..0.01", "\"arrived\" >= 0.9")), StringComparison.Ordinal);
        Assert.StartsWith("No value of flight.depolarising from 0.9 to 1 meets", Written(Find(Pair, "{}", "flight.depolarising", "0.9..1", "\"arrived\" >= 0.9")), StringComparison.Ordinal);
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

    private static string LifetimeAndTime(string lifetime, string time) =>
        $$"""{ "levels": { "decay": [ { "from": 0, "lifetime": "{{lifetime}}", "branching": { "1": 0.5, "2": 0.5 } } ] }, "flight": { "time": "{{time}}" } }""";

    private static string Written(ToleranceResult found)
    {
        using StringWriter writer = new();
        ResourceCheck.Reports.ReportWriter.Write(found, ResourceCheck.Reports.ReportFormat.Markdown, writer);
        return writer.ToString().Replace("\\", "", StringComparison.Ordinal)[2..];
    }

    private static RunRequest Request(string script, string conditions) => new() { Script = new InputText("p.protocol", script, ""), Conditions = new InputText("c.json", conditions, "") };

    private static ToleranceResult Find(string script, string conditions, string path, string range, string goal)
    {
        Outcome<ToleranceResult> outcome = Judge.Tolerance(new ToleranceRequest(Request(script, conditions), [new(path, range)], goal));
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
