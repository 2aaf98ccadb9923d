using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>How a party's measurements come out. Order: confusion, efficiency, dark counts.</summary>
/// <param name="Time">Duration; the qudit waits that long, then it is detected.</param>
/// <param name="Confusion">d×d, rows add up to 1: probability that true outcome (row) is read as (column).</param>
/// <param name="Efficiency">Probability that a present qudit gives a click.</param>
/// <param name="Dark">Probability that a missing click becomes a uniformly random outcome.</param>
public sealed record DetectionModel(Duration Time, double[,] Confusion, double Efficiency, double Dark)
{
    /// <summary>Instant and perfect.</summary>
    public static DetectionModel Ideal(int levels)
    {
        double[,] identity = new double[levels, levels];
        for (int i = 0; i < levels; i++)
            identity[i, i] = 1;
        return new DetectionModel(Duration.Zero, identity, 1, 0);
    }
}
