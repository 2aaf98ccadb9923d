using System.Numerics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Builds the way of a qudit and what acts on it afterwards.</summary>
internal sealed class FlightBuilder(LevelOrder order, DynamicsBuilder dynamics, IReadOnlyDictionary<string, IReadOnlyList<Complex[,]>> matrices, Findings findings)
{
    /// <summary>The flight; the levels go on decaying unless an interface takes the qudit from its emitter.</summary>
    public FlightModel Build(GroupSetting? flight, LocalDynamics levels)
    {
        if (flight is null)
            return FlightModel.Ideal(order.Levels) with { Dynamics = levels };
        LocalDynamics own = dynamics.Build(flight);
        double phaseNoise = flight.Number("phaseNoise", 0);
        return new FlightModel
        {
            Length = Length.FromMetres(flight.Number("length", 0)),
            Time = TimeOf(flight),
            Dynamics = flight.Find("interface") is null ? DynamicsBuilder.Together(levels, own) : own,
            LeakageProbability = order.ToScript(dynamics.Leakage(flight, "probability")),
            Rotation = RotationOf(flight.Find("rotation") as GroupSetting),
            PhaseNoise = phaseNoise,
            PhaseFactors = phaseNoise == 0 ? null : PhaseFactors(phaseNoise),
            Dephasing = flight.Number("dephasing", 0),
            Depolarising = flight.Number("depolarising", 0),
            Kraus = KrausOf(flight),
            Transmission = TransmissionOf(flight),
            Heralded = flight.Flag("heralded"),
        };
    }

    /// <summary>What acts on a held qudit: <c>waiting</c> when it is given, else the levels' own dynamics.</summary>
    public HoldingModel Holding(GroupSetting? waiting, LocalDynamics levels) => waiting is null
        ? new HoldingModel { Dynamics = levels, LeakageProbability = new double[order.Levels] }
        : new HoldingModel
        {
            Dynamics = dynamics.Build(waiting),
            LeakageProbability = order.ToScript(dynamics.Leakage(waiting, "probability")),
            Kraus = KrausOf(waiting),
        };

    private static Duration TimeOf(GroupSetting flight)
    {
        if (flight.NumberOf("time") is { } time)
            return Duration.FromSeconds(time.Value);
        return flight.NumberOf("length") is { } length && flight.NumberOf("speed") is { } speed ? Duration.FromSeconds(length.Value / speed.Value) : Duration.Zero;
    }

    private double[] TransmissionOf(GroupSetting flight)
    {
        double decibel = (flight.Number("attenuation", 0) * flight.Number("length", 0)) + flight.Number("insertionLoss", 0);
        double common = Math.Pow(10, -decibel / 10);
        if (flight.Find("transmission") is not ListSetting list)
            return [.. Enumerable.Repeat(common * flight.Number("transmission", 1), order.Levels)];
        if (list.Items.Count == order.Levels)
            return order.ToScript([.. list.Items.Cast<NumberSetting>().Select(n => common * n.Value)]);
        findings.Add(ConditionsMessages.WrongSize(list.Spot, list.Path, list.Items.Count, order.Levels));
        return new double[order.Levels];
    }

    /// <summary>exp(-σ²(a-b)²/2) with the physical numbers of the levels.</summary>
    private double[,] PhaseFactors(double sigma)
    {
        double[,] factors = new double[order.Levels, order.Levels];
        for (int a = 0; a < order.Levels; a++)
        {
            for (int b = 0; b < order.Levels; b++)
                factors[a, b] = Math.Exp(-Math.Pow(sigma * (a - b), 2) / 2);
        }

        return order.ToScript(factors);
    }

    private IReadOnlyList<Complex[,]>? KrausOf(GroupSetting section)
    {
        if (section.Find("kraus") is not TextSetting file || !matrices.TryGetValue(file.Path, out IReadOnlyList<Complex[,]>? kraus))
            return null;
        if (kraus[0].GetLength(0) == order.Levels)
            return [.. kraus.Select(order.ToScript)];
        findings.Add(ConditionsMessages.WrongMatrixSize(file.Spot, file.Path, file.Text, kraus[0].GetLength(0), order.Levels));
        return null;
    }

    private Complex[,]? RotationOf(GroupSetting? rotation)
    {
        if (rotation?.NumberOf("angle") is not { } angle)
            return null;
        if (rotation.Find("levels") is ListSetting pair)
            return pair.Items.Select(order.Check).ToArray() is [{ } i, { } k] ? order.ToScript(Rotations.InPlane(order.Levels, i, k, angle.Value)) : null;
        if (rotation.Find("file") is not TextSetting file)
            return order.ToScript(Rotations.Clock(order.Levels, angle.Value));
        Complex[,] generator = matrices[file.Path][0];
        if (generator.GetLength(0) != order.Levels)
        {
            findings.Add(ConditionsMessages.WrongMatrixSize(file.Spot, file.Path, file.Text, generator.GetLength(0), order.Levels));
            return null;
        }

        if (Rotations.Generated(generator, angle.Value) is { } unitary)
            return order.ToScript(unitary);
        findings.Add(ConditionsMessages.RotationNotFinite(file.Spot, file.Path, file.Text));
        return null;
    }
}
