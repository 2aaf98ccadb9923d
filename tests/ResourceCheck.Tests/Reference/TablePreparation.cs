using System.Globalization;
using ResourceCheck.Conditions;

namespace ResourceCheck.Tests.Reference;

/// <summary>The exchange preparation that a row of the preparation table describes: errors and couplings of the last step, or one of each per step.</summary>
internal static class TablePreparation
{
    public static ExchangePreparation Of(TableRow row)
    {
        bool perStep = row.Parameters.GetValueOrDefault("per") == "step";
        return new ExchangePreparation([.. Enumerable.Range(2, row.N - 1).Select(m => Step(row, m, perStep))]);
    }

    private static ExchangeStep Step(TableRow row, int m, bool perStep)
    {
        bool flawed = perStep || m == row.N;
        int index = perStep ? m - 2 : 0;
        return new ExchangeStep(
            flawed ? row.Number("timeError", index) : 0,
            flawed ? row.Number("phaseError", index) : 0,
            Couplings(m == row.N ? row.Of("couplings", 0) : null, m));
    }

    private static double[,] Couplings(string? text, int m)
    {
        double[,] couplings = new double[m, m];
        for (int i = 0; i < m; i++)
        {
            for (int k = 0; k < m; k++)
                couplings[i, k] = i == k ? 0 : 1;
        }

        foreach (string entry in text?.Split(',') ?? [])
        {
            string[] parts = entry.Split(':', '-');
            int i = int.Parse(parts[0], CultureInfo.InvariantCulture), k = int.Parse(parts[1], CultureInfo.InvariantCulture);
            couplings[i, k] = couplings[k, i] = TableRow.Number(parts[2]);
        }

        return couplings;
    }
}
