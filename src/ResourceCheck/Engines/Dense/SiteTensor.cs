using ResourceCheck.Numerics;

namespace ResourceCheck.Engines.Dense;

/// <summary>
/// An unnormalised state (or target) of several sites as expectation values in the product operator basis: Dimension^n real
/// numbers, first site most significant. Shared between branches and never changed after it is built.
/// </summary>
internal sealed class SiteTensor(int dimension, IReadOnlyList<int> parties, double[] data)
{
    public int Dimension { get; } = dimension;

    /// <summary>Party of each site, ascending.</summary>
    public IReadOnlyList<int> Parties { get; } = parties;

    public double[] Data { get; } = data;

    /// <summary>What remains when a functional has been evaluated on a party's site.</summary>
    public SiteTensor Contract(int party, double[] functional)
    {
        (int left, int right) = Around(party);
        double[] result = new double[left * right];
        for (int l = 0; l < left; l++)
        {
            Span<double> target = result.AsSpan(l * right, right);
            for (int i = 0; i < Dimension; i++)
                AddScaled(functional[i], Data.AsSpan(((l * Dimension) + i) * right, right), target);
        }

        return new SiteTensor(Dimension, [.. Parties.Where(p => p != party)], result);
    }

    /// <summary>The tensor with a map applied to a party's site.</summary>
    public SiteTensor Apply(int party, SiteMap map)
    {
        (int left, int right) = Around(party);
        double[] result = new double[Data.Length];
        if (right == 1)
            ApplyToLast(map, result);
        else
            ApplyToBlocks(map, left, right, result);
        return new SiteTensor(Dimension, Parties, result);
    }

    public double Dot(SiteTensor other) => Vectors.Dot(Data, other.Data);

    private (int Left, int Right) Around(int party)
    {
        int site = 0;
        while (Parties[site] != party)
            site++;
        return (Power(site), Power(Parties.Count - site - 1));
    }

    private int Power(int exponent)
    {
        int result = 1;
        for (int i = 0; i < exponent; i++)
            result *= Dimension;
        return result;
    }

    private void ApplyToBlocks(SiteMap map, int left, int right, double[] result)
    {
        for (int l = 0; l < left; l++)
        {
            for (int i = 0; i < Dimension; i++)
            {
                Span<double> target = result.AsSpan(((l * Dimension) + i) * right, right);
                for (int j = 0; j < Dimension; j++)
                    AddScaled(map[i, j], Data.AsSpan(((l * Dimension) + j) * right, right), target);
            }
        }
    }

    private void ApplyToLast(SiteMap map, double[] result)
    {
        ReadOnlySpan<double> entries = map.Entries;
        for (int l = 0; l < result.Length; l += Dimension)
        {
            ReadOnlySpan<double> source = Data.AsSpan(l, Dimension);
            for (int i = 0; i < Dimension; i++)
                result[l + i] = Vectors.Dot(entries.Slice(i * Dimension, Dimension), source);
        }
    }

    private static void AddScaled(double factor, ReadOnlySpan<double> source, Span<double> target)
    {
        if (factor != 0)
            Vectors.AddScaled(factor, source, target);
    }
}
