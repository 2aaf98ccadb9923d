using System.Numerics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>The way of a qudit from the source to its party. Order: dynamics for the time of flight, leakage, rotation, phase noise, dephasing, depolarising, Kraus operators, loss.</summary>
public sealed record FlightModel
{
    /// <summary>Distance from the source.</summary>
    public Length Length { get; init; }

    /// <summary>Time of flight: length over speed.</summary>
    public Duration Time { get; init; }

    /// <summary>Decay on the way: the levels' own unless an interface was used, and what the flight adds.</summary>
    public required LocalDynamics Dynamics { get; init; }

    /// <summary>d: probability that level a leaks into the sink, once per flight.</summary>
    public required double[] LeakageProbability { get; init; }

    /// <summary>Fixed local unitary, d×d; null when there is none.</summary>
    public Complex[,]? Rotation { get; init; }

    /// <summary>Root-mean-square phase per level step, rad: element (a,b) falls by exp(-σ²(a-b)²/2).</summary>
    public double PhaseNoise { get; init; }

    /// <summary>
    /// d×d: the factor of each element by phase noise. Set whenever <see cref="PhaseNoise"/> is not 0, because a and b in its formula
    /// are physical levels, which may play other values of the script; null means that no element changes.
    /// </summary>
    public double[,]? PhaseFactors { get; init; }

    /// <summary>Off-diagonal elements are multiplied by 1 minus this.</summary>
    public double Dephasing { get; init; }

    /// <summary>ρ → (1-p)ρ + p 1/d.</summary>
    public double Depolarising { get; init; }

    /// <summary>Kraus operators, each d×d, complete; null when there are none.</summary>
    public IReadOnlyList<Complex[,]>? Kraus { get; init; }

    /// <summary>d: probability that level a arrives (attenuation, insertion loss and per-level transmission together). Its amplitude is multiplied by the root.</summary>
    public required double[] Transmission { get; init; }

    /// <summary>Whether copies whose qudit did not arrive are dropped.</summary>
    public bool Heralded { get; init; }

    /// <summary>A perfect, instant way.</summary>
    public static FlightModel Ideal(int levels) => new()
    {
        Dynamics = LocalDynamics.Still(levels),
        LeakageProbability = new double[levels],
        Transmission = [.. Enumerable.Repeat(1.0, levels)],
    };
}
