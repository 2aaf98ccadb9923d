using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Numerics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Tests.Engines;

/// <summary>Worlds with every local noise on, drawn from a seed.</summary>
internal static class RandomWorld
{
    public static World Of(int seed, int parties, int levels, bool lossy)
    {
        Random random = new(seed);
        double[,] delay = new double[parties, parties];
        for (int i = 0; i < parties * parties; i++)
            delay[i / parties, i % parties] = i / parties == i % parties ? 0 : random.NextDouble() * 2;
        return new World
        {
            Levels = levels,
            Resource = new ResourceModel(new IdealPreparation(), random.NextDouble() * 0.3),
            Parties = [.. Enumerable.Range(0, parties).Select(_ => Party(random, levels, lossy))],
            Messages = new MessageModel(delay, new double[parties, parties]),
        };
    }

    private static PartyWorld Party(Random random, int levels, bool lossy) => new()
    {
        Interface = new InterfaceModel(lossy ? 0.8 + (0.2 * random.NextDouble()) : 1, random.NextDouble() * 0.1),
        Flight = new FlightModel
        {
            Time = Duration.FromSeconds(random.NextDouble()),
            Dynamics = Dynamics(random, levels, lossy),
            LeakageProbability = [.. Enumerable.Range(0, levels).Select(_ => lossy ? random.NextDouble() * 0.1 : 0)],
            Rotation = Unitary(random, levels),
            PhaseFactors = PhaseFactors(random.NextDouble(), levels),
            Dephasing = random.NextDouble() * 0.3,
            Depolarising = random.NextDouble() * 0.3,
            Kraus = RandomKraus(random, levels),
            Transmission = [.. Enumerable.Range(0, levels).Select(_ => lossy ? 0.5 + (0.5 * random.NextDouble()) : 1)],
            Heralded = random.Next(2) == 0,
        },
        Waiting = new HoldingModel { Dynamics = Dynamics(random, levels, lossy), LeakageProbability = new double[levels], Kraus = RandomKraus(random, levels) },
        Operations = new OperationModel(Duration.FromSeconds(random.NextDouble()), random.NextDouble() * 0.2, random.NextDouble() * 0.2),
        Detection = new DetectionModel(Duration.FromSeconds(random.NextDouble()), Stochastic(random, levels), lossy ? random.NextDouble() : 1, random.NextDouble() * 0.2),
    };

    /// <summary>exp(-σ²(a-b)²/2).</summary>
    public static double[,] PhaseFactors(double sigma, int levels)
    {
        double[,] factors = new double[levels, levels];
        for (int i = 0; i < levels * levels; i++)
            factors[i / levels, i % levels] = Math.Exp(-sigma * sigma * ((i / levels) - (i % levels)) * ((i / levels) - (i % levels)) / 2);
        return factors;
    }

    public static LocalDynamics Dynamics(Random random, int levels, bool leaking)
    {
        LocalDynamics dynamics = LocalDynamics.Still(levels);
        double rate = random.NextDouble();
        for (int a = 0; a < levels; a++)
        {
            dynamics.Leakage[a] = leaking ? random.NextDouble() * 0.2 : 0;
            for (int b = 0; b < levels; b++)
            {
                dynamics.Jumps[a, b] = a == b ? 0 : random.NextDouble();
                dynamics.Dephasing[a, b] = a == b ? 0 : rate;
            }
        }

        return dynamics with { DepolarisingRate = random.NextDouble() };
    }

    public static double[,] Stochastic(Random random, int levels)
    {
        double[,] matrix = new double[levels, levels];
        for (int a = 0; a < levels; a++)
        {
            double[] row = [.. Enumerable.Range(0, levels).Select(b => random.NextDouble() + (a == b ? 5 : 0))];
            for (int b = 0; b < levels; b++)
                matrix[a, b] = row[b] / row.Sum();
        }

        return matrix;
    }

    /// <summary>Gram–Schmidt on random columns.</summary>
    public static Complex[,] Unitary(Random random, int n)
    {
        Complex[,] u = Matrix(random, n);
        for (int k = 0; k < n; k++)
        {
            for (int earlier = 0; earlier < k; earlier++)
            {
                Complex overlap = Enumerable.Range(0, n).Aggregate(Complex.Zero, (s, r) => s + (Complex.Conjugate(u[r, earlier]) * u[r, k]));
                for (int r = 0; r < n; r++)
                    u[r, k] -= overlap * u[r, earlier];
            }

            double norm = Math.Sqrt(Enumerable.Range(0, n).Sum(r => u[r, k].Magnitude * u[r, k].Magnitude));
            for (int r = 0; r < n; r++)
                u[r, k] /= norm;
        }

        return u;
    }

    public static Complex[,] Matrix(Random random, int n)
    {
        Complex[,] m = new Complex[n, n];
        for (int i = 0; i < n * n; i++)
            m[i / n, i % n] = new Complex(random.NextDouble() - 0.5, random.NextDouble() - 0.5);
        return m;
    }

    /// <summary>A mixture of unitaries.</summary>
    private static Complex[][,] RandomKraus(Random random, int n)
    {
        double p = random.NextDouble();
        return [.. new[] { Math.Sqrt(p), Math.Sqrt(1 - p) }.Select(w => MatrixMath.Multiply(Diagonal(w, n), Unitary(random, n)))];
    }

    private static Complex[,] Diagonal(double value, int n)
    {
        Complex[,] m = new Complex[n, n];
        for (int i = 0; i < n; i++)
            m[i, i] = value;
        return m;
    }
}
