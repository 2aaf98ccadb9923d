using System.Numerics;
using ResourceCheck.Conditions;
using ResourceCheck.Numerics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Tests.Reference;

/// <summary>The world that a table row describes, built without a conditions file: flights of one second with the row's noise.</summary>
internal static class TableWorld
{
    public static World Of(TableRow row, int parties) => World.Ideal(parties, row.N) with
    {
        Resource = new ResourceModel(new IdealPreparation(), row.Number("white", 0)),
        Parties = [.. Enumerable.Range(0, parties).Select(p => p < row.N ? Party(row, p) : PartyWorld.Ideal(row.N))],
    };

    private static PartyWorld Party(TableRow row, int party) => PartyWorld.Ideal(row.N) with
    {
        Flight = Flight(row, party),
        Waiting = After(row, party),
        Detection = Detection(row, party),
    };

    private static FlightModel Flight(TableRow row, int party) => FlightModel.Ideal(row.N) with
    {
        Time = Duration.FromSeconds(1),
        Dynamics = Dynamics(row, party),
        Rotation = Rotation(row.Of("rotation", party), row.N),
        PhaseFactors = Engines.RandomWorld.PhaseFactors(row.Number("phaseNoise", party), row.N),
        Dephasing = row.Number("dephasing", party),
        Depolarising = row.Number("depolarising", party),
        Transmission = row.Of("transmission", party) is { } t ? [.. t.Split(',').Select(TableRow.Number)] : [.. Enumerable.Repeat(1.0, row.N)],
    };

    private static LocalDynamics Dynamics(TableRow row, int party)
    {
        LocalDynamics dynamics = LocalDynamics.Still(row.N);
        foreach (string entry in Entries(row.Of("jumps", party)))
            dynamics.Jumps[entry[0] - '0', entry[2] - '0'] += TableRow.Number(entry[4..]);
        foreach (string entry in Entries(row.Of("dephase", party)))
        {
            dynamics.Dephasing[entry[0] - '0', entry[2] - '0'] += TableRow.Number(entry[4..]);
            dynamics.Dephasing[entry[2] - '0', entry[0] - '0'] += TableRow.Number(entry[4..]);
        }

        return dynamics with { DepolarisingRate = row.Number("depolarisingRate", party) };
    }

    private static string[] Entries(string? text) => text?.Split(',') ?? [];

    /// <summary>exp(-iθ diag(0 … d-1)) for <c>clock:θ</c>, the real rotation of two levels for <c>i-k:θ</c>.</summary>
    private static Complex[,]? Rotation(string? text, int d)
    {
        if (text is null)
            return null;
        double angle = TableRow.Number(text[(text.IndexOf(':') + 1)..]);
        Complex[,] u = MatrixMath.Identity(d);
        if (text.StartsWith("clock", StringComparison.Ordinal))
        {
            for (int l = 0; l < d; l++)
                u[l, l] = Complex.FromPolarCoordinates(1, -angle * l);
            return u;
        }

        (int i, int k) = (text[0] - '0', text[2] - '0');
        (u[i, i], u[k, k], u[i, k], u[k, i]) = (Math.Cos(angle), Math.Cos(angle), -Math.Sin(angle), Math.Sin(angle));
        return u;
    }

    /// <summary>Noise behind the correction: one Kraus map, taken in the wait that the script adds for it.</summary>
    private static HoldingModel After(TableRow row, int party)
    {
        bool any = row.Parameters.Keys.Any(k => k.StartsWith("after.", StringComparison.Ordinal));
        return any && party < row.N - 1 ? HoldingModel.Ideal(row.N) with { Kraus = AfterOperators(row, party) } : HoldingModel.Ideal(row.N);
    }

    private static Complex[][,] AfterOperators(TableRow row, int party)
    {
        Complex[,] rotation = Rotation(row.Of("after.rotation", party), row.N) ?? MatrixMath.Identity(row.N);
        return [.. Depolarising(row.Number("after.depolarising", party), row.N)
            .SelectMany(p => Dephasing(row.Number("after.dephasing", party), row.N).Select(k => MatrixMath.Multiply(p, MatrixMath.Multiply(k, rotation))))];
    }

    private static IEnumerable<Complex[,]> Dephasing(double x, int d)
    {
        yield return Scaled(MatrixMath.Identity(d), Math.Sqrt(1 - x));
        for (int a = 0; a < d; a++)
        {
            Complex[,] projector = new Complex[d, d];
            projector[a, a] = Math.Sqrt(x);
            yield return projector;
        }
    }

    /// <summary>ρ → (1-p)ρ + p 1/d as a uniform mixture of shifts and clocks.</summary>
    private static IEnumerable<Complex[,]> Depolarising(double p, int d)
    {
        for (int k = 0; k < d * d; k++)
        {
            double weight = (p / (d * d)) + (k == 0 ? 1 - p : 0);
            yield return Scaled(MatrixMath.Multiply(LocalUnitaries.Shift(d, k / d), LocalUnitaries.Clock(d, k % d)), Math.Sqrt(weight));
        }
    }

    private static Complex[,] Scaled(Complex[,] m, double factor)
    {
        Complex[,] result = new Complex[m.GetLength(0), m.GetLength(1)];
        for (int i = 0; i < m.GetLength(0); i++)
        {
            for (int j = 0; j < m.GetLength(1); j++)
                result[i, j] = m[i, j] * factor;
        }

        return result;
    }

    private static DetectionModel Detection(TableRow row, int party)
    {
        double confusion = row.Number("detection.confusion", party);
        double[,] matrix = new double[row.N, row.N];
        for (int i = 0; i < row.N; i++)
        {
            for (int j = 0; j < row.N; j++)
                matrix[i, j] = i == j ? 1 - confusion : confusion / (row.N - 1);
        }

        return new DetectionModel(Duration.Zero, matrix, row.Number("detection.efficiency", party, 1), row.Number("detection.dark", party));
    }
}
