using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using Xunit;

namespace ResourceCheck.Tests.ProtocolLibrary;

/// <summary>What cheats do, against values worked by hand and tables.</summary>
public sealed class DishonestCaseTests
{
    /// <summary>
    /// Ideally P[1] holds level 0 in 1/n of the draws. Denying leaves them without a leader; claiming makes a second one in all others;
    /// hiding level 0 as a missing click drops 1/n of the copies and leaves draws that others always win.
    /// </summary>
    [Theory]
    [InlineData(3)]
    [InlineData(4)]
    public void Cheats_of_the_leader_draw_do_what_counting_says(int n)
    {
        RunResult run = Run("leader-draw.protocol", ("n", $"{n}"));
        Assert.Equal(1.0 / n, Metric(run, "P[1] denies that it leads", "harm"), 1e-12);
        Assert.Equal(1 - (1.0 / n), Metric(run, "P[1] denies that it leads", "success"), 1e-12);
        Assert.Equal(1 - (1.0 / n), Metric(run, "P[1] claims to lead", "harm"), 1e-12);
        Assert.Equal(1.0 / n, Metric(run, "P[1] claims to lead", "success"), 1e-12);
        const string hides = "P[1] hides that it leads as a missing click";
        Assert.Equal(1, Metric(run, hides, "harm"), 1e-12);
        Assert.Equal(1 - (1.0 / n), Metric(run, hides, "copies kept"), 1e-12);
        Assert.Equal(1, Metric(run, hides, "success"), 1e-12);
    }

    [Fact]
    public void A_leaver_who_announces_a_wrong_outcome_leaves_an_orthogonal_state()
    {
        RunResult run = Run("removal.protocol");
        Assert.Equal(0, Metric(run, "Dov announces a wrong outcome", "fidelity after removal"), 1e-12);
        Assert.Equal(0, Metric(run, "Dov announces a wrong outcome", "harm"), 1e-12); // a draw of levels shows nothing
        AttackResult attack = Assert.Single(run.Attacks);
        Assert.Equal("o", Assert.Single(attack.Choices).Key);
    }

    /// <summary>Largest harms of the table of lists (tests/reference/lists.csv; numbers of the sender's case found by the search).</summary>
    [Fact]
    public void Harms_of_liar_detection_are_at_least_those_of_the_reference_attacks_and_labelled_with_their_side()
    {
        RunResult run = Run("liar-detection.protocol");
        Assert.InRange(Metric(run, "sender lies", "harm"), 0.18408203125 - 1e-12, 0.2);
        Assert.InRange(Metric(run, "forwarder lies", "harm"), 0.24532776694 - 1e-10, 0.26);
        Assert.All(run.Cases.Skip(1), c =>
        {
            Estimate most = c.Metrics.Single(m => m.Name == "harm").Estimate, least = c.Metrics.Single(m => m.Name == "harm on average").Estimate;
            Assert.True(double.IsFinite(most.High) && double.IsInfinity(most.Low));
            Assert.True(double.IsFinite(least.Low) && double.IsInfinity(least.High));
            Assert.True(least.Value <= most.Value);
        });
        Assert.Equal(2.4262163320e-2, run.Cases[0].Metrics.Single(m => m.Name == "failure").Estimate.Value, 1e-11);
    }

    /// <summary>A forger without noise of its own: p = 0.02 on the others only (tests/reference/lists.py and the page of the protocol).</summary>
    [Fact]
    public void Perfect_hardware_takes_the_noise_of_the_cheat_away()
    {
        string script = ProtocolLibraryTests.Text("detectable-broadcast.protocol");
        int end = script.IndexOf("dishonest \"sender splits\"", StringComparison.Ordinal), forger = script.IndexOf("dishonest \"receiver forges\"", StringComparison.Ordinal);
        string perfect = (script[..end] + script[forger..]).Replace("goal harm \"sender splits\" <= 0.2\n", "", StringComparison.Ordinal)
            .Replace("  instead of \"evidence\"", "  perfect hardware\n  instead of \"evidence\"", StringComparison.Ordinal);
        RunResult run = Value(Judge.Run(new RunRequest { Script = new InputText("p.protocol", perfect, ""), Overrides = [new("flight.depolarising", "0.02")] }));
        Assert.Equal(0.10465065169, Metric(run, "receiver forges", "harm"), 1e-10);
    }

