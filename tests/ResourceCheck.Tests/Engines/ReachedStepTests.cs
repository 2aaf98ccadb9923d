using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Engines;

/// <summary>Steps that only some branches reach: they act when and where the script puts them. Expected values are worked by hand in each test.</summary>
public sealed class ReachedStepTests
{
    private const string Rare = """
        protocol "p"
        parties A, B, C
        resource antisymmetric on all
        round "r"
          A, B measure level as k
          A, B announce k
          when A.k = B.k
            checkpoint "rare": fidelity with antisymmetric on C
          end
        end
        success when A.k != B.k
        goal "rare" >= 0.3
        """;

    /// <summary>
    /// In half of the copies Eve measures A's qudit on its way in the Fourier basis. A's level is then uniform and independent of the
    /// others', so it is the missing one with probability 1/3: success 1/2 + 1/2 · 1/3 = 2/3. Her outcome is 0 in 1/2 · 1/3 of all copies.
    /// </summary>
    [Fact]
    public void An_interception_under_a_condition_acts_in_flight()
    {
        Evaluation e = Evaluate("""
            protocol "p"
            parties A, B, C
            outsider Eve
            resource antisymmetric on all
            round "r"
              Eve picks e from level, fourier
              when Eve.e = fourier
                Eve intercepts A in fourier as g
              end
              A, B, C measure level as v
            end
            success when distinct(v of A, B, C)
            report "finds 0" = probability(Eve.g = 0)
            report "guess" = guess(A.v from Eve.e, Eve.g)
            """);
        Assert.Equal(2.0 / 3, e.Success.Value, 1e-12);
        Assert.Equal(1.0 / 6, e.Reports[0].Value, 1e-12);
        Assert.Equal(1.0 / 3, e.Reports[1].Value, 1e-12);
    }

    /// <summary>
    /// Eve measures C's qudit in one of two bases at random. In the level basis she changes nothing and learns C's level; in the Fourier basis
    /// C's level is uniform afterwards, whatever she found: success 1/2 + 1/2 · 1/3 = 2/3, her guess of C's level as good, each outcome 1/3.
    /// </summary>
    [Fact]
    public void An_interception_in_either_branch_acts_in_flight()
    {
        Evaluation e = Evaluate("""
            protocol "p"
            parties A, B, C
            outsider Eve
            resource antisymmetric on all
            round "r"
              Eve picks b from level, fourier
              when Eve.b = level
                Eve intercepts C in level as g
              otherwise
                Eve intercepts C in fourier as g
              end
              A, B, C measure level as v
            end
            success when distinct(v of A, B, C)
            report "finds 0" = probability(Eve.g = 0)
            report "guess" = guess(C.v from Eve.b, Eve.g)
            """);
        Assert.Equal(2.0 / 3, e.Success.Value, 1e-12);
        Assert.Equal(1.0 / 3, e.Reports[0].Value, 1e-12);
        Assert.Equal(2.0 / 3, e.Reports[1].Value, 1e-12);
    }

    /// <summary>
    /// A Bell value is of the last checkpoint, wherever its report stands. A and B hold a singlet: 2√2. A clock of B's (for two levels σz) that
    /// acts or not at random takes the coherence away, and what is left, correlated in one basis only, reaches 2.
    /// </summary>
    [Fact]
    public void A_Bell_value_is_of_the_last_look_in_the_order_of_the_script()
    {
        const string head = """
            protocol "p"
            parties A, B
            resource antisymmetric on all
            report "above" = bellvalue(A, B)
            checkpoint "first": fidelity with antisymmetric on A, B

            """;
        Evaluation once = Evaluate(head + "success when true");
        Assert.Equal(2 * Math.Sqrt(2), once.Reports[0].Value, 1e-9);
        Evaluation twice = Evaluate(head + """
            round "blur"
              B picks c from 0, 1
              B applies clock(c)
            end
            checkpoint "second": fidelity with antisymmetric on A, B
            report "below" = bellvalue(A, B)
            success when true
            """);
        Assert.Equal(2, twice.Reports[0].Value, 1e-9);
        Assert.Equal(2, twice.Reports[1].Value, 1e-9);
    }

    /// <summary>Ideally A and B never agree; the row of the look stays, and says that it is never reached.</summary>
    [Fact]
    public void A_look_that_is_never_reached_has_a_row_without_a_figure()
    {
        RunResult run = Run(Rare);
        CheckpointResult rare = Assert.Single(run.Checkpoints, c => c.Name == "rare");
        Assert.Equal(double.NaN, rare.Fidelity.Value);
        Assert.Null(rare.Ideal);
        Assert.Equal(Verdict.NotMet, run.Verdict);
        Assert.Contains("never reached", run.VerdictText, StringComparison.Ordinal);
    }

