using ResourceCheck.Numerics.Collective;
using Xunit;

namespace ResourceCheck.Tests.Collective;

public sealed class ChunkLoopTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(57)]
    public void Every_chunk_runs_once(int chunks)
    {
        for (int round = 0; round < 500; round++)
        {
            int[] seen = new int[chunks];
            ChunkLoop.Run(chunks, i => Interlocked.Increment(ref seen[i]));
            Assert.All(seen, times => Assert.Equal(1, times));
        }
    }

    [Fact]
    public void A_failure_reaches_the_caller()
    {
        for (int bad = 0; bad < 40; bad++)
        {
            InvalidOperationException thrown = Assert.Throws<InvalidOperationException>(() => ChunkLoop.Run(40, i => Check(i, bad)));
            Assert.Equal($"chunk {bad}", thrown.Message);
        }
    }

    private static void Check(int chunk, int bad)
    {
        if (chunk == bad)
            throw new InvalidOperationException($"chunk {bad}");
    }
}
