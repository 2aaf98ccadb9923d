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
        if (resource.Find("relaxed") is GroupSetting relaxed)
            return Relaxed(relaxed) ?? (StatePreparation)new IdealPreparation();
        return resource.EntryOf("exchange") is { } exchange ? Exchange(exchange, (GroupSetting)exchange.Value) : new IdealPreparation();
    }

    /// <summary>The model of a <c>relaxed</c> section; null when its geometry does not fit.</summary>
    public RelaxedPreparation? Relaxed(GroupSetting relaxed) =>
        new CollectiveBuilder(parties, findings).Build(relaxed, "time") is { } decay ? new RelaxedPreparation(StartOf(relaxed), decay) : null;

    private RelaxedStart StartOf(GroupSetting relaxed)
    {
        if (relaxed.Find("start") is not GroupSetting start)
            return new RelaxedStart([.. Enumerable.Repeat(0, parties)], null, null);
        if (start.Find("file") is TextSetting file)
            return new RelaxedStart(null, null, Path.Combine(folder, file.Text));
        bool pair = start.Find("bystanders") is not null;
        ListSetting list = (ListSetting)(start.Find("bystanders") ?? start.Find("levels"))!;
        int wanted = pair ? parties - 2 : parties;
        if (list.Items.Count != wanted)
            findings.Add(ConditionsMessages.WrongCount(list.Spot, list.Path, list.Items.Count, wanted, pair ? "emitters beside the pair" : "emitters"));
        int[] levels = [.. list.Items.Cast<LevelSetting>().Select(l => l.Level)];
        foreach (LevelSetting level in list.Items.Cast<LevelSetting>().Where(l => l.Level >= parties))
            findings.Add(ConditionsMessages.NoSuchLevel(level.Spot, level.Path, level.Level, parties));
        return pair ? new RelaxedStart(null, levels, null) : new RelaxedStart(levels, null, null);
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