    /// <summary>Harms of the leader draw are 1/n and (n-1)/n, exactly; a claim on one is decided, and run does not stumble over it.</summary>
    [Fact]
    public void A_claim_on_a_harm_is_decided()
    {
        string script = ProtocolLibraryTests.Text("leader-draw.protocol").Replace("goal success", "claim harm \"P[1] denies that it leads\" <= 0.25\nclaim harm \"P[1] claims to lead\" <= 0.7\ngoal success", StringComparison.Ordinal);
        RunRequest request = new() { Script = new InputText("p.protocol", script, "") };
        ClaimResult[] claims = [.. Value(Judge.Verify(request)).Claims.Where(c => c.Text.StartsWith("harm", StringComparison.Ordinal))];
        Assert.Equal([(ClaimVerdict.Proved, 0.25), (ClaimVerdict.Refuted, 0.75)], claims.Select(c => (c.Verdict, Math.Round(c.Left!.Value, 12))));
        Assert.True(Judge.Run(request).Succeeded);
    }

    /// <summary>One run in a hundred with every outcome random: its draws have one leader in 4 · 27/256 of the cases, and none of the three others leads in (3/4)³.</summary>
    [Fact]
    public void A_drift_puts_a_floor_under_failure_and_harms()
    {
        RunRequest request = ProtocolLibraryTests.Request("leader-draw.protocol", conditions: false, parameters: false);
        DriftResult drift = Value(Judge.Run(request with { Drift = new Drift(0.01, new InputText("worse.json", """{ "flight": { "depolarising": 1 } }""", "")) })).Drift!;
        DriftFigure honest = drift.Figures[0], denies = drift.Figures[1];
        double failure = 1 - (4 * 27.0 / 256);
        Assert.Equal((0.01 * failure, 0.01 * failure), (honest.Floor.Value, honest.Whole.Value), (a, b) => Math.Abs(a.Item1 - b.Item1) + Math.Abs(a.Item2 - b.Item2) < 1e-12);
        Assert.Equal(("P[1] denies that it leads", "harm"), (denies.Case, denies.Name));
        Assert.Equal(0.01 * 27 / 64, denies.Floor.Value, 1e-12);
        Assert.Equal((0.99 * 0.25) + (0.01 * 27 / 64), denies.Whole.Value, 1e-12);
    }

    /// <summary>A harm that speaks of a chosen number, and a number chosen before there are lists.</summary>
    [Fact]
    public void Choices_in_harms_and_in_rounds_are_handled()
    {
        const string lists = "protocol \"p\"\nparties A, B, C\nresource antisymmetric on all\ncopies 20\nround \"r\"\n  all measure level as v\nend\ndiscussion \"d\"\n  A sets J to where(v = 0)\n  A sends J to B\nend\nsuccess when size(B.J) > 0\n"
            + "dishonest \"part\" by A\n  choose k in 1..5\n  instead of \"d\"\n    A sends some(k of where(v = 0)) as J to B\n  end\n  harm when size(B.J) = k\nend\n";
        Assert.Equal(1, Metric(Value(Judge.Run(new RunRequest { Script = new InputText("p.protocol", lists, "") })), "part", "harm"), 1e-12);
        string early = lists.Replace("instead of \"d\"", "instead of \"r\"\n    A measures (if k = 1 then fourier else level) as v\n  end\n  instead of \"d\"", StringComparison.Ordinal);
        Assert.Equal(["E008"], Judge.Run(new RunRequest { Script = new InputText("p.protocol", early, "") }).Findings.Select(f => f.Code));
    }

