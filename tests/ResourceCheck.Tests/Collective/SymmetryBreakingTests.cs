using ResourceCheck.Numerics.Collective;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class SymmetryBreakingTests
{
    /// <summary>A chain of three: the ends see each other least, and the two neighbouring pairs are alike.</summary>
    [Fact]
    public void In_a_chain_of_three_the_ends_break_the_symmetry()
    {
        Couplings c = Couplings.From(EmitterShape.Chain(3, 0.05), CollectiveCases.Equal(3));
        SymmetryBreaking found = SymmetryBreaking.Of(c, 0.05)!;
        Assert.Equal((0, 2), (found.First, found.Second));
        Assert.Equal(c.Shift[0][0, 2], found.Shift);
        Assert.True(found.MovedWithoutPhoton > 0.05);
        Assert.True(found.AllMean.Fidelity > found.Stored.Fidelity);
        Assert.True(found.AllMean.ConditionalFidelity > 0.95);
    }

    /// <summary>One emitter out of place: the pair that came nearer is named whatever its numbers are.</summary>
    [Theory]
    [InlineData(0, 1)]
    [InlineData(1, 2)]
    [InlineData(0, 2)]
    public void The_pair_that_stands_out_is_named(int first, int second)
    {
        double[,] Shifts(double odd)
        {
            double[,] omega = { { 0, 2, 2 }, { 2, 0, 2 }, { 2, 2, 0 } };
            omega[first, second] = omega[second, first] = odd;
            return omega;
        }

        double[,] gamma = { { 1, 0.9, 0.9 }, { 0.9, 1, 0.9 }, { 0.9, 0.9, 1 } };
        Couplings c = Couplings.FromMatrices([gamma, gamma], [Shifts(2.1), Shifts(5)]);
        SymmetryBreaking found = SymmetryBreaking.Of(c, 1)!;
        Assert.Equal((first, second, 2), (found.First, found.Second, found.Transition));
        Assert.Equal((5.0, 3.0, 2.0), (found.Shift, found.MeanShift, found.Deviation));
        Assert.True(found.WithMean.Fidelity > found.Stored.Fidelity);
        Assert.Equal(1, found.AllMean.ConditionalFidelity, 1e-10);
    }

    [Fact]
    public void A_triangle_is_not_moved_and_a_point_has_no_shifts()
    {
        SymmetryBreaking triangle = SymmetryBreaking.Of(Couplings.From(EmitterShape.Ring(3, 0.05), CollectiveCases.Equal(3)), 1)!;
        Assert.Equal(0, triangle.MovedWithoutPhoton, 1e-10);
        Assert.Equal(0, triangle.Deviation, 1e-10);
        Assert.Null(SymmetryBreaking.Of(Couplings.From(EmitterShape.Point(4), CollectiveCases.Equal(4)), 1));
        Assert.Null(SymmetryBreaking.Of(Couplings.From(EmitterShape.Pair(0.1), CollectiveCases.Equal(2)), 1));
    }
}
