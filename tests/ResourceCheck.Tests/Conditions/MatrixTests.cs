using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

public sealed class MatrixTests
{
    private static readonly Protocol Pair = TestProtocol.Of(["Ada", "Ben"]);

    [Fact]
    public void Kraus_operators_come_from_their_file()
    {
        IReadOnlyList<Complex[,]> kraus = ValleyWorld.Of("""{ "waiting": { "kraus": "flip.json" } }""", Pair, Path.Combine(ConditionsCase.Folder, "x.conditions.json")).Parties[0].Waiting.Kraus!;
        Assert.Equal(new Complex[,] { { 0.8, 0 }, { 0, 0.8 } }, kraus[0]);
        Assert.Equal(new Complex(0, 0.6), kraus[1][0, 1]);
    }

    [Fact]
    public void A_generator_is_exponentiated()
    {
        // exp(-iθ σ_y) is the real rotation by θ
        Complex[,] u = ValleyWorld.Of("""{ "flight": { "rotation": { "file": "pauli-y.json", "angle": "0.4 rad" } } }""", Pair, Path.Combine(ConditionsCase.Folder, "x.conditions.json")).Parties[0].Flight.Rotation!;
        Complex[,] expected = { { Math.Cos(0.4), -Math.Sin(0.4) }, { Math.Sin(0.4), Math.Cos(0.4) } };
        for (int a = 0; a < 2; a++)
        {
            for (int b = 0; b < 2; b++)
                Assert.True(Complex.Abs(u[a, b] - expected[a, b]) < 1e-14);
        }
    }

    [Fact]
    public void The_clock_gives_level_a_the_phase_minus_a_theta()
    {
        Complex[,] u = ValleyWorld.Of("""{ "flight": { "rotation": { "generator": "clock", "angle": "0.4 rad" } } }""").Parties[0].Flight.Rotation!;
        Assert.True(Complex.Abs(u[2, 2] - Complex.Exp(new Complex(0, -0.8))) < 1e-15);
        Assert.Equal(Complex.Zero, u[1, 2]);
    }
}
