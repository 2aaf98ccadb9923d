using System.Numerics;
using System.Runtime.InteropServices;

namespace ResourceCheck.Numerics;

/// <summary>Elementary loops on contiguous numbers, in vector lanes.</summary>
internal static class Vectors
{
    /// <summary>target += factor · source; equal lengths.</summary>
    public static void AddScaled(double factor, ReadOnlySpan<double> source, Span<double> target)
    {
        ReadOnlySpan<Vector<double>> lanes = MemoryMarshal.Cast<double, Vector<double>>(source);
        Span<Vector<double>> sums = MemoryMarshal.Cast<double, Vector<double>>(target);
        Vector<double> scale = new(factor);
        for (int i = 0; i < lanes.Length; i++)
            sums[i] += scale * lanes[i];
        for (int i = lanes.Length * Vector<double>.Count; i < source.Length; i++)
            target[i] += factor * source[i];
    }

    /// <summary>Σ a_i b_i; equal lengths.</summary>
    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        ReadOnlySpan<Vector<double>> x = MemoryMarshal.Cast<double, Vector<double>>(a);
        ReadOnlySpan<Vector<double>> y = MemoryMarshal.Cast<double, Vector<double>>(b);
        Vector<double> sums = Vector<double>.Zero;
        for (int i = 0; i < x.Length; i++)
            sums += x[i] * y[i];
        double total = Vector.Sum(sums);
        for (int i = x.Length * Vector<double>.Count; i < a.Length; i++)
            total += a[i] * b[i];
        return total;
    }
}
