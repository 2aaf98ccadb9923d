using ResourceCheck.Conditions.Checks;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Builds the start of the shared state.</summary>
internal sealed class ResourceBuilder(int parties, string folder, Findings findings)
{
    /// <summary>One pulse and one phase per step prepare the state exactly up to four parties only (page 4).</summary>
    private const int MostByExchange = 4;

    /// <summary>The model of a section.</summary>
    public ResourceModel Build(GroupSetting? resource, LevelOrder order)
    {
        if (resource is null)
            return ResourceModel.Ideal;
        return new ResourceModel(PreparationOf(resource), resource.Number("white", 0))
        {
            PhysicalLevels = order.IsNatural ? null : order.Physical,
        };
    }

    private StatePreparation PreparationOf(GroupSetting resource)
    {
        if (resource.Find("file") is TextSetting file)
            return new FilePreparation(Path.Combine(folder, file.Text), resource.Flag("mend"));
        return resource.EntryOf("exchange") is { } exchange ? Exchange(exchange, (GroupSetting)exchange.Value) : new IdealPreparation();
    }

    private StatePreparation Exchange(Entry entry, GroupSetting exchange)
    {
        if (parties is < 2 or > MostByExchange)
        {
            findings.Add(ConditionsMessages.TooManyForExchange(entry.NameSpot, exchange.Path, parties, MostByExchange));
            return new IdealPreparation();
        }

        int steps = parties - 1;
        if (exchange.Find("steps") is not ListSetting list)
            return new ExchangePreparation([.. Enumerable.Range(1, steps).Select(s => s == steps ? Step(exchange, s + 1) : Exact(s + 1))]);
        if (list.Items.Count == steps)
            return new ExchangePreparation([.. list.Items.Select((item, s) => Step((GroupSetting)item, s + 2))]);
        findings.Add(ConditionsMessages.ExchangeSteps(list.Spot, list.Path, list.Items.Count, steps));
        return new IdealPreparation();
    }

    private static ExchangeStep Exact(int qudits)
    {
        double[,] couplings = new double[qudits, qudits];
        for (int i = 0; i < qudits; i++)
        {
            for (int k = 0; k < qudits; k++)
                couplings[i, k] = i == k ? 0 : 1;
        }

        return new ExchangeStep(0, 0, couplings);
    }

    private ExchangeStep Step(GroupSetting step, int qudits)
    {
        double[,] couplings = Exact(qudits).Couplings;
        foreach (Entry entry in (step.Find("couplings") as GroupSetting)?.Entries ?? [])
        {
            (int i, int k) = MapKeys.Pair(entry.Name, 1)!.Value;
            if (k <= qudits)
                couplings[i - 1, k - 1] = couplings[k - 1, i - 1] = ((NumberSetting)entry.Value).Value;
            else
                findings.Add(ConditionsMessages.NoSuchQudit(entry.NameSpot, entry.Value.Path, k, qudits));
        }

        return new ExchangeStep(step.Number("timeError", 0), step.Number("phaseError", 0), couplings);
    }
}
