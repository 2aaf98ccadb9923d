namespace ResourceCheck.Numerics;

/// <summary>A real linear map on the operator space of one site, row-major; row i, column j is the i-th component of the image of basis element j.</summary>
internal sealed class SiteMap
{
    private SiteMap(int dimension, double[] entries)
    {
        Dimension = dimension;
        Entries = entries;
    }

    public int Dimension { get; }

    /// <summary>Dimension² entries, row after row. Not to be changed after construction: maps are shared between branches.</summary>
    public double[] Entries { get; }

    public double this[int row, int column] => Entries[(row * Dimension) + column];

    public static SiteMap From(int dimension, double[] entries) => new(dimension, entries);

    public static SiteMap Identity(int dimension)
    {
        double[] entries = new double[dimension * dimension];
        for (int i = 0; i < dimension; i++)
            entries[(i * dimension) + i] = 1;
        return new SiteMap(dimension, entries);
    }

    /// <summary>The transposed matrix: it takes functionals where this map takes states.</summary>
    public SiteMap Transposed()
    {
        double[] entries = new double[Entries.Length];
        for (int i = 0; i < Dimension; i++)
        {
            for (int j = 0; j < Dimension; j++)
                entries[(j * Dimension) + i] = this[i, j];
        }

        return new SiteMap(Dimension, entries);
    }

    /// <summary>This map after another one.</summary>
    public SiteMap After(SiteMap? first)
    {
        if (first is null)
            return this;
        int n = Dimension;
        double[] product = new double[n * n];
        for (int i = 0; i < n; i++)
        {
            for (int k = 0; k < n; k++)
                AddScaled(Entries[(i * n) + k], first.Entries.AsSpan(k * n, n), product.AsSpan(i * n, n));
        }

        return new SiteMap(n, product);
    }

    /// <summary>The functional that first applies this map, then the given functional: row vector times matrix.</summary>
    public double[] PullBack(double[] functional)
    {
        int n = Dimension;
        double[] result = new double[n];
        for (int k = 0; k < n; k++)
            AddScaled(functional[k], Entries.AsSpan(k * n, n), result);
        return result;
    }

    private static void AddScaled(double factor, ReadOnlySpan<double> source, Span<double> target)
    {
        if (factor == 0)
            return;
        for (int j = 0; j < source.Length; j++)
            target[j] += factor * source[j];
    }
}
