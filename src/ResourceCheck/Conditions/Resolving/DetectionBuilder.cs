using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Builds the detection of a party. Outcomes are the script's values, so nothing is reordered here.</summary>
internal static class DetectionBuilder
{
    /// <summary>The model of a section.</summary>
    public static DetectionModel Build(GroupSetting? section, int levels, Findings findings)
    {
        DetectionModel ideal = DetectionModel.Ideal(levels);
        if (section is null)
            return ideal;
        return new DetectionModel(
            Duration.FromSeconds(section.Number("duration", 0)),
            section.Find("confusion") is ListSetting matrix ? Matrix(matrix, levels, findings) ?? ideal.Confusion : Uniform(section.Number("confusion", 0), levels),
            section.Number("efficiency", 1),
            section.Number("dark", 0));
    }

    private static double[,] Uniform(double confusion, int levels)
    {
        double[,] matrix = new double[levels, levels];
        for (int a = 0; a < levels; a++)
        {
            for (int b = 0; b < levels; b++)
                matrix[a, b] = levels == 1 ? 1 : a == b ? 1 - confusion : confusion / (levels - 1);
        }

        return matrix;
    }

    private static double[,]? Matrix(ListSetting rows, int levels, Findings findings)
    {
        if (rows.Items.Count != levels)
        {
            findings.Add(ConditionsMessages.WrongSize(rows.Spot, rows.Path, rows.Items.Count, levels));
            return null;
        }

        double[,] matrix = new double[levels, levels];
        for (int a = 0; a < levels; a++)
        {
            double[] row = [.. ((ListSetting)rows.Items[a]).Items.Cast<NumberSetting>().Select(n => n.Value)];
            double sum = row.Sum();
            for (int b = 0; b < levels; b++)
                matrix[a, b] = row[b] / sum;
        }

        return matrix;
    }
}
