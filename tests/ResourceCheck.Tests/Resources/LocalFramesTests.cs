using System.Numerics;
using FsCheck.Xunit;
using MathNet.Numerics.LinearAlgebra;
using ResourceCheck.Numerics.States;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>A turned frame is found again; a real loss is not.</summary>
public sealed class LocalFramesTests
{
    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void A_turned_antisymmetric_state_is_recognised(int n)
    {
        PreparedState turned = Turned(n, 5);
        Assert.True(StateFigures.Fidelity(turned) < 0.99);
        Assert.Equal(1, StateFigures.FidelityInBestFrames(turned), 1e-8);
    }

    /// <summary>All frames give 1 - w + w/N^N at most, which the right ones reach.</summary>
    [Theory]
    [InlineData(2, 0.3)]
    [InlineData(3, 0.1)]
    [InlineData(4, 0.2)]
    public void White_noise_is_not_turned_away(int n, double w)
    {
        int size = AntisymmetricState.Power(n, n);
        Complex[] density = Matrices.WithWhiteNoise(Matrices.Projector(Turned(n, 9).Ket!), size, w);
        PreparedState state = new() { Parties = n, Levels = n, Density = density };
        Assert.Equal(1 - w + w / size, StateFigures.FidelityInBestFrames(state), 1e-8);
    }

    /// <summary>A product state overlaps with |S_N⟩ by at most 1/N!, since |⟨S|φ_1…φ_N⟩|² = |det|²/N! and Hadamard's inequality bounds the determinant.</summary>
    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void A_product_state_reaches_what_Hadamards_inequality_allows(int n)
    {
        Complex[] ket = new Complex[AntisymmetricState.Power(n, n)];
        ket[0] = 1;
        PreparedState product = new() { Parties = n, Levels = n, Ket = ket };
        Assert.Equal(1 / AntisymmetricState.Factorial(n), StateFigures.FidelityInBestFrames(product), 1e-8);
    }

    [Property(MaxTest = 10)]
    public bool It_is_never_below_the_fidelity(int seed)
    {
        PreparedState state = Turned(3, seed);
        return StateFigures.FidelityInBestFrames(state) >= StateFigures.Fidelity(state) && StateFigures.FidelityInBestFrames(state) <= 1 + 1e-9;
    }

    private static PreparedState Turned(int n, int seed)
    {
        Complex[] ket = AntisymmetricState.Ket(n);
        for (int which = 0; which < n; which++)
            ket = LocalOperation.Apply(ket, n, n, which, Matrix<Complex>.Build.DenseOfArray(Matrices.Random(unchecked(seed * 31 + which), n)).QR().Q.ToArray());
        return new() { Parties = n, Levels = n, Ket = ket };
    }
}
