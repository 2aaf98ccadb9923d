using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Timeline;

namespace ResourceCheck.Numerics;

/// <summary>
/// Turns the noise of one site into a map on its operator space. Dynamics: populations follow the classical rate equation
/// (matrix exponential), the coherence between a and b falls with exp(-((Γ_a+Γ_b)/2 + (ℓ_a+ℓ_b)/2 + φ_ab + r) t), where Γ is the
/// total rate of jumps out of a level, ℓ of leakage, φ pure dephasing, r the depolarising rate
/// (Lindblad form; amplitude-damping limit as in Nielsen and Chuang, ch. 8).
/// </summary>
internal static class LocalNoise
{
    /// <summary>The map of a noise step, its parts in the order of <see cref="SiteNoise"/>.</summary>
    public static SiteMap Map(OperatorBasis basis, SiteNoise noise)
    {
        SiteMap? map = null;
        foreach (SiteMap part in Parts(basis, noise))
            map = part.After(map);
        return map ?? SiteMap.Identity(basis.Dimension);
    }

    /// <summary>ρ → (1-p)ρ + p 1/d on the levels; a lost qudit stays lost.</summary>
    public static SiteMap Depolarising(OperatorBasis basis, double p)
    {
        SiteMap map = SiteMap.Identity(basis.Dimension);
        for (int i = 1; i < basis.OperatorCount; i++)
            map.Entries[(i * basis.Dimension) + i] = 1 - p;
        return map;
    }

    private static IEnumerable<SiteMap> Parts(OperatorBasis basis, SiteNoise noise)
    {
        if (noise.Dynamics is { IsStill: false } dynamics && noise.Time.Seconds > 0)
            yield return Dynamics(basis, dynamics, noise.Time.Seconds);
        if (noise.LeakageProbability is { } leakage && leakage.Any(p => p > 0))
            yield return Transmission(basis, [.. leakage.Select(p => 1 - p)]);
        if (noise.Rotation is { } rotation)
            yield return basis.FromUnitary(rotation);
        if (noise.PhaseFactors is { } factors)
            yield return Coherences(basis, (a, b) => factors[a, b]);
        if (noise.Dephasing > 0)
            yield return Coherences(basis, (_, _) => 1 - noise.Dephasing);
        if (noise.Depolarising > 0)
            yield return Depolarising(basis, noise.Depolarising);
        if (noise.Kraus is { } kraus)
            yield return WithoutLoss(basis, basis.FromKraus(kraus));
        if (noise.Transmission is { } transmission && transmission.Any(t => t < 1))
            yield return Transmission(basis, transmission);
    }

    /// <summary>Level a keeps its qudit with probability t_a; amplitudes are multiplied by √t_a, the rest goes to the sink.</summary>
    private static SiteMap Transmission(OperatorBasis basis, double[] t)
    {
        Complex[,] amplitude = new Complex[basis.Levels, basis.Levels];
        for (int a = 0; a < basis.Levels; a++)
            amplitude[a, a] = Math.Sqrt(t[a]);
        return basis.FromKraus([amplitude]);
    }

    private static SiteMap Coherences(OperatorBasis basis, Func<int, int, double> factor)
    {
        SiteMap map = SiteMap.Identity(basis.Dimension);
        for (int i = basis.Levels; i < basis.OperatorCount; i++)
        {
            (int a, int b, _) = basis.Element(i)[0];
            map.Entries[(i * basis.Dimension) + i] = factor(a, b);
        }

        return map;
    }

    /// <summary>User-given operators are complete to 1e-9; what that leaves open must not appear as loss.</summary>
    private static SiteMap WithoutLoss(OperatorBasis basis, SiteMap map)
    {
        if (basis.HasSink)
            Array.Clear(map.Entries, basis.OperatorCount * basis.Dimension, basis.OperatorCount);
        return map;
    }

    private static SiteMap Dynamics(OperatorBasis basis, LocalDynamics dynamics, double t)
    {
        double[] outflow = Outflow(dynamics);
        SiteMap map = Coherences(basis, (a, b) => Math.Exp(
            -(((outflow[a] + outflow[b] + dynamics.Leakage[a] + dynamics.Leakage[b]) / 2) + dynamics.Dephasing[a, b] + dynamics.DepolarisingRate) * t));
        FillPopulations(basis, map, MatrixExponential.Of(RateMatrix(dynamics, outflow, t)));
        return map;
    }

    private static double[] Outflow(LocalDynamics dynamics)
    {
        int d = dynamics.Leakage.Length;
        return [.. Enumerable.Range(0, d).Select(a => Enumerable.Range(0, d).Sum(b => dynamics.Jumps[a, b]))];
    }

    /// <summary>Rate matrix of the d level populations and, last, the sink, times t; columns sum to 0.</summary>
    private static double[,] RateMatrix(LocalDynamics dynamics, double[] outflow, double t)
    {
        int d = outflow.Length;
        double[,] rates = new double[d + 1, d + 1];
        for (int a = 0; a < d; a++)
        {
            for (int b = 0; b < d; b++)
                rates[b, a] += (dynamics.Jumps[a, b] + (dynamics.DepolarisingRate / d)) * t;
            rates[a, a] -= (outflow[a] + dynamics.Leakage[a] + dynamics.DepolarisingRate) * t;
            rates[d, a] = dynamics.Leakage[a] * t;
        }

        return rates;
    }

    /// <summary>Writes a map of populations, given between levels (and the sink, last), into the diagonal operators' block.</summary>
    private static void FillPopulations(OperatorBasis basis, SiteMap map, double[,] populations)
    {
        int d = basis.Levels, n = basis.Dimension;
        for (int j = 0; j < d; j++)
        {
            double[] image = new double[d + 1];
            foreach ((int a, _, Complex weight) in basis.Element(j))
            {
                for (int b = 0; b <= d; b++)
                    image[b] += populations[b, a] * weight.Real;
            }

            for (int i = 0; i < d; i++)
                map.Entries[(i * n) + j] = DiagonalComponent(basis, i, image);
            if (basis.HasSink)
                map.Entries[(basis.OperatorCount * n) + j] = image[d];
        }
    }

    private static double DiagonalComponent(OperatorBasis basis, int index, double[] populations)
    {
        double sum = 0;
        foreach ((int a, _, Complex weight) in basis.Element(index))
            sum += weight.Real * populations[a];
        return sum;
    }
}
