using System.Globalization;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Judgement.Uncertain;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>Uncertainties of conditions carried through to figures.</summary>
public sealed class UncertaintyTests
{
    private const string Removal = """
        protocol "Removal of three"
        parties Ada, Ben, Cyd
        resource antisymmetric on all
        round "Cyd leaves"
          Cyd measures level as k
          Cyd announces k
          Ada, Ben apply complement(level, k)
        end
        checkpoint "after": fidelity with antisymmetric on Ada, Ben
        success when true
        goal "after" >= GOAL

        """;

    private const string Pair = "protocol \"p\"\nparties A, B\nresource antisymmetric on all\nround \"r\"\n  A measures level as a\nend\nsuccess when true\n";

    private const double Coverage = 1.959963984540054;

    /// <summary>
    /// Worked by hand: F = exp(-t/T) with T = 80(10) us and t = 8.0(5) us. ∂F/∂T = F t/T², ∂F/∂t = -F/T; they move F by 0.1 F · 10/80 and
    /// -F · 0.5/80, in the ratio 2 to -1, so that T has 4/5 of the variance.
    /// </summary>
    [Fact]
    public void Removal_with_an_uncertain_lifetime_and_time_is_as_worked_by_hand()
    {
        UncertaintyResult found = Run(Removal.Replace("GOAL", "0.9", StringComparison.Ordinal), Decay("80(10) us", "8.0(5) us")).Uncertainty!;
        FigureBand after = found.Find(FigureKind.Checkpoint, "after")!;
        double f = Math.Exp(-0.1);
        Assert.Equal(f, after.Value.Value, 1e-12);
        Assert.Equal(f / 80 * Math.Sqrt(1 + 0.25), after.StandardUncertainty, 1e-8);
        Assert.Equal((f - (Coverage * after.StandardUncertainty), f + (Coverage * after.StandardUncertainty)), (after.Low, after.High), Within(1e-12));
        Assert.Equal(["levels.decay[0].lifetime", "flight.time"], after.Sensitivities.Select(s => s.Path));
        Assert.Equal([f * 8 / 6400, -f / 80], after.Sensitivities.Select(s => s.Derivative), (a, b) => Math.Abs(a - b) < 1e-8);
        Assert.Equal([0.8, 0.2], after.Sensitivities.Select(s => s.Share), (a, b) => Math.Abs(a - b) < 1e-6);
        Assert.All(after.Sensitivities, s => Assert.False(s.OneSided));
        Assert.Equal([("levels.decay[0].lifetime", 80, 10, "us"), ("flight.time", 8, 0.5, "us")], found.Inputs.Select(i => (i.Path, i.Value, i.StandardUncertainty, i.Unit)));
        Assert.Equal("\"after\" >= 0.9", found.Leading!.Name);
    }

    [Theory]
    [InlineData("0.90", Verdict.Undecided, true)]
    [InlineData("0.91", Verdict.Undecided, false)]
    [InlineData("0.80", Verdict.Met, true)]
    [InlineData("0.99", Verdict.NotMet, false)]
    public void A_goal_met_at_one_end_of_the_band_only_is_undecided(string goal, Verdict verdict, bool met)
    {
        RunResult run = Run(Removal.Replace("GOAL", goal, StringComparison.Ordinal), Decay("80(10) us", "8.0(5) us"));
        GoalResult only = Assert.Single(run.Goals);
        Assert.Equal((verdict, met, verdict == Verdict.Undecided), (run.Verdict, only.Met, only.Undecided));
        Assert.StartsWith(verdict switch { Verdict.Undecided => "Goal undecided:", Verdict.Met => "Goal met:", _ => "Goal not met:" }, run.VerdictText, StringComparison.Ordinal);
        Assert.Contains("± 0.013", run.VerdictText, StringComparison.Ordinal);
    }

    [Fact]
    public void Of_several_goals_one_missed_for_certain_outweighs_one_in_doubt()
    {
        string script = Removal.Replace("GOAL", "0.9", StringComparison.Ordinal);
        Assert.Equal(Verdict.NotMet, Run(script + "goal \"arrived\" >= 0.99\n", Decay("80(10) us", "8.0(5) us")).Verdict);
        RunResult undecided = Run(script + "goal success >= 1\n", Decay("80(10) us", "8.0(5) us"));
        Assert.Equal(Verdict.Undecided, undecided.Verdict);
        Assert.StartsWith("1 of 2 goals undecided, the others met", undecided.VerdictText, StringComparison.Ordinal);
    }

