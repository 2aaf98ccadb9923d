using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using Xunit;

namespace ResourceCheck.Tests.ProtocolLibrary;

/// <summary>Lists of which a random part is disclosed, with and without somebody who listens, against sums of binomial laws.</summary>
public sealed class TestedListTests
{
    /// <summary>P(Bin(60, 1/3) &lt;= 12), by SciPy: scipy.stats.binom.cdf(12, 60, 1/3).</summary>
    [Fact]
    public void A_listener_on_shares_is_missed_as_the_binomial_law_says()
    {
        Assert.Equal(0.017011170669750605, Failure("secret-sharing-tested.protocol", null, "1"), 1e-13);
        Assert.Equal(0, Failure("secret-sharing-tested.protocol", null, "0"), 1e-15);
    }

    /// <summary>Sum over the number of Fourier copies, by SciPy: see docs/protocols/stranger-numbering-tested.md.</summary>
    [Fact]
    public void A_reader_of_numbers_is_missed_as_the_sum_over_fourier_copies_says()
    {
        Assert.Equal(1, Failure("stranger-numbering-tested.protocol", null, "1") / 4.4330352940136194e-05, 1e-11);
        Assert.Equal(0, Failure("stranger-numbering-tested.protocol", null, "0"), 1e-15);
    }

    /// <summary>Under the demo conditions errors follow the binomial law of the symbol error that the scripts on single copies tell.</summary>
    [Theory]
    [InlineData("secret-sharing.protocol", "0")]
    [InlineData("secret-sharing-intercepted.protocol", "1")]
    public void The_error_rate_of_the_test_is_the_symbol_error_of_one_copy(string single, string listens)
    {
        const string conditions = "secret-sharing-intercepted.conditions.json";
        RunResult one = Value(Judge.Run(Request(single, conditions) with { Parameters = [new("n", "3")] }));
        double error = one.Cases[0].Metrics.Single(m => m.Name == "symbol error").Estimate.Value;
        double missed = Enumerable.Range(0, 13).Sum(k => Binomial(k, 60, error));
        double failure = Failure("secret-sharing-tested.protocol", "secret-sharing-tested.conditions.json", listens);
        Assert.Equal(listens == "1" ? missed : 1 - missed, failure, 1e-12);
        Assert.InRange(failure, 1e-4, 1e-2);
    }

    private static double Binomial(int k, int n, double p) =>
        Enumerable.Range(1, k).Aggregate(1.0, (ways, i) => ways * (n - k + i) / i) * Math.Pow(p, k) * Math.Pow(1 - p, n - k);

    private static double Failure(string script, string? conditions, string listens)
    {
        RunResult run = Value(Judge.Run(Request(script, conditions) with { Parameters = [new("listens", listens)] }));
        return run.Cases[0].Metrics.Single(m => m.Name == "failure").Estimate.Value;
    }

    private static RunRequest Request(string script, string? conditions)
    {
        RunRequest request = ProtocolLibraryTests.Request(script, conditions: false, parameters: false);
        string folder = Path.GetDirectoryName(request.Script.Name)!;
        return request with { Conditions = conditions is null ? null : new InputText(conditions, File.ReadAllText(Path.Combine(folder, conditions)), "") };
    }

    private static RunResult Value(Outcome<RunResult> outcome)
    {
        Assert.True(outcome.Succeeded, string.Join("\n\n", outcome.Findings));
        return outcome.Value!;
    }
}
