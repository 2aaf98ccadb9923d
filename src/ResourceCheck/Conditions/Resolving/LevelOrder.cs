using System.Numerics;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Which physical level plays which value of the script. Conditions speak of physical levels, worlds of the script's.</summary>
/// <param name="Physical">Element v is the physical level that plays value v.</param>
/// <param name="Findings">Takes levels that do not exist.</param>
internal sealed record LevelOrder(int[] Physical, Findings Findings)
{
    /// <summary>Number of levels d.</summary>
    public int Levels => Physical.Length;

    /// <summary>Whether every level plays itself.</summary>
    public bool IsNatural => Physical.Select((level, value) => level == value).All(same => same);

    /// <summary>The order that a <c>resource</c> section gives.</summary>
    public static LevelOrder Of(GroupSetting? resource, int levels, Findings findings)
    {
        int[] natural = [.. Enumerable.Range(0, levels)];
        if (resource?.Find("levels") is not ListSetting list)
            return new LevelOrder(natural, findings);
        if (list.Items.Count == levels)
            return new LevelOrder([.. list.Items.Cast<LevelSetting>().Select(l => l.Level)], findings);
        findings.Add(ConditionsMessages.WrongSize(list.Spot, list.Path, list.Items.Count, levels));
        return new LevelOrder(natural, findings);
    }

    /// <summary>A level that exists, or null with a finding.</summary>
    public int? Check(Setting? setting) => setting is LevelSetting level ? Check(level.Level, level.Spot, level.Path) : null;

    /// <summary>A level that exists, or null with a finding.</summary>
    public int? Check(int level, Json.Spot spot, string path)
    {
        if (level < Levels)
            return level;
        Findings.Add(ConditionsMessages.NoSuchLevel(spot, path, level, Levels));
        return null;
    }

    /// <summary>One entry per level, from physical to the script's order.</summary>
    public double[] ToScript(double[] values) => [.. Physical.Select(p => values[p])];

    /// <summary>A matrix over levels, from physical to the script's order.</summary>
    public T[,] ToScript<T>(T[,] values)
    {
        T[,] result = new T[Levels, Levels];
        for (int a = 0; a < Levels; a++)
        {
            for (int b = 0; b < Levels; b++)
                result[a, b] = values[Physical[a], Physical[b]];
        }

        return result;
    }
}
