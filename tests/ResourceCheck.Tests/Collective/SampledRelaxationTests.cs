using System.Numerics;
using ResourceCheck.Numerics.Collective;
using Xunit;

namespace ResourceCheck.Tests.Collective;

/// <summary>Trajectories and single state vectors against the density operator, where both fit.</summary>
public sealed class SampledRelaxationTests
{
    private const ulong Seed = 11;
    private static readonly double[] Times = [0, 0.2, 0.5, 0.9];

    [Theory]
    [InlineData(new[] { 0, 0, 0, 0 })]
    [InlineData(new[] { 0, 0, 2, 3 })]
    public void Copies_without_a_photon_are_those_of_the_density_operator(int[] levels)
    {
        Complex[] start = StartStates.Product(levels, 4);
        IReadOnlyList<RelaxationFigures> expected = Relaxation.Follow(CollectiveCases.Uneven(4), StartStates.Operator(start), Times, photons: false, cancellation: TestContext.Current.CancellationToken).Figures;
        AssertClose(expected, new SampledRelaxation(CollectiveCases.Uneven(4), start).WithoutPhoton(Times));
    }

    /// <summary>Intervals hold with 1 - 1e-9 each, so that a miss is an error and not bad luck.</summary>
    [Fact]
    public void What_photons_add_covers_the_difference_to_the_density_operator()
    {
        Complex[] start = StartStates.Inverted(3, 3);
        SampledRelaxation relaxation = new(CollectiveCases.General, start);
        Assert.False(relaxation.NothingToSample);
        IReadOnlyList<RelaxationFigures> all = Relaxation.Follow(CollectiveCases.General, StartStates.Operator(start), Times, cancellation: TestContext.Current.CancellationToken).Figures, quiet = relaxation.WithoutPhoton(Times);
        var rest = relaxation.WithPhotons(Times, Seed, 3000, 1 - 1e-9, TestContext.Current.CancellationToken);
        for (int i = 0; i < Times.Length; i++)
        {
            AssertCovers(all[i].Population - quiet[i].Population, rest[i].Population);
            AssertCovers(all[i].Symmetric - quiet[i].Symmetric, rest[i].Symmetric);
            AssertCovers((all[i].Excitations - quiet[i].Excitations) / 3, rest[i].Excited);
        }

        Assert.True(rest[2].Population.Mean > 0.001 && rest[2].Symmetric.Mean > 0.001);
    }

    /// <summary>A pair beside emitters in lower levels holds one excitation: after a photon nothing is left to ask for.</summary>
    [Fact]
    public void One_excitation_needs_no_samples()
    {
        Complex[] start = StartStates.Pair([2, 3], 4);
        SampledRelaxation relaxation = new(CollectiveCases.Uneven(4), start);
        Assert.True(relaxation.NothingToSample);
        IReadOnlyList<RelaxationFigures> all = Relaxation.Follow(CollectiveCases.Uneven(4), StartStates.Operator(start), Times, cancellation: TestContext.Current.CancellationToken).Figures, quiet = relaxation.WithoutPhoton(Times);
        Assert.All(all.Zip(quiet), pair =>
        {
            Assert.Equal(pair.First.Population, pair.Second.Population, 1e-10);
            Assert.Equal(pair.First.Symmetric, pair.Second.Symmetric, 1e-10);
            Assert.Equal(pair.First.Excitations, pair.Second.Excitations, 1e-10);
        });
    }

    [Fact]
    public void The_same_seed_gives_the_same_means_and_another_seed_others()
    {
        SampledRelaxation relaxation = new(CollectiveCases.General, StartStates.Inverted(3, 3));
        double[] Sampled(ulong seed) => [.. relaxation.WithPhotons(Times, seed, 50, 0.99, TestContext.Current.CancellationToken).Select(r => r.Excited.Mean)];
        Assert.Equal(Sampled(1), Sampled(1));
        Assert.NotEqual(Sampled(1), Sampled(2));
    }

    /// <summary>Six emitters at one point: relaxation keeps |S_6⟩'s share of the start for ever, and the pair start has 1/360 of it.</summary>
    [Fact]
    public void At_one_point_the_share_of_the_antisymmetric_state_stays()
    {
        Couplings c = Couplings.From(EmitterShape.Point(6), CollectiveCases.Equal(6));
        IReadOnlyList<RelaxationFigures> figures = new SampledRelaxation(c, StartStates.Pair([2, 3, 4, 5], 6)).WithoutPhoton([0, 1, 50]);
        Assert.All(figures, f => Assert.Equal(2.0 / 720, f.Population, 1e-10));
        Assert.Equal(0, figures[0].Symmetric, 1e-15);
    }

    private static void AssertCovers(double expected, SampledMean mean)
    {
        Assert.InRange(expected, mean.Low - 1e-9, mean.High + 1e-9);
        Assert.InRange(expected, mean.Mean - (6 * mean.StandardError) - 1e-9, mean.Mean + (6 * mean.StandardError) + 1e-9);
    }

    private static void AssertClose(IReadOnlyList<RelaxationFigures> expected, IReadOnlyList<RelaxationFigures> actual)
    {
        Assert.Equal(expected.Count, actual.Count);
        Assert.All(expected.Zip(actual), pair =>
        {
            Assert.Equal(pair.First.Population, pair.Second.Population, 1e-10);
            Assert.Equal(pair.First.Symmetric, pair.Second.Symmetric, 1e-10);
            Assert.Equal(pair.First.Kept, pair.Second.Kept, 1e-10);
            Assert.Equal(pair.First.Excitations, pair.Second.Excitations, 1e-10);
        });
    }
}