    /// <summary>The table's attacks at M = 300, p = 0.02 (tests/reference/lists.csv), given instead of searched.</summary>
    [Fact]
    public void Numbers_that_are_given_are_evaluated_in_place_of_a_search()
    {
        RunResult run = Value(Judge.Run(Chosen("sender splits: n = 84, k1 = 0, k2 = 15, o = 7, n1 = 126", "receiver forges: m = 24")));
        Assert.Equal(5.8103589605e-2, Metric(run, "sender splits", "harm"), 1e-11);
        Assert.Equal(1.2032077242e-2, Metric(run, "receiver forges", "harm"), 1e-11);
        Assert.All(run.Attacks, a => Assert.Contains("at the numbers given", a.Method, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("P040", "sender spilts: n = 84")]
    [InlineData("P041", "receiver forges: n = 24")]
    [InlineData("P041", "receiver forges: m = many")]
    [InlineData("P042", "receiver forges: m = 301")]
    [InlineData("P042", "receiver forges: m = 24.5")]
    public void Numbers_that_do_not_fit_are_told(string code, string text) =>
        Assert.Equal([code], Judge.Run(Chosen(text)).Findings.Where(f => f.Severity == Severity.Error).Select(f => f.Code));

    /// <summary>
    /// Only level 0 decays, into the two others alike: what matters is which value it plays, and with common thresholds value 2 tolerates
    /// most, because its positions are never in an honest list of the sender's.
    /// </summary>
    [Fact]
    public void The_decaying_level_does_best_as_value_two()
    {
        const string decay = """{ "levels": { "decay": [ { "from": 0, "to": 1, "lifetime": "200 us" }, { "from": 0, "to": 2, "lifetime": "200 us" } ] }, "flight": { "length": "2 km", "speed": "2e8 m/s" } }""";
        RunRequest request = Chosen("sender splits: n = 38, k1 = 0, k2 = 7, o = 2, n1 = 50", "receiver forges: m = 12") with
        {
            Overrides = [],
            Conditions = new InputText("c.json", decay, ""),
            Parameters = [new("M", "150")],
            TryLevels = true,
        };
        IReadOnlyList<LevelsResult> levels = Value(Judge.Run(request)).Levels;
        Assert.Equal(6, levels.Count);
        Assert.Equal(0, levels[0].Levels[2]);
        Assert.Equal([0, 1, 2], Assert.Single(levels, l => l.Today).Levels);
        foreach (int value in (int[])[0, 1, 2])
        {
            double[] failures = [.. levels.Where(l => l.Levels[value] == 0).Select(l => l.Figures[0].Value.Value)];
            Assert.Equal(failures[0], failures[1], 1e-12);
        }
    }

    [Fact]
    public void Levels_are_not_compared_where_their_orders_are_too_many() => Assert.Equal(
        ["P043"], Judge.Run(ProtocolLibraryTests.Request("stranger-numbering.protocol", conditions: false, parameters: false) with { Parameters = [new("n", "5")], TryLevels = true }).Findings.Select(f => f.Code));

    private static RunRequest Chosen(params string[] numbers) => ProtocolLibraryTests.Request("detectable-broadcast.protocol", conditions: false, parameters: false) with
    {
        Overrides = [new("flight.depolarising", "0.02")],
        Parameters = [new("M", "300")],
        Choose = numbers,
    };

    private static double Metric(RunResult run, string name, string metric) => run.Cases.Single(c => c.Case == name).Metrics.Single(m => m.Name == metric).Estimate.Value;

    private static RunResult Run(string script, params (string Name, string Value)[] parameters) => Value(Judge.Run(
        ProtocolLibraryTests.Request(script, conditions: false, parameters: false) with { Parameters = [.. parameters.Select(p => KeyValuePair.Create(p.Name, p.Value))] }));

    private static T Value<T>(Outcome<T> outcome)
        where T : class
    {
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
