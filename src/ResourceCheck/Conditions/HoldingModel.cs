using System.Numerics;

namespace ResourceCheck.Conditions;

/// <summary>What acts on a qudit that is held after arrival.</summary>
public sealed record HoldingModel
{
    /// <summary>Acts for as long as the qudit is held.</summary>
    public required LocalDynamics Dynamics { get; init; }

    /// <summary>d: probability that level a leaks, once per spell of waiting that is longer than zero.</summary>
    public required double[] LeakageProbability { get; init; }

    /// <summary>Kraus operators, each d×d, that act once per spell of waiting that is longer than zero; null when there are none.</summary>
    public IReadOnlyList<Complex[,]>? Kraus { get; init; }

    /// <summary>A perfect memory.</summary>
    public static HoldingModel Ideal(int levels) => new() { Dynamics = LocalDynamics.Still(levels), LeakageProbability = new double[levels] };
}
