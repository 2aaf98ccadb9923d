namespace ResourceCheck.Figures;

/// <summary>The unit that suits the times of an axis.</summary>
internal static class TimeUnit
{
    private static readonly (double Size, string Name)[] Units = [(1, "s"), (1e-3, "ms"), (1e-6, "µs"), (1e-9, "ns"), (1e-12, "ps")];

    /// <summary>Size in seconds and name of the unit for an axis that ends at a time.</summary>
    public static (double Size, string Name) For(double last) => Units.FirstOrDefault(u => Math.Abs(last) >= u.Size, Units[^1]);
}
