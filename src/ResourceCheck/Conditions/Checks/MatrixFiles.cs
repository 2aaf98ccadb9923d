using System.Numerics;
using ResourceCheck.Conditions.Keys;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Reads every matrix file that a conditions file names and checks what needs no number of levels.</summary>
internal sealed class MatrixFiles(string folder, Findings findings)
{
    /// <summary>How far Σ K†K may be from 1, and G from G†, relative to its largest element.</summary>
    public const double Tolerance = 1e-9;

    private readonly Dictionary<string, IReadOnlyList<Complex[,]>> _byPath = new(StringComparer.Ordinal);

    /// <summary>Matrices by the path of the setting that names their file.</summary>
    public IReadOnlyDictionary<string, IReadOnlyList<Complex[,]>> ReadAll(GroupSetting group)
    {
        foreach (Entry entry in group.Entries)
        {
            if (entry is { Name: "kraus", Value: TextSetting kraus })
                ReadKraus(kraus);
            else if (entry is { Name: "file", Value: TextSetting file } && group.Shape is GroupShape { Name: "rotation" })
                ReadGenerator(file);
            else if (entry.Value is GroupSetting child)
                ReadAll(child);
        }

        return _byPath;
    }

    private void ReadKraus(TextSetting setting)
    {
        if (MatrixFile.Read(setting, folder, true, findings) is not { } matrices)
            return;
        double defect = Incompleteness(matrices);
        if (defect <= Tolerance)
            _byPath[setting.Path] = matrices;
        else
            findings.Add(ConditionsMessages.Incomplete(setting.Spot, setting.Path, setting.Text, defect));
    }

    private void ReadGenerator(TextSetting setting)
    {
        if (MatrixFile.Read(setting, folder, false, findings) is not [var generator])
            return;
        double defect = Asymmetry(generator);
        if (defect <= Tolerance)
            _byPath[setting.Path] = [generator];
        else
            findings.Add(ConditionsMessages.NotHermitian(setting.Spot, setting.Path, setting.Text, defect));
    }

    /// <summary>Largest element of |Σ K†K - 1|.</summary>
    private static double Incompleteness(IReadOnlyList<Complex[,]> kraus)
    {
        int d = kraus[0].GetLength(0);
        double worst = 0;
        for (int a = 0; a < d; a++)
        {
            for (int b = 0; b < d; b++)
            {
                Complex sum = a == b ? -1 : 0;
                foreach (Complex[,] k in kraus)
                {
                    for (int c = 0; c < d; c++)
                        sum += Complex.Conjugate(k[c, a]) * k[c, b];
                }

                worst = Worse(worst, Complex.Abs(sum));
            }
        }

        return worst;
    }

    private static double Asymmetry(Complex[,] matrix)
    {
        double worst = 0, largest = 0;
        for (int a = 0; a < matrix.GetLength(0); a++)
        {
            for (int b = 0; b < matrix.GetLength(0); b++)
            {
                worst = Worse(worst, Complex.Abs(matrix[a, b] - Complex.Conjugate(matrix[b, a])));
                largest = Math.Max(largest, Complex.Abs(matrix[a, b]));
            }
        }

        return largest == 0 ? 0 : worst / largest;
    }

    /// <summary>Keeps an overflow visible, which a plain maximum would drop.</summary>
    private static double Worse(double a, double b) => double.IsNaN(b) ? double.PositiveInfinity : Math.Max(a, b);
}
