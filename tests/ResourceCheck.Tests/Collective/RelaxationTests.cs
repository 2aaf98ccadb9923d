using System.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Tests.Reference;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class RelaxationTests
{
    [Fact]
    public void Populations_agree_with_the_table()
    {
        TableRow[] rows = [.. TableRow.Of("collective").Where(r => r.Kind == "population")];
        Assert.Equal(14, rows.Length);
        Assert.All(rows, row => Assert.Equal(row.Value, Relaxation.Follow(CollectiveCases.Of(row), Start(row), [row.Number("time", 0)], cancellation: TestContext.Current.CancellationToken).Figures[0].Population, 1e-10));
    }

    [Theory]
    [InlineData(2, 1.0 / 3)]
    [InlineData(1, 0)]
    public void A_pair_with_a_bystander_relaxes_at_one_point_to_its_dark_share(int bystander, double expected)
    {
        Couplings c = Couplings.From(EmitterShape.Point(3), [new(1, 1, CollectiveCases.Normal), new(0.8, 1, CollectiveCases.Normal)]);
        Complex[] start = StartStates.Operator(StartStates.Pair([bystander], 3));
        (IReadOnlyList<RelaxationFigures> figures, _) = Relaxation.Follow(c, start, [0, 1, 200], cancellation: TestContext.Current.CancellationToken);
        Assert.Equal(expected, figures[0].Population, 1e-14);
        Assert.Equal(expected, figures[^1].Population, 1e-9);
        RelaxationFigures heralded = Relaxation.Follow(c, start, [200], photons: false, cancellation: TestContext.Current.CancellationToken).Figures[0];
        Assert.Equal(expected, heralded.Population, 1e-9);
    }

    /// <summary>From the right start the copies without a photon end in |S_3⟩: the yield is 1/3 and the fidelity 1.</summary>
    [Fact]
    public void Heralding_on_no_photon_turns_the_dark_share_into_yield()
    {
        Couplings c = Couplings.From(EmitterShape.Point(3), CollectiveCases.Equal(3));
        RelaxationFigures figures = Relaxation.Follow(c, StartStates.Operator(StartStates.Pair([2], 3)), [60], photons: false, cancellation: TestContext.Current.CancellationToken).Figures[0];
        Assert.Equal(1.0 / 3, figures.Kept, 1e-9);
        Assert.Equal(1, figures.Fidelity, 1e-9);
    }

    [Fact]
    public void A_fully_inverted_chain_passes_the_antisymmetric_state_with_under_two_per_cent()
    {
        Couplings c = Couplings.From(EmitterShape.Chain(3, 0.3), CollectiveCases.Equal(3));
        double[] times = [.. Enumerable.Range(0, 61).Select(i => 0.05 * i)];
        (IReadOnlyList<RelaxationFigures> figures, _) = Relaxation.Follow(c, StartStates.Operator(StartStates.Inverted(3, 3)), times, cancellation: TestContext.Current.CancellationToken);
        Assert.Equal(0.017, figures.Max(f => f.Population), 0.001);
        Assert.Equal(3, figures[0].Excitations, 1e-12);
        Assert.All(figures.Zip(figures.Skip(1)), pair => Assert.True(pair.First.Excitations > pair.Second.Excitations));
    }

    private static Complex[] Start(TableRow row)
    {
        string[] parts = row.Parameters["start"].Split(',');
        int[] levels = [.. parts.Where(p => p != "pair").Select(p => (int)TableRow.Number(p))];
        return StartStates.Operator(parts[0] == "pair" ? StartStates.Pair(levels, 3) : StartStates.Product(levels, 3));
    }
}
