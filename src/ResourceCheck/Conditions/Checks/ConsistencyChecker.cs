using ResourceCheck.Conditions.Keys;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Checks what several keys say together and needs no protocol: missing keys, sums, contradictions.</summary>
internal sealed class ConsistencyChecker(Findings findings)
{
    /// <summary>Fractions are typed with a few digits; 0.333333333 three times must pass, 0.33 three times must not.</summary>
    public const double SumTolerance = 1e-8;

    /// <summary>Of light in vacuum, m/s: exact by the definition of the metre (SI).</summary>
    private const double SpeedOfLight = 299_792_458;

    /// <summary>Checks the whole file.</summary>
    public void Check(GroupSetting root)
    {
        foreach (GroupSetting section in root.Entries.Select(e => e.Value).OfType<GroupSetting>())
        {
            foreach (GroupSetting view in Merging.ViewsOf(section))
                CheckTree(view);
        }
    }

    private void CheckTree(GroupSetting group)
    {
        if (group.Shape is GroupShape shape)
        {
            CheckMissing(group, shape);
            CheckGroup(group, shape.Name);
        }

        foreach (Setting value in group.Entries.Select(e => e.Value))
        {
            foreach (GroupSetting child in value is ListSetting list ? list.Items.OfType<GroupSetting>() : value is GroupSetting one ? [one] : [])
                CheckTree(child);
        }
    }

    private void CheckMissing(GroupSetting group, GroupShape shape)
    {
        if (!group.IsWhole)
            return;
        foreach (Key key in shape.Keys.Where(k => k.Required && group.EntryOf(k.Name) is null))
            findings.Add(ConditionsMessages.MissingKey(group.Spot, group.Path, [key]));
        foreach (Alternative alternative in shape.Alternatives.Where(a => a.Required && a.Names.All(n => group.EntryOf(n) is null)))
            findings.Add(ConditionsMessages.MissingKey(group.Spot, group.Path, [.. alternative.Names.Select(n => shape.Find(n)!)]));
    }

    private void CheckGroup(GroupSetting group, string name)
    {
        switch (name)
        {
            case "flight":
                CheckFlight(group);
                CheckSpeed(group);
                break;
            case "levels" or "waiting":
                CheckBranches(group);
                CheckPairs(group);
                break;
            case "rotation" or "thermal":
                CheckTwoLevels(group);
                break;
            case "detection":
                CheckConfusion(group);
                break;
            case "resource":
                CheckLevelOrder(group);
                break;
            case "messages":
                CheckDistances(group);
                CheckSpeed(group);
                break;
        }
    }

    private void CheckFlight(GroupSetting flight)
    {
        if (flight.IsWhole && flight.NumberOf("length") is { } length && flight.Find("speed") is null && flight.Find("time") is null)
            findings.Add(ConditionsMessages.LengthWithoutSpeed(length.Spot, length.Path));
    }

    private void CheckSpeed(GroupSetting group)
    {
        if (group.NumberOf("speed") is { } speed && speed.Value > SpeedOfLight)
            findings.Add(ConditionsMessages.FasterThanLight(speed.Spot, speed.Path, speed.Value));
    }

    private void CheckDistances(GroupSetting messages)
    {
        if (messages.IsWhole && messages.Find("distances") is GroupSetting { Entries.Count: > 0 } distances && messages.Find("speed") is null)
            findings.Add(ConditionsMessages.DistancesWithoutSpeed(messages.EntryOf("distances")!.NameSpot, distances.Path));
    }

    private void CheckBranches(GroupSetting section)
    {
        HashSet<(int From, int To)> seen = [];
        foreach (GroupSetting entry in section.Groups("decay"))
        {
            if (entry.Find("from") is not LevelSetting from)
                continue;
            foreach ((int to, double _, Json.Spot spot) in Branches.Of(entry))
            {
                if (to == from.Level)
                    findings.Add(ConditionsMessages.DecayOntoItself(spot, entry.Path, to));
                else if (!seen.Add((from.Level, to)))
                    findings.Add(ConditionsMessages.BranchTwice(spot, entry.Path, from.Level, to));
            }

            if (entry.Find("branching") is GroupSetting { IsWhole: true } branching && Math.Abs(Sum(branching) - 1) > SumTolerance)
                findings.Add(ConditionsMessages.BranchingSum(entry.EntryOf("branching")!.NameSpot, branching.Path, Sum(branching)));
        }
    }

    private static double Sum(GroupSetting map) => map.Entries.Sum(e => ((NumberSetting)e.Value).Value);

    private void CheckPairs(GroupSetting section)
    {
        if (section.EntryOf("coherence") is not { } coherence || section.EntryOf("dephasingTime") is not { } dephasing)
            return;
        if (dephasing.Value is NumberSetting)
            findings.Add(ConditionsMessages.PairBothWays(dephasing.NameSpot, section.Path, "every pair of levels"));
        foreach (Entry entry in (dephasing.Value as GroupSetting)?.Entries ?? [])
        {
            (int low, int high) = MapKeys.Pair(entry.Name, 0)!.Value;
            bool named = coherence.Value is GroupSetting map ? map.Entries.Any(e => MapKeys.Pair(e.Name, 0) == (low, high)) : low == 0;
            if (named)
                findings.Add(ConditionsMessages.PairBothWays(entry.NameSpot, section.Path, $"levels {low} and {high}"));
        }
    }

    private void CheckTwoLevels(GroupSetting group)
    {
        if (group.Find("levels") is ListSetting { Items: [LevelSetting a, LevelSetting b] } list && a.Level == b.Level)
            findings.Add(ConditionsMessages.SameLevelTwice(list.Spot, list.Path, a.Level));
    }

    private void CheckConfusion(GroupSetting detection)
    {
        if (detection.Find("confusion") is not ListSetting matrix)
            return;
        foreach (ListSetting row in matrix.Items.Cast<ListSetting>())
        {
            double sum = row.Items.Sum(c => ((NumberSetting)c).Value);
            if (row.Items.Count != matrix.Items.Count)
                findings.Add(ConditionsMessages.NotSquare(row.Spot, row.Path, row.Items.Count, matrix.Items.Count));
            else if (Math.Abs(sum - 1) > SumTolerance)
                findings.Add(ConditionsMessages.ConfusionSum(row.Spot, row.Path, sum));
        }
    }

    private void CheckLevelOrder(GroupSetting resource)
    {
        if (resource.Find("levels") is not ListSetting list)
            return;
        int[] levels = [.. list.Items.Cast<LevelSetting>().Select(l => l.Level)];
        if (!levels.Order().SequenceEqual(Enumerable.Range(0, levels.Length)))
            findings.Add(ConditionsMessages.NoPermutation(list.Spot, list.Path, levels.Length));
    }
}
