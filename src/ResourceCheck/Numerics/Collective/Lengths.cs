namespace ResourceCheck.Numerics.Collective;

/// <summary>Lengths and angles of vectors in space.</summary>
internal static class Lengths
{
    /// <summary>Euclidean length, without overflow for large or small components.</summary>
    public static double Of(ReadOnlySpan<double> vector)
    {
        double length = 0;
        foreach (double component in vector)
            length = double.Hypot(length, component);
        return length;
    }

    /// <summary>Cosine of the angle between two vectors of non-zero length.</summary>
    public static double Cosine(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        double la = Of(a), lb = Of(b), sum = 0;
        for (int i = 0; i < a.Length; i++)
            sum += a[i] / la * (b[i] / lb);
        return Math.Clamp(sum, -1, 1);
    }
}
