using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Numerics.States;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Values computed independently by tests/reference/make_state_fixtures.py (matrix exponential over all d^N amplitudes).</summary>
public sealed class ExchangeTests
{
    private const double Tolerance = 1e-11;

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void Pulses_without_errors_give_the_antisymmetric_state(int n) => Assert.Equal(1, LastStep(n, 0, 0), Tolerance);

    [Theory]
    [InlineData(3, 0.05, 0, 0.995009367972)]
    [InlineData(3, 0, 0.1, 0.997779629012)]
    [InlineData(3, 0.05, 0.1, 0.996364701262)]
    [InlineData(4, 0.05, 0, 0.992524966690)]
    [InlineData(4, 0, 0.1, 0.998126561979)]
    [InlineData(4, 0.05, 0.1, 0.998107889964)]
    public void Errors_in_the_last_step_lower_the_fidelity(int n, double time, double phase, double fidelity) =>
        Assert.Equal(fidelity, LastStep(n, time, phase), Tolerance);

    [Fact]
    public void A_missing_coupling_lowers_the_fidelity()
    {
        ExchangeStep[] steps = Steps(3);
        steps[^1].Couplings[0, 2] = steps[^1].Couplings[2, 0] = 0;
        Assert.Equal(0.586824088833, Fidelity(steps, 3), Tolerance);
    }

    [Fact]
    public void A_phase_error_of_the_first_step_stays_in_the_later_ones()
    {
        // Of |01⟩ - e^{iδ}|10⟩ the part (1 + e^{iδ})/2 is antisymmetric, and exact later steps carry only that part to |S_N⟩.
        ExchangeStep[] steps = Steps(4);
        steps[0] = steps[0] with { PhaseError = 0.4 };
        Assert.Equal(Math.Pow(Math.Cos(0.2), 2), Fidelity(steps[..1], 2), Tolerance);
        Assert.Equal(Math.Pow(Math.Cos(0.2), 2), Fidelity(steps, 4), Tolerance);
    }

    [Theory]
    [InlineData(5, 4, "D041")]
    [InlineData(4, 2, "D042")]
    public void Steps_that_do_not_fit_are_refused(int parties, int steps, string code) =>
        Assert.Equal([code], Resource.Prepare(Model(Steps(steps + 1)), parties).Findings.Select(f => f.Code));

    [Fact]
    public void Couplings_of_another_size_are_refused()
    {
        ExchangeStep[] steps = Steps(3);
        steps[0] = steps[0] with { Couplings = new double[3, 3] };
        Assert.Equal(["D043"], Resource.Prepare(Model(steps), 3).Findings.Select(f => f.Code));
    }

    private static double LastStep(int n, double time, double phase)
    {
        ExchangeStep[] steps = Steps(n);
        steps[^1] = steps[^1] with { TimeError = time, PhaseError = phase };
        return Fidelity(steps, n);
    }

    private static double Fidelity(ExchangeStep[] steps, int n)
    {
        Complex[] ideal = AntisymmetricState.Ket(n);
        Complex[] ket = Resource.Prepare(Model(steps), n).Value!.Ket!;
        Complex overlap = ideal.Zip(ket, (a, b) => Complex.Conjugate(a) * b).Aggregate(Complex.Add);
        return overlap.Magnitude * overlap.Magnitude;
    }

    private static ResourceModel Model(ExchangeStep[] steps) => new(new ExchangePreparation(steps), 0);

    private static ExchangeStep[] Steps(int n) => [.. Enumerable.Range(2, n - 1).Select(m => new ExchangeStep(0, 0, Ones(m)))];

    private static double[,] Ones(int m)
    {
        double[,] couplings = new double[m, m];
        for (int i = 0; i < m; i++)
        {
            for (int k = 0; k < m; k++)
                couplings[i, k] = i == k ? 0 : 1;
        }

        return couplings;
    }
}