    /// <summary>For small uncertainties draws give what first order gives, to the chance of N draws: 1/√(2N) of the uncertainty, 1/√N of the mean.</summary>
    [Theory]
    [InlineData("80.0(8) us", "8.00(5) us")]
    [InlineData("80.00(8) us", "8.000(5) us")]
    public void Linear_and_sampled_uncertainties_agree_where_they_are_small(string lifetime, string time)
    {
        const int draws = 2000;
        RunResult run = Run(Removal.Replace("GOAL", "0.9", StringComparison.Ordinal), Decay(lifetime, time), draws);
        FigureBand after = run.Uncertainty!.Find(FigureKind.Checkpoint, "after")!;
        Assert.Equal(1, after.Sampled!.StandardUncertainty / after.StandardUncertainty, 4 / Math.Sqrt(2 * draws));
        Assert.Equal(0, (after.Sampled.Mean - after.Value.Value) / after.StandardUncertainty, 4 / Math.Sqrt(draws));
        Assert.Equal(after.Low, after.Sampled.Low, 0.3 * after.StandardUncertainty);
        Assert.Equal(after.High, after.Sampled.High, 0.3 * after.StandardUncertainty);
        Assert.Equal((0, 0), (after.Sampled.Undefined, run.Uncertainty.Redrawn));
        Assert.DoesNotContain("P046", run.Warnings.Select(w => w.Code));
    }

    /// <summary>F = 1/4 + 3/4 (1-a)(1-b) for a pair whose qudits are depolarised with a and b: shared values move together, separate ones independently.</summary>
    [Fact]
    public void What_shares_an_entry_moves_together()
    {
        double shared = Pairs("""{ "flight": { "depolarising": "0.10(1)" } }"""), separate = Pairs("""{ "flight": { "A": { "depolarising": "0.10(1)" }, "B": { "depolarising": "0.10(1)" } } }""");
        Assert.Equal(0.01 * 1.5 * 0.9, shared, 1e-9);
        Assert.Equal(shared / Math.Sqrt(2), separate, 1e-9);

        static double Pairs(string conditions) => Run(Pair, conditions).Uncertainty!.Find(FigureKind.Checkpoint, "arrived")!.StandardUncertainty;
    }

    /// <summary>At p = 0, F = 1 - 3p/4 has a slope on one side only; draws below 0 are refused, half of them, which leaves |normal|.</summary>
    [Fact]
    public void A_value_at_the_end_of_its_domain_is_moved_to_one_side_and_drawn_anew_beyond_it()
    {
        UncertaintyResult found = Run(Pair, """{ "flight": { "A": { "depolarising": "0.00(1)" } } }""", 1000).Uncertainty!;
        FigureBand arrived = found.Find(FigureKind.Checkpoint, "arrived")!;
        Sensitivity only = Assert.Single(arrived.Sensitivities);
        Assert.True(only.OneSided);
        Assert.Equal(-0.75, only.Derivative, 1e-9);
        Assert.Equal(1, arrived.High, 1e-12);
        Assert.Equal(1000, found.Redrawn, 200.0);
        Assert.Equal(1 - (0.0075 * Math.Sqrt(2 / Math.PI)), arrived.Sampled!.Mean, 0.0006);
    }

    [Fact]
    public void Draws_depend_on_the_seed_and_not_on_threads()
    {
        RunRequest request = Request(Removal.Replace("GOAL", "0.9", StringComparison.Ordinal), Decay("80(10) us", "8.0(5) us")) with { Uncertainty = new UncertaintyRequest(20) };
        SampledBand?[] one = Bands(request with { Threads = 1 });
        Assert.Equal(one, Bands(request with { Threads = 4 }));
        Assert.NotEqual(one, Bands(request with { Seed = 2 }));

        static SampledBand?[] Bands(RunRequest request) => [.. Judge.Run(request).Value!.Uncertainty!.Figures.Select(f => f.Sampled)];
    }

    [Fact]
    public void Central_figures_are_those_without_uncertainties()
    {
        string script = Removal.Replace("GOAL", "0.9", StringComparison.Ordinal);
        RunResult with = Run(script, Decay("80(10) us", "8.0(5) us")), without = Run(script, Decay("80 us", "8.0 us"));
        Assert.Equal(without.Checkpoints.Select(c => c.Fidelity), with.Checkpoints.Select(c => c.Fidelity));
        Assert.Equal(["P047"], without.Warnings.Select(w => w.Code));
        Assert.Empty(without.Uncertainty!.Inputs);
        Assert.Equal(["P033"], Judge.Run(Request(script, Decay("80(10) us", "8.0(5) us"))).Value!.Warnings.Select(w => w.Code));
    }

    /// <summary>Phase noise σ of one qudit of a pair leaves F = (1 + exp(-σ²/2))/2, which at σ = 0 is level to first order and yet falls.</summary>
    [Fact]
    public void A_bend_within_the_uncertainty_is_warned_of_also_where_first_order_sees_nothing()
    {
        RunResult run = Run(Pair + "goal \"arrived\" >= 0.5\n", """{ "flight": { "A": { "phaseNoise": "0.0(5) rad" } } }""", 400);
        FigureBand arrived = run.Uncertainty!.Find(FigureKind.Checkpoint, "arrived")!;
        Assert.Equal(0, arrived.StandardUncertainty, 1e-3);
        Assert.Equal((1 + (1 / Math.Sqrt(1.25))) / 2, arrived.Sampled!.Mean, 0.01); // the mean of exp(-σ²/2) for σ normal with 0.5
        Assert.Contains("P046", run.Warnings.Select(w => w.Code));
    }

