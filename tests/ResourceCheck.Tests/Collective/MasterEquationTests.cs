using System.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Numerics.States;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class MasterEquationTests
{
    /// <summary>SciPy's expm_multiply on the full Liouvillian; see tests/reference/collective.py.</summary>
    [Fact]
    public void Density_operators_agree_with_the_table()
    {
        TableRow[] rows = [.. TableRow.Of("collective").Where(r => r.Parameters.ContainsKey("start") && r.Kind != "population")];
        Assert.True(rows.Length > 40);
        foreach (IGrouping<string, TableRow> group in rows.GroupBy(r => r.Name + r.Parameters["start"]))
        {
            TableRow first = group.First();
            Couplings c = CollectiveCases.Of(first);
            Complex[] rho = new MasterEquation(c).Evolve(StartStates.Operator(Start(first, c.Levels)), first.Number("time", 0)).State;
            Assert.All(group, row => Assert.Equal(row.Value, Figure(row.Kind, rho), 1e-10));
        }
    }

    [Fact]
    public void The_derivative_is_the_written_out_master_equation()
    {
        Couplings c = CollectiveCases.General;
        Complex[] rho = Mixed(27), expected = PlainReference.Derivative(c, rho);
        const double Step = 1e-4;
        Complex[] there = new MasterEquation(c).Evolve(rho, Step).State, further = new MasterEquation(c).Evolve(rho, 2 * Step).State;
        for (int i = 0; i < rho.Length; i++)
        {
            Complex slope = ((4 * there[i]) - further[i] - (3 * rho[i])) / (2 * Step);
            Assert.Equal(0, (slope - expected[i]).Magnitude, 1e-5 * 1e-1);
        }
    }

    [Fact]
    public void Trace_hermiticity_and_positivity_stay()
    {
        Complex[] rho = new MasterEquation(CollectiveCases.General).Evolve(Mixed(27), 1.7).State;
        Assert.Equal(1, HermitianMatrix.Trace(rho, 27).Real, 1e-11);
        Assert.Equal(0, HermitianMatrix.LargestAsymmetry(rho, 27).Deviation, 1e-15);
        Assert.True(HermitianMatrix.Eigenvalues(rho, 27)[0] > -1e-12);
    }

    [Fact]
    public void Evolving_twice_is_evolving_for_the_sum_of_times()
    {
        MasterEquation equation = new(CollectiveCases.Uneven(3));
        Complex[] rho = StartStates.Operator(StartStates.Pair([0, 2], 3));
        Complex[] twice = equation.Evolve(equation.Evolve(rho, 0.4).State, 0.8).State, once = equation.Evolve(rho, 1.2).State;
        Assert.Equal(once, twice, (a, b) => (a - b).Magnitude < 1e-11);
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void Permutation_space_and_master_equation_agree(int n)
    {
        foreach (Transition[] transitions in new[] { CollectiveCases.Equal(n), CollectiveCases.Unequal(n) })
        {
            Couplings c = Couplings.From(EmitterShape.Chain(n, 0.15), transitions);
            PhotonFreeStorage storage = PhotonFreeStorage.Antisymmetric(c);
            StorageFigures figures = storage.AdvanceTo(0.9);
            Complex[] start = StartStates.Operator(AntisymmetricState.Ket(n)), ket = storage.Ket();
            Complex[] quiet = new MasterEquation(c).Evolve(start, 0.9, photons: false).State;
            Assert.Equal(StartStates.Operator(ket), quiet, (a, b) => (a - b).Magnitude < 1e-8);
            (IReadOnlyList<RelaxationFigures> all, _) = Relaxation.Follow(c, start, [0.9], cancellation: TestContext.Current.CancellationToken);
            Assert.Equal(figures.Fidelity, all[0].Population, 1e-8);
            Assert.Equal(1, all[0].Kept, 1e-10);
            Assert.Equal(figures.NoPhoton, all[0].Excitations, 1e-8);
        }
    }

    [Fact]
    public void Five_emitters_fit()
    {
        Couplings c = Couplings.From(EmitterShape.Ring(5, 0.2), CollectiveCases.Unequal(5));
        (IReadOnlyList<RelaxationFigures> figures, _) = Relaxation.Follow(c, StartStates.Operator(AntisymmetricState.Ket(5)), [0.2], cancellation: TestContext.Current.CancellationToken);
        StorageFigures stored = PhotonFreeStorage.Antisymmetric(c).AdvanceTo(0.2);
        Assert.Equal(stored.Fidelity, figures[0].Population, 1e-8);
        Assert.Equal(stored.NoPhoton, figures[0].Excitations, 1e-8);
    }

    /// <summary>Far apart, level 0 of each emitter falls with exp(-Γ_tot t) and feeds level j by its share Γ_j/Γ_tot.</summary>
    [Fact]
    public void Independent_emitters_decay_each_alone()
    {
        Couplings c = Couplings.Independent(2, [1, 0.5]);
        Complex[] rho = new MasterEquation(c).Evolve(StartStates.Operator(StartStates.Inverted(2, 3)), 0.8).State;
        double p0 = Math.Exp(-1.2), p1 = (1 - p0) * 2 / 3, p2 = (1 - p0) / 3;
        double[] single = [p0, p1, p2];
        for (int i = 0; i < 9; i++)
            Assert.Equal(single[i / 3] * single[i % 3], rho[i * 10].Real, 1e-12);
    }

    /// <summary>R. H. Dicke, Phys. Rev. 93, 99 (1954): two inverted emitters at one point pass |+⟩ at 2Γ twice: populations e^{-2t}, 2te^{-2t}.</summary>
    [Fact]
    public void Two_inverted_emitters_at_one_point_emit_as_Dicke_found()
    {
        Couplings c = Couplings.From(EmitterShape.Point(2), [new(1, 1, CollectiveCases.Normal)]);
        Complex[] rho = new MasterEquation(c).Evolve(StartStates.Operator(StartStates.Inverted(2, 2)), 0.6).State;
        double left = Math.Exp(-1.2), between = 1.2 * left;
        Assert.Equal(left, rho[0].Real, 1e-12);
        Assert.Equal(between / 2, rho[5].Real, 1e-12);
        Assert.Equal(between / 2, rho[6].Real, 1e-12);
        Assert.Equal(1 - left - between, rho[15].Real, 1e-12);
    }

    [Fact]
    public void The_error_estimate_bounds_the_error()
    {
        MasterEquation equation = new(CollectiveCases.General);
        Complex[] rho = StartStates.Operator(StartStates.Inverted(3, 3));
        (Complex[] rough, EvolutionWork work) = equation.Evolve(rho, 1, tolerance: 1e-5);
        Complex[] fine = equation.Evolve(rho, 1, tolerance: 1e-14).State;
        double error = Math.Sqrt(rough.Zip(fine, (a, b) => Math.Pow((a - b).Magnitude, 2)).Sum());
        Assert.InRange(error, 1e-14, work.ErrorEstimate);
    }

    /// <summary>A mixed state with entries everywhere.</summary>
    private static Complex[] Mixed(int size)
    {
        Complex[] rho = new Complex[size * size];
        for (int m = 1; m <= 3; m++)
        {
            Complex[] ket = [.. Enumerable.Range(0, size).Select(i => new Complex(Math.Sin((m * i) + 1), Math.Cos(m * i * i)))];
            double norm = ket.Sum(z => z.Magnitude * z.Magnitude);
            Complex[] pure = StartStates.Operator(ket);
            for (int i = 0; i < rho.Length; i++)
                rho[i] += pure[i] / (3 * norm);
        }

        return rho;
    }

    private static Complex[] Start(TableRow row, int d) => row.Parameters["start"] == "S"
        ? AntisymmetricState.Ket(row.N)
        : StartStates.Product([.. row.Parameters["start"].Split(',').Select(level => (int)TableRow.Number(level))], d);

    private static double Figure(string kind, Complex[] rho)
    {
        int size = (int)Math.Sqrt(rho.Length);
        return kind switch
        {
            "purity" => rho.Sum(z => (z * Complex.Conjugate(z)).Real),
            "sum-of-real-parts" => rho.Sum(z => z.Real),
            "weighted-imaginary-parts" => rho.Select((z, at) => z.Imaginary * ((at / size) - (at % size))).Sum(),
            _ => rho[(int)TableRow.Number(kind["population-".Length..]) * (size + 1)].Real,
        };
    }
}
