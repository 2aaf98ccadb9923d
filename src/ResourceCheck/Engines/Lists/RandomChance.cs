using ResourceCheck.Numerics.Randomness;

namespace ResourceCheck.Engines.Lists;

/// <summary>Random events of one simulated run.</summary>
internal sealed class RandomChance(Xoshiro256 stream) : IChance
{
    public int Pick(ReadOnlySpan<double> weights)
    {
        double whole = 0;
        foreach (double weight in weights)
            whole += weight;
        double left = stream.NextUnit() * whole;
        int last = 0;
        for (int i = 0; i < weights.Length; i++)
        {
            if (weights[i] == 0)
                continue;
            last = i;
            left -= weights[i];
            if (left < 0)
                return i;
        }

        return last; // rounding may leave a little over
    }
}
