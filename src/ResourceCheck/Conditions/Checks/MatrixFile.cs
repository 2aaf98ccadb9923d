using System.Globalization;
using System.Numerics;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Scripts;

namespace ResourceCheck.Conditions.Checks;

/// <summary>Reads matrices from JSON files: rows of entries, each a number or [real, imaginary].</summary>
internal sealed class MatrixFile
{
    private readonly string _name;
    private readonly Findings _findings;

    private MatrixFile(string name, Findings findings)
    {
        _name = name;
        _findings = findings;
    }

    /// <summary>A file of one square matrix, or of a list of them of one size; null when there is a mistake.</summary>
    /// <param name="setting">The setting that names the file.</param>
    /// <param name="folder">Folder of the conditions file.</param>
    /// <param name="isList">Whether a list of matrices is expected.</param>
    /// <param name="findings">Takes what is wrong.</param>
    public static IReadOnlyList<Complex[,]>? Read(TextSetting setting, string folder, bool isList, Findings findings)
    {
        if (TextOf(setting, folder, findings) is not { } source || JsonTree.Read(source, false, findings) is not { } node)
            return null;
        MatrixFile reader = new(setting.Text, findings);
        if (!isList)
            return reader.Matrix(node) is { } matrix ? [matrix] : null;
        if (node is not ArrayNode { Items.Count: > 0 } list)
            return reader.Refuse(node, "a list of matrices, each a list of rows");
        Complex[][,] matrices = [.. list.Items.Select(reader.Matrix).OfType<Complex[,]>()];
        if (matrices.Length < list.Items.Count)
            return null;
        int size = matrices[0].GetLength(0);
        int odd = Array.FindIndex(matrices, m => m.GetLength(0) != size);
        return odd < 0 ? matrices : reader.Refuse(list.Items[odd], $"a matrix of the same size as the first, {size}×{size}");
    }

    private static SourceText? TextOf(TextSetting setting, string folder, Findings findings)
    {
        string path = Path.Combine(folder, setting.Text);
        try
        {
            FileInfo info = new(path);
            if (info.Exists && info.Length <= JsonTree.MaxLength)
                return new SourceText(setting.Text, File.ReadAllText(path));
            string why = info.Exists ? $"it has {info.Length} bytes, more than {JsonTree.MaxLength}" : Directory.Exists(path) ? "it is a folder" : "there is no such file";
            findings.Add(ConditionsMessages.FileNotRead(setting.Spot, setting.Path, setting.Text, why));
        }
        catch (Exception exception) when (exception is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            findings.Add(ConditionsMessages.FileNotRead(setting.Spot, setting.Path, setting.Text, "the system does not let it be read"));
        }

        return null;
    }

    private Complex[,]? Matrix(Node node)
    {
        if (node is not ArrayNode { Items.Count: > 0 } rows)
            return Refuse(node, "a matrix, a list of rows")?[0];
        int size = rows.Items.Count;
        Complex[,] matrix = new Complex[size, size];
        for (int i = 0; i < size; i++)
        {
            if (rows.Items[i] is not ArrayNode row || row.Items.Count != size)
                return Refuse(rows.Items[i], $"a row of {size} entries")?[0];
            for (int j = 0; j < size; j++)
            {
                if (Entry(row.Items[j]) is not { } entry)
                    return Refuse(row.Items[j], "a finite number or [real, imaginary]")?[0];
                matrix[i, j] = entry;
            }
        }

        return matrix;
    }

    private static Complex? Entry(Node node) => node switch
    {
        NumberNode number => Real(number) is { } re ? new Complex(re, 0) : null,
        ArrayNode { Items: [NumberNode a, NumberNode b] } => Real(a) is { } re && Real(b) is { } im ? new Complex(re, im) : null,
        _ => null,
    };

    private static double? Real(NumberNode node) =>
        double.TryParse(node.Raw, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && double.IsFinite(value) ? value : null;

    private Complex[][,]? Refuse(Node node, string wanted)
    {
        _findings.Add(ConditionsMessages.BadMatrix(node.Spot, _name, node.Kind, wanted));
        return null;
    }
}
