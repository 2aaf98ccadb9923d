using ResourceCheck.Numerics.Collective;

namespace ResourceCheck.Tests.Collective;

internal static class Trajectories
{
    /// <summary>Means over trajectories 0 … count-1 of observables within [0, 1], each with an interval of the stated confidence.</summary>
    public static IReadOnlyList<SampledMean> Average(
        this QuantumJumps jumps, double time, ulong seed, int count, double confidence, params IReadOnlyList<Func<Trajectory, double>> observables)
    {
        Trajectory[] trajectories = new Trajectory[count];
        Parallel.For(0, count, index => trajectories[index] = jumps.Run(time, seed, index));
        return [.. observables.Select(o => SampledMean.From([.. trajectories.Select(o)], confidence))];
    }
}
