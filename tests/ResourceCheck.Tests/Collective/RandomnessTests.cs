using ResourceCheck.Numerics.Randomness;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class RandomnessTests
{
    /// <summary>First outputs of the authors' C program (Blackman and Vigna, ACM Trans. Math. Softw. 47, 36 (2021)) from state 1, 2, 3, 4.</summary>
    [Fact]
    public void Xoshiro_gives_the_published_outputs()
    {
        Xoshiro256 generator = new(1, 2, 3, 4);
        ulong[] expected =
        [
            11520, 0, 1509978240, 1215971899390074240, 1216172134540287360, 607988272756665600, 16172922978634559625,
            8476171486693032832, 10595114339597558777, 2904607092377533576,
        ];
        Assert.Equal(expected, expected.Select(_ => generator.Next()).ToArray());
    }

    /// <summary>First outputs of the mixing function of Steele, Lea and Flood, ACM SIGPLAN Notices 49, 453 (2014), from state 1234567.</summary>
    [Fact]
    public void SplitMix_gives_the_published_outputs()
    {
        SplitMix64 generator = new(1234567);
        ulong[] outputs = new ulong[5];
        for (int i = 0; i < outputs.Length; i++)
            outputs[i] = generator.Next();
        Assert.Equal([6457827717110365317, 3203168211198807973, 9817491932198370423, 4593380528125082431, 16408922859458223821], outputs);
    }

    [Fact]
    public void Streams_of_neighbouring_indices_and_seeds_differ()
    {
        HashSet<ulong> seen = [];
        for (ulong seed = 0; seed < 30; seed++)
        {
            for (ulong index = 0; index < 30; index++)
                Assert.True(seen.Add(Xoshiro256.Stream(seed, index).Next()));
        }

        Assert.Equal(Xoshiro256.Stream(5, 7).Next(), Xoshiro256.Stream(5, 7).Next());
    }

    /// <summary>Mean 1/2 with standard deviation 1/√(12n): six of them.</summary>
    [Fact]
    public void First_numbers_of_streams_are_uniform()
    {
        double[] values = [.. Enumerable.Range(0, 20000).Select(i => Xoshiro256.Stream(1, (ulong)i).NextUnit())];
        Assert.All(values, v => Assert.InRange(v, 0, 1 - 1e-17));
        Assert.Equal(0.5, values.Average(), 6 / Math.Sqrt(12 * 20000.0));
        Assert.Equal(1.0 / 3, values.Average(v => v * v), 6 * Math.Sqrt(4.0 / 45 / 20000));
    }
}
