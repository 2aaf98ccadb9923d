using System.Numerics;
using FsCheck.Xunit;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Laws of |S_N⟩ (docs/states.md), each for the prepared state.</summary>
public sealed class AntisymmetricStateTests
{
    private const double Tolerance = 1e-12;

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(6)]
    [InlineData(7)]
    public void It_has_norm_one_and_equal_weight_on_all_permutations(int n)
    {
        double[] weights = [.. Prepare(n).Ket!.Select(a => a.Magnitude * a.Magnitude).Where(w => w > 0)];
        Assert.Equal(AntisymmetricState.Factorial(n), weights.Length);
        Assert.All(weights, w => Assert.Equal(1 / AntisymmetricState.Factorial(n), w, Tolerance));
    }

    [Fact]
    public void The_first_party_is_the_most_significant_digit()
    {
        Complex[] singlet = Prepare(2).Ket!;
        Assert.Equal([0, 1 / Math.Sqrt(2), -1 / Math.Sqrt(2), 0], singlet.Select(a => a.Real));
    }

    [Fact]
    public void Nine_parties_are_refused() => Assert.Equal(["D040"], Resource.Prepare(ResourceModel.Ideal, 9).Findings.Select(f => f.Code));

    [Property(MaxTest = 30)]
    public bool The_same_matrix_on_every_party_multiplies_by_its_determinant(int seed, bool four)
    {
        int n = four ? 4 : 3;
        Complex[,] a = Matrices.Random(seed, n);
        Complex[] ket = Prepare(n).Ket!;
        Complex determinant = Matrices.Determinant(a);
        return LocalOperation.ApplyToAll(ket, n, n, a).Zip(ket, (moved, s) => Complex.Abs(moved - determinant * s)).Max() < 1e-12;
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    public void Schmidt_coefficients_across_every_cut_are_equal(int n)
    {
        foreach (Bipartition cut in Bipartition.Cuts(n, n / 2))
        {
            double subsets = Binomial(n, cut.Inside.Count(x => x));
            double[] s = [.. cut.SchmidtCoefficients(Prepare(n).Ket!, n).Where(x => x > 1e-9)];
            Assert.Equal(subsets, s.Length);
            // purity of the reduced state of k parties, 1/C(N,k)
            Assert.Equal(1 / subsets, s.Sum(x => Math.Pow(x, 4)), Tolerance);
        }
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    [InlineData(6)]
    public void Negativity_of_one_party_with_the_others_is_half_of_their_number(int n)
    {
        Bipartition[] cuts = [.. Bipartition.Cuts(n, 1)];
        Assert.Equal(n == 2 ? 1 : n, cuts.Length);
        Assert.All(cuts, cut => Assert.Equal((n - 1) / 2.0, StateFigures.Negativity(Prepare(n), cut), 1e-11));
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void Both_representations_have_the_same_figures(int n)
    {
        PreparedState ket = Prepare(n);
        PreparedState density = ket with { Ket = null, Density = Matrices.Projector(ket.Ket!) };
        Assert.All(
            new[] { ket, density },
            state =>
            {
                Assert.Equal(1, StateFigures.Fidelity(state), Tolerance);
                Assert.Equal(1, StateFigures.Purity(state), Tolerance);
                Assert.Equal(0, StateFigures.Entropy(state), 1e-10);
                Assert.Equal(0, StateFigures.LargestSingleDeviation(state), Tolerance);
                Assert.Equal(1, StateFigures.AllDistinct(state, inFourierBasis: false), Tolerance);
                Assert.Equal(1, StateFigures.AllDistinct(state, inFourierBasis: true), Tolerance);
                Assert.All(Bipartition.Cuts(n, 2), cut => Assert.Equal(StateFigures.Negativity(ket, cut), StateFigures.Negativity(state, cut), 1e-11));
            });
    }

    /// <summary>Werner, Phys. Rev. A 40, 4277 (1989): two qubits with singlet fraction F are entangled above 1/2.</summary>
    [Theory]
    [InlineData(0.3)]
    [InlineData(0.5)]
    [InlineData(0.6)]
    [InlineData(0.9)]
    public void Negativity_of_Werner_states_is_the_singlet_fraction_above_one_half(double fraction)
    {
        double w = 4 * (1 - fraction) / 3;
        Complex[] density = Matrices.WithWhiteNoise(Matrices.Projector(Prepare(2).Ket!), 4, w);
        Assert.Equal(Math.Max(0, fraction - 0.5), new Bipartition([true, false]).NegativityOfDensity(density, 2), Tolerance);
    }

    private static PreparedState Prepare(int n)
    {
        Outcome<PreparedState> prepared = Resource.Prepare(ResourceModel.Ideal, n);
        Assert.Empty(prepared.Findings);
        return prepared.Value!;
    }

    private static double Binomial(int n, int k) =>
        AntisymmetricState.Factorial(n) / AntisymmetricState.Factorial(k) / AntisymmetricState.Factorial(n - k);
}
