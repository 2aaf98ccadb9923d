using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Tests.ProtocolLibrary;
using ResourceCheck.Timeline;
using Xunit;

namespace ResourceCheck.Tests.Judgement;

/// <summary>Losses and their shares.</summary>
public sealed class BudgetTests
{
    /// <summary>Two parts: each gets half of what it does alone and half of what goes away with it. Here 1 and 2 alone, 4 together.</summary>
    [Fact]
    public void Two_parts_share_as_worked_by_hand() => Assert.Equal([(1 + (4 - 2)) / 2.0, (2 + (4 - 1)) / 2.0], Shapley.Shares([0, 1, 2, 4], 2));

    /// <summary>
    /// Three parts by the six orders: a, b, c alone 1, 2, 3; ab 4, ac 5, bc 7; abc 12. Part a adds 1 first (twice), 2 after b, 2 after c and
    /// 5 last (twice): 16/6. Part b adds 2, 2, 3, 4, 7, 7: 25/6. Part c the rest of 12: 31/6.
    /// </summary>
    [Fact]
    public void Three_parts_share_as_worked_by_hand()
    {
        double[] shares = Shapley.Shares([0, 1, 2, 4, 3, 5, 7, 12], 3);
        Assert.Equal([16 / 6.0, 25 / 6.0, 31 / 6.0], shares.Select(s => Math.Round(s, 12)), (a, b) => Math.Abs(a - b) < 1e-11);
    }

    [Property]
    public Property Shares_add_up_to_the_whole_and_a_part_that_adds_nothing_gets_nothing() =>
        Prop.ForAll(Gen.Choose(-1000, 1000).ArrayOf(8).ToArbitrary(), numbers =>
        {
            double[] values = [.. numbers.Select((n, i) => (double)numbers[i & 3])]; // the third part adds nothing
            double[] shares = Shapley.Shares(values, 3);
            return Math.Abs(shares.Sum() - (values[7] - values[0])) < 1e-9 && Math.Abs(shares[2]) < 1e-9;
        });

    public static TheoryData<string> Scripts => [.. ProtocolLibraryTests.Scripts.Select(s => s.Data).Where(s => !ProtocolLibraryTests.Text(s).Contains("copies M", StringComparison.Ordinal) && s != "pair-from-many.protocol")];

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Shares_of_every_library_protocol_add_up_to_its_whole_loss(string script)
    {
        BudgetResult budget = Budget(ProtocolLibraryTests.Request(script, conditions: true, parameters: false));
        Assert.Equal(budget.Loss, budget.Shares.Sum(s => s.Share), 1e-12);
        Assert.True(Math.Abs(budget.Loss) > 1e-3);
        if (!script.Contains("intercepted", StringComparison.Ordinal)) // there the goal asks for errors, of which noise makes more
        {
            Assert.All(budget.Shares, s => Assert.InRange(s.Share, -1e-12, budget.Loss));
            Assert.NotNull(budget.Advice);
        }
    }

    /// <summary>Depolarising p on one qudit in flight, white noise w before: both turn the state into the maximally mixed one of that
    /// qudit, so the fidelity of N = 2 is (1-w)(1-p) + (1 - (1-w)(1-p))/4, alone 3p/4 and 3w/4 are lost, and both lose 3/4 (1-(1-w)(1-p)).</summary>
    [Fact]
    public void Two_sources_of_a_pair_cost_what_their_closed_form_says()
    {
        const string script = "protocol \"p\"\nparties A, B\nresource antisymmetric on all\nround \"r\"\n  A measures level as a\nend\nsuccess when true\ngoal \"arrived\" >= 0.9\n";
        const double p = 0.2, w = 0.1;
        BudgetResult budget = Budget(new RunRequest { Script = new InputText("p.protocol", script, ""), Overrides = [new("flight.A.depolarising", "0.2"), new("resource.white", "0.1")] });
        double whole = 0.75 * (1 - ((1 - w) * (1 - p)));
        Assert.Equal(whole, budget.Loss, 1e-12);
        SourceShare noise = budget.Shares.Single(s => s.Source == Source.FlightNoise), preparation = budget.Shares.Single(s => s.Source == Source.Preparation);
        Assert.Equal((0.75 * p, whole - (0.75 * w)), (noise.Alone, noise.Removed), ((double, double) a, (double, double) b) => Math.Abs(a.Item1 - b.Item1) + Math.Abs(a.Item2 - b.Item2) < 1e-12);
        Assert.Equal((0.75 * p + whole - (0.75 * w)) / 2, noise.Share, 1e-12);
        Assert.Equal((0.75 * w + whole - (0.75 * p)) / 2, preparation.Share, 1e-12);
        Assert.Contains("with half of it 0.8575", budget.Advice, StringComparison.Ordinal); // p = 0.1: 1 - 0.75 (1 - 0.9 · 0.9)
    }

    private static BudgetResult Budget(RunRequest request)
    {
        Outcome<BudgetResult> outcome = Judge.Budget(request);
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
