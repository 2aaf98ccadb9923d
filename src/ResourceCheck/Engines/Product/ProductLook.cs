using System.Numerics;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Timeline;

namespace ResourceCheck.Engines.Product;

/// <summary>A checkpoint's overlap from the sites of one history.</summary>
internal static class ProductLook
{
    /// <summary>The sum for the antisymmetric resource, prepared and not yet made.</summary>
    public static ChannelFidelity Of(CheckpointPlanStep step, ProductBranch waited, IReadOnlyList<int> holders, double[] trace)
    {
        SiteState[] sites = [.. step.Parties.Select(p => waited.Sites[p]!)];
        return ChannelFidelity.Of([.. sites.Select(s => s.Channel)], Others(step, waited, holders, trace), sites[0].Frame);
    }

    /// <summary>The overlap for white noise: each party starts, by itself, in any level.</summary>
    public static RoundedSum OfWhite(CheckpointPlanStep step, ProductBranch waited, IReadOnlyList<int> holders, double[] trace)
    {
        int m = step.Parties.Count;
        LocalOperator[] images = [.. step.Parties.Select(p => Image(waited.Sites[p]!.Channel, m))];
        return Others(step, waited, holders, trace).Aggregate(MixedDiscriminant.Of(images), (sum, a) => sum.Times(a.Trace.Real / a.Levels));
    }

    private static LocalOperator[] Others(CheckpointPlanStep step, ProductBranch waited, IReadOnlyList<int> holders, double[] trace) =>
        [.. holders.Except(step.Parties).Select(p => waited.Readings[p]?.Sum ?? waited.Sites[p]!.Pull(trace))];

    /// <summary>Φ(1/d) on the lowest m levels.</summary>
    private static LocalOperator Image(LocalChannel channel, int m)
    {
        Complex[,] image = new Complex[m, m];
        for (int i = 0; i < m * m; i++)
        {
            for (int p = 0; p < channel.Levels; p++)
                image[i / m, i % m] += channel[i / m, i % m, p, p] / channel.Levels;
        }

        return LocalOperator.Of(image);
    }
}