    [Fact]
    public void A_value_that_others_depend_on_is_refused_with_its_path()
    {
        Outcome<RunResult> refused = Judge.Run(Request(Pair, """{ "detection": { "confusion": [["0.98(1)", 0.02], [0.02, 0.98]] } }""") with { Uncertainty = new UncertaintyRequest(0) });
        Diagnostic finding = Assert.Single(refused.Findings);
        Assert.Equal("P045", finding.Code);
        Assert.Contains("`detection.confusion[0][0]`", finding.Message, StringComparison.Ordinal);
    }

    /// <summary>F = exp(-t/T) at each t: u = F t/T² u(T), and the point where the band reaches the goal only in part is undecided.</summary>
    [Fact]
    public void A_sweep_carries_bands_at_every_point_and_through_its_journal()
    {
        string journal = Path.GetTempFileName();
        try
        {
            SweepRequest request = new(
                Request(Removal.Replace("GOAL", "0.9", StringComparison.Ordinal), Decay("80(10) us", "8.0(5) us")) with { Uncertainty = new UncertaintyRequest(0) }, [new("flight.time", "2 us..14 us:3")], journal, null);
            SweepResult computed = Judge.Sweep(request).Value!, read = Judge.Sweep(request).Value!;
            Assert.Equal([2.0, 8, 14], computed.Points.Select(p => p.Values[0]), (a, b) => Math.Abs(a - b) < 1e-12);
            Assert.All(computed.Points, p => Assert.Equal(Math.Exp(-p.Values[0] / 80) * p.Values[0] / 640, p.Bands.Single(b => b.Name == "fidelity after").StandardUncertainty, 1e-8));
            Assert.Equal([(true, false), (true, true), (false, false)], computed.Points.Select(p => (p.GoalsMet!.Value, p.Undecided)));
            Assert.Equal(computed.Points.SelectMany(p => p.Bands), read.Points.SelectMany(p => p.Bands));
            Assert.Equal(computed.Points.Select(p => p.Undecided), read.Points.Select(p => p.Undecided));
            Assert.Equal("J007", Assert.Single(Judge.Sweep(request with { Run = request.Run with { Uncertainty = null } }).Findings).Code);
        }
        finally
        {
            File.Delete(journal);
        }
    }

    /// <summary>With one source every part is the whole loss, and moves like the fidelity.</summary>
    [Fact]
    public void A_budget_of_one_source_has_the_uncertainty_of_the_fidelity()
    {
        RunRequest request = Request(Pair + "goal \"arrived\" >= 0.5\n", """{ "flight": { "A": { "depolarising": "0.10(1)" } } }""") with { Uncertainty = new UncertaintyRequest(0) };
        BudgetResult budget = Judge.Budget(request).Value!;
        SourceShare only = Assert.Single(budget.Shares);
        Assert.Equal(0.0075, budget.Uncertainty!.Leading!.StandardUncertainty, 1e-9);
        Assert.All([only.AloneUncertainty, only.RemovedUncertainty, only.ShareUncertainty], u => Assert.Equal(0.0075, u!.Value, 1e-9));
        Assert.Null(Judge.Budget(request with { Uncertainty = null }).Value!.Uncertainty);
    }

    /// <summary>Both kinds of stencil are exact for cubics, and their error vanishes for parabolas.</summary>
    [Theory]
    [InlineData(0, 1, 0, 0)]
    [InlineData(3, -2, 0.5, 0)]
    [InlineData(1, 2, -3, 4)]
    public void Stencils_are_exact_for_cubics(double a, double b, double c, double d)
    {
        const double at = 0.7, step = 0.05;
        foreach (Stencil stencil in Stencil.All)
        {
            (double derivative, double error) = stencil.Derive([.. stencil.Points.Select(p => Cubic(at + (p.Place * step)))], step);
            Assert.Equal(b + (2 * c * at) + (3 * d * at * at), derivative, 1e-11);
            Assert.Equal(d == 0, error < 1e-11);
        }

        double Cubic(double x) => a + (b * x) + (c * x * x) + (d * x * x * x);
    }

    private static string Decay(string lifetime, string time) => string.Create(CultureInfo.InvariantCulture, $$"""
        { "levels": { "decay": [ { "from": 0, "lifetime": "{{lifetime}}", "branching": { "1": 0.5, "2": 0.5 } } ] }, "flight": { "time": "{{time}}" } }
        """);

    private static RunRequest Request(string script, string conditions) => new() { Script = new InputText("p.protocol", script, ""), Conditions = new InputText("c.json", conditions, "") };

    private static RunResult Run(string script, string conditions, int samples = 0)
    {
        Outcome<RunResult> outcome = Judge.Run(Request(script, conditions) with { Uncertainty = new UncertaintyRequest(samples) });
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }

    private static Func<(double, double), (double, double), bool> Within(double tolerance) => (a, b) => Math.Abs(a.Item1 - b.Item1) < tolerance && Math.Abs(a.Item2 - b.Item2) < tolerance;
}
