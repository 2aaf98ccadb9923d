using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class CouplingTests
{
    /// <summary>A few roundings of numbers of order 1.</summary>
    private const double Rounding = 2e-15;

    /// <summary>Formulas of Lehmberg, Phys. Rev. A 2, 883 (1970), evaluated with 60 digits by tests/reference/collective.py.</summary>
    [Fact]
    public void Both_couplings_of_a_pair_agree_with_sixty_digits()
    {
        TableRow[] rows = [.. TableRow.Of("collective").Where(r => r.Name == "pair")];
        Assert.Equal(54, rows.Length);
        foreach (TableRow row in rows)
        {
            double xi = row.Number("xi", 0), c = row.Number("cosine", 0);
            double value = row.Kind == "shared-decay" ? DipoleCoupling.SharedDecay(xi, c) : DipoleCoupling.ExchangeShift(xi, c) * xi * xi * xi;
            Assert.True(Math.Abs(value - row.Value) <= Rounding * Math.Max(1, Math.Abs(row.Value) * 4), $"{row} at {xi}, {c}: {value:R}");
        }
    }

    [Property]
    public bool Shared_decay_never_exceeds_that_of_one_emitter(NormalFloat x, NormalFloat cosine)
    {
        double xi = Math.Abs(x.Get) % 100, c = Math.Tanh(cosine.Get);
        return Math.Abs(DipoleCoupling.SharedDecay(xi, c)) <= 1 + Rounding && Math.Abs(DipoleCoupling.SharedDecay(0, c) - 1) <= Rounding;
    }

    /// <summary>γ/Γ ≈ 1 - (ξ²/10)(2 - c²) from the series of sine and cosine.</summary>
    [Theory]
    [InlineData(0)]
    [InlineData(0.6)]
    [InlineData(1)]
    public void Shared_decay_falls_off_quadratically_at_small_distance(double c)
    {
        double loss = 1 - DipoleCoupling.SharedDecay(1e-3, c);
        Assert.Equal(1e-7 * (2 - (c * c)), loss, 1e-13);
    }

    [Fact]
    public void Matrices_are_symmetric_with_the_linewidth_on_the_diagonal()
    {
        Couplings c = CollectiveCases.Uneven(4);
        double[] rates = [1, 0.7, 1.3];
        for (int j = 0; j < 3; j++)
        {
            for (int i = 0; i < 4; i++)
            {
                Assert.Equal(rates[j], c.Decay[j][i, i]);
                Assert.Equal(0, c.Shift[j][i, i]);
                Assert.All(Enumerable.Range(0, 4), k => Assert.Equal((c.Decay[j][k, i], c.Shift[j][k, i]), (c.Decay[j][i, k], c.Shift[j][i, k])));
            }
        }

        Assert.Equal(3.0, c.TotalRate, 1e-15);
    }

    /// <summary>γ^j is the Gram matrix of emission into all directions: it has no negative eigenvalue.</summary>
    [Property(MaxTest = 50)]
    public bool Shared_decay_has_no_negative_rate(NormalFloat x, NormalFloat y, NormalFloat z)
    {
        double[] Place(double s) => [s + (0.1 * Math.Sin(s * x.Get)), Math.Sin(s * y.Get), s * Math.Tanh(z.Get)];
        EmitterShape shape = EmitterShape.At([Place(0.1), Place(0.3), Place(0.57), Place(1.1), [3, 0, 0]]);
        Couplings c = Couplings.From(shape, CollectiveCases.Unequal(3));
        return c.Decay.All(gamma => MathNet.Numerics.LinearAlgebra.Matrix<double>.Build.DenseOfArray(gamma).Evd().EigenValues.All(v => v.Real > -1e-12));
    }

    [Fact]
    public void Lengths_in_metres_and_in_wavelengths_give_the_same_couplings()
    {
        Couplings relative = Couplings.From(EmitterShape.Ring(4, 0.1), [new(1, 1, [1, 0, 1]), new(2, 0.7, [0, 1, 0])]);
        Couplings metres = Couplings.From(EmitterShape.Ring(4, 78e-9), [new(1, 780e-9, [1, 0, 1]), new(2, 546e-9, [0, 1, 0])]);
        for (int j = 0; j < 2; j++)
        {
            Assert.Equal(relative.Decay[j].Cast<double>(), metres.Decay[j].Cast<double>(), (a, b) => Math.Abs(a - b) < 1e-12);
            Assert.Equal(relative.Shift[j].Cast<double>(), metres.Shift[j].Cast<double>(), (a, b) => Math.Abs(a - b) < 1e-10);
        }
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(8)]
    public void Neighbours_of_a_ring_are_one_spacing_apart(int n)
    {
        EmitterShape ring = EmitterShape.Ring(n, 0.37);
        Assert.All(Enumerable.Range(0, n), i => Assert.Equal(0.37, ring.Distance(i, (i + 1) % n), 1e-14));
    }

    [Fact]
    public void Shapes_place_emitters_as_their_names_say()
    {
        Assert.Equal(0.9, EmitterShape.Chain(4, 0.3).Distance(0, 3), 1e-15);
        Assert.Equal(0.25, EmitterShape.Pair(0.25).Distance(0, 1), 1e-15);
        Couplings point = Couplings.From(EmitterShape.Point(3), CollectiveCases.Unequal(3));
        Assert.All(point.Decay, gamma => Assert.All(gamma.Cast<double>(), g => Assert.Equal(1, g)));
        Assert.All(point.Shift, omega => Assert.All(omega.Cast<double>(), w => Assert.Equal(0, w)));
    }

    [Fact]
    public void All_faults_of_a_geometry_are_found_at_once()
    {
        EmitterShape shape = EmitterShape.At([[0, 0], [0, double.NaN, 0]]);
        Transition[] transitions = [new(-1, 0, [0, 0, 0]), new(1, double.PositiveInfinity, CollectiveCases.Normal)];
        GeometryFinding[] expected =
        [
            new(GeometryFault.Position, 0, -1, 0), new(GeometryFault.Position, 1, -1, double.NaN), new(GeometryFault.Rate, 1, -1, -1),
            new(GeometryFault.Wavelength, 1, -1, 0), new(GeometryFault.Dipole, 1, -1, 0),
            new(GeometryFault.Wavelength, 2, -1, double.PositiveInfinity),
        ];
        Assert.Equal(expected, GeometryCheck.Of(shape, transitions));
    }

    [Fact]
    public void Coinciding_emitters_are_found_except_in_a_point()
    {
        double[][] places = [[0, 0, 0], [1, 0, 0], [0, 0, 0]];
        GeometryFinding found = Assert.Single(GeometryCheck.Of(EmitterShape.At(places), CollectiveCases.Equal(3)));
        Assert.Equal(new GeometryFinding(GeometryFault.Coinciding, 0, 2, 0), found);
        Assert.Empty(GeometryCheck.Of(EmitterShape.Point(3), CollectiveCases.Equal(3)));
        Assert.Empty(GeometryCheck.Of(EmitterShape.Ring(5, 0.05), CollectiveCases.Unequal(5)));
    }

    [Fact]
    public void Degenerate_transitions_with_dipoles_that_are_not_orthogonal_are_named()
    {
        Transition[] transitions = [new(1, 1, [0, 0, 2]), new(1, 1, [1, 0, 0]), new(1, 1, [0, 3, 4]), new(1, 0.9, [0, 0, 1])];
        GeometryFinding found = Assert.Single(GeometryCheck.Degenerate(transitions));
        Assert.Equal((GeometryFault.CoupledTransitions, 1, 3), (found.Kind, found.First, found.Second));
        Assert.Equal(0.8, found.Value, 1e-15);
    }

    /// <summary>
    /// 2p → 1s of hydrogen with an infinitely heavy nucleus: Γ = (2/3)^8 α^5 mc²/ħ, from the exact wave functions
    /// (H. A. Bethe and E. E. Salpeter, Quantum Mechanics of One- and Two-Electron Atoms (1957), section 63), with α, m from CODATA 2022;
    /// ⟨1s|z|2p⟩ = 2^7 √2/3^5 a_0 and ω = (3/8) α² mc²/ħ.
    /// </summary>
    [Fact]
    public void Spontaneous_rate_of_hydrogen_follows_from_its_dipole()
    {
        const double Alpha = 7.2973525643e-3, Mass = 9.1093837139e-31, C = 299792458, E = 1.602176634e-19;
        double energy = Mass * C * C, hbar = SpontaneousRate.ReducedPlanck;
        double wavelength = 2 * Math.PI * C / (0.375 * Alpha * Alpha * energy / hbar);
        double dipole = 128 * Math.Sqrt(2) / 243 * E * hbar / (Alpha * Mass * C);
        double expected = Math.Pow(2.0 / 3, 8) * Math.Pow(Alpha, 5) * energy / hbar;
        Assert.Equal(1, SpontaneousRate.From(wavelength, dipole) / expected, 1e-8);
        Assert.Equal(6.268e8, expected, 1e6);
    }
}
