namespace ResourceCheck.Conditions.Resolving;

/// <summary>Builds <see cref="LocalDynamics"/> from the keys of <c>levels</c>, <c>waiting</c> and <c>flight</c>.</summary>
internal sealed class DynamicsBuilder(LevelOrder order, Findings findings)
{
    /// <summary>Decay, coherence, thermal exchange, leakage rates and depolarising of a section, in the script's order of levels.</summary>
    public LocalDynamics Build(GroupSetting? section)
    {
        if (section is null)
            return LocalDynamics.Still(order.Levels);
        double[,] jumps = new double[order.Levels, order.Levels];
        AddDecay(section, jumps);
        AddThermal(section, jumps);
        double[] leakage = Leakage(section, "rate");
        double[,] dephasing = new Coherences(order, findings).Dephasing(section, jumps, leakage);
        return new LocalDynamics(order.ToScript(jumps), order.ToScript(dephasing), order.ToScript(leakage), section.Number("depolarisingRate", 0));
    }

    /// <summary>What leaks from each physical level, by <c>rate</c> or <c>probability</c>; several entries for one level add up as rates, and combine as chances.</summary>
    public double[] Leakage(GroupSetting section, string key)
    {
        double[] leakage = new double[order.Levels];
        foreach (GroupSetting entry in section.Groups("leakage"))
        {
            if (order.Check(entry.Find("from")) is { } from && entry.NumberOf(key) is { } number)
                leakage[from] = key == "rate" ? leakage[from] + number.Value : leakage[from] + (number.Value * (1 - leakage[from]));
        }

        return leakage;
    }

    /// <summary>Two noises that act at the same time.</summary>
    public static LocalDynamics Together(LocalDynamics a, LocalDynamics b) =>
        new(Add(a.Jumps, b.Jumps), Add(a.Dephasing, b.Dephasing), [.. a.Leakage.Zip(b.Leakage, (x, y) => x + y)], a.DepolarisingRate + b.DepolarisingRate);

    private static double[,] Add(double[,] a, double[,] b)
    {
        double[,] sum = (double[,])a.Clone();
        for (int i = 0; i < sum.GetLength(0); i++)
        {
            for (int j = 0; j < sum.GetLength(1); j++)
                sum[i, j] += b[i, j];
        }

        return sum;
    }

    private void AddDecay(GroupSetting section, double[,] jumps)
    {
        foreach (GroupSetting entry in section.Groups("decay"))
        {
            int? from = order.Check(entry.Find("from"));
            foreach ((int to, double share, Json.Spot spot) in Branches.Of(entry))
            {
                if (order.Check(to, spot, entry.Path) is not null && from is not null)
                    jumps[from.Value, to] += share * Branches.RateOf(entry);
            }
        }
    }

    private void AddThermal(GroupSetting section, double[,] jumps)
    {
        foreach (GroupSetting entry in section.Groups("thermal"))
        {
            int?[] levels = [.. ((ListSetting)entry.Find("levels")!).Items.Select(order.Check)];
            if (levels is not [{ } upper, { } lower])
                continue;
            double rate = entry.Number("rate", 0);
            jumps[upper, lower] += rate;
            jumps[lower, upper] += rate * entry.Number("ratio", 0);
        }
    }
}
