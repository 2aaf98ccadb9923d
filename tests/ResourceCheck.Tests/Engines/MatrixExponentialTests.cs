using FsCheck.Xunit;
using ResourceCheck.Numerics;
using Xunit;

namespace ResourceCheck.Tests.Engines;

public sealed class MatrixExponentialTests
{
    /// <summary>exp of [[0,1],[-1,0]]·t is a rotation by t.</summary>
    [Theory]
    [InlineData(0.1)]
    [InlineData(3)]
    [InlineData(40)]
    public void Generator_of_rotations_gives_cosine_and_sine(double t)
    {
        double[,] e = MatrixExponential.Of(new[,] { { 0, t }, { -t, 0 } });
        Assert.Equal(Math.Cos(t), e[0, 0], 1e-12);
        Assert.Equal(Math.Sin(t), e[0, 1], 1e-12);
    }

    /// <summary>N. J. Higham, SIAM J. Matrix Anal. Appl. 26, 1179 (2005): nilpotent matrices have finite series.</summary>
    [Fact]
    public void Nilpotent_matrix_gives_its_finite_series()
    {
        double[,] e = MatrixExponential.Of(new double[,] { { 0, 2, 6 }, { 0, 0, 4 }, { 0, 0, 0 } });
        Assert.Equal(2, e[0, 1], 1e-13);
        Assert.Equal(6 + 4, e[0, 2], 1e-13);
        Assert.Equal(1, e[2, 2], 1e-13);
    }

    [Property(MaxTest = 50)]
    public bool Rate_matrices_keep_probability(int seed)
    {
        Random random = new(seed);
        double[,] rates = new double[4, 4];
        for (int i = 0; i < 16; i++)
        {
            double rate = i / 4 == i % 4 ? 0 : random.NextDouble() * 30;
            rates[i / 4, i % 4] += rate;
            rates[i % 4, i % 4] -= rate;
        }

        double[,] e = MatrixExponential.Of(rates);
        return Enumerable.Range(0, 4).All(j => Math.Abs(Enumerable.Range(0, 4).Sum(i => e[i, j]) - 1) < 1e-12 && Enumerable.Range(0, 4).All(i => e[i, j] > -1e-13));
    }
}