    /// <summary>A gives up on outcome 0, one copy in three, and measures nothing afterwards: its later value is none there.</summary>
    [Fact]
    public void Who_gave_up_has_no_later_values()
    {
        Evaluation e = Evaluate("""
            protocol "p"
            parties A, B, C
            resource antisymmetric on all
            round "r"
              A measures level as k
              A aborts when k = 0
              A sets w to 1
            end
            success when true
            report "went on" = probability(A.w = 1)
            """);
        Assert.Equal(1.0 / 3, e.Abort.Value, 1e-12);
        Assert.Equal(2.0 / 3, e.Success.Value, 1e-12);
        Assert.Equal(2.0 / 3, e.Reports[0].Value, 1e-12);
    }

    /// <summary>
    /// Ideally A and B never agree, so the look is reached under noise alone. Depolarising of strength 0.1 on A and B makes them agree in
    /// (1 - 0.9²)/3 of the copies: two levels of the pair are uniform with probability 1 - 0.9² and then agree in one of three.
    /// </summary>
    [Fact]
    public void A_look_that_ideal_conditions_never_reach_has_no_ideal_figure()
    {
        RunResult run = Run(Rare, ("flight.depolarising", "0.1"));
        CheckpointResult rare = Assert.Single(run.Checkpoints, c => c.Name == "rare");
        Assert.Equal((1 - (0.9 * 0.9)) / 3, rare.Kept, 1e-12);
        Assert.Null(rare.Ideal);
        Assert.Null(rare.Loss);
    }

    /// <summary>Ideally equal levels never occur, so the ideal run keeps nothing; the figures under noise stand.</summary>
    [Fact]
    public void An_ideal_run_that_keeps_nothing_has_no_figures_and_refuses_nothing()
    {
        RunResult run = Run("""
            protocol "p"
            parties A, B
            resource antisymmetric on all
            round "r"
              A, B measure level as k
              A, B announce k
              keep when A.k = B.k
            end
            success when A.k = 0
            """, ("flight.depolarising", "0.1"));
        Assert.Equal((1 - (0.9 * 0.9)) / 2, run.Yield.Value.Value, 1e-12);
        Assert.Null(Assert.Single(run.Cases).Metrics[0].Ideal);
    }

    /// <summary>
    /// A swap with a level that the qudits lack is the identity. Outcome 0 leaves the pair in levels 1 and 2, of which B's half goes to 1 and 0:
    /// overlap 1/4 with the pair in levels 0 and 1. Outcome 1 leaves levels 0 and 2, overlap 0; outcome 2 levels 0 and 1, overlap 1: 5/12 in all.
    /// </summary>
    [Fact]
    public void A_swap_with_a_level_that_does_not_exist_changes_nothing()
    {
        Evaluation e = Evaluate("""
            protocol "p"
            parties A, B, C
            resource antisymmetric on all
            round "r"
              A measures level as k
              A announces k
              B applies levelswap(k, k + 2)
            end
            checkpoint "end": fidelity with antisymmetric on B, C
            success when true
            """);
        Assert.Equal(5.0 / 12, e.Checkpoints[^1].Fidelity.Value, 1e-12);
    }

    /// <summary>Success sums to 1 up to round-off, and a goal of 1 is met by it.</summary>
    [Fact]
    public void Round_off_misses_no_goal()
    {
        RunResult run = Run("""
            protocol "p"
            parties P[1..4]
            resource antisymmetric on all
            round "r"
              all measure fourier as v
            end
            success when distinct(v of all)
            goal success >= 1
            """);
        Assert.Equal(Verdict.Met, run.Verdict);
    }

    private static Evaluation Evaluate(string script) => TestScripts.EvaluateIdeal(TestScripts.Bind(script));

    private static RunResult Run(string script, params (string Path, string Value)[] overrides)
    {
        Outcome<RunResult> run = Judge.Run(new RunRequest
        {
            Script = new InputText("p.protocol", script, ""),
            Overrides = [.. overrides.Select(o => KeyValuePair.Create(o.Path, o.Value))],
        });
        Assert.True(run.Succeeded, string.Join("\n\n", run.Findings));
        return run.Value!;
    }
}
