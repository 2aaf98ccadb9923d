using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace ResourceCheck.Numerics.Collective;

/// <summary>Loops over complex amplitudes seen as twice as many reals.</summary>
internal static class AmplitudeLoops
{
    /// <summary>Longer sums are halved first: added one after the other, the equal squares of 9! amplitudes lose four digits.</summary>
    private const int Block = 128;

    public static double NormSquared(ReadOnlySpan<Complex> state)
    {
        if (state.Length > Block)
            return NormSquared(state[..(state.Length / 2)]) + NormSquared(state[(state.Length / 2)..]);
        ReadOnlySpan<double> parts = MemoryMarshal.Cast<Complex, double>(state);
        return Vectors.Dot(parts, parts);
    }

    public static double Norm(ReadOnlySpan<Complex> state) => Math.Sqrt(NormSquared(state));

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Scale(Span<Complex> state, double factor)
    {
        Span<double> parts = MemoryMarshal.Cast<Complex, double>(state);
        Span<Vector<double>> lanes = MemoryMarshal.Cast<double, Vector<double>>(parts);
        for (int i = 0; i < lanes.Length; i++)
            lanes[i] *= factor;
        for (int i = lanes.Length * Vector<double>.Count; i < parts.Length; i++)
            parts[i] *= factor;
    }

    /// <summary>target *= scale, sum += target; returns ‖target‖².</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static double Finish(Span<Complex> target, double scale, Span<Complex> sum)
    {
        Span<double> t = MemoryMarshal.Cast<Complex, double>(target), s = MemoryMarshal.Cast<Complex, double>(sum);
        Span<Vector<double>> tLanes = MemoryMarshal.Cast<double, Vector<double>>(t), sLanes = MemoryMarshal.Cast<double, Vector<double>>(s);
        Vector<double> squares = Vector<double>.Zero;
        for (int i = 0; i < tLanes.Length; i++)
        {
            Vector<double> scaled = tLanes[i] * scale;
            tLanes[i] = scaled;
            sLanes[i] += scaled;
            squares += scaled * scaled;
        }

        double total = Vector.Sum(squares);
        for (int i = tLanes.Length * Vector<double>.Count; i < t.Length; i++)
        {
            t[i] *= scale;
            s[i] += t[i];
            total += t[i] * t[i];
        }

        return total;
    }

    /// <summary>Σ conj(a_i) b_i.</summary>
    public static Complex Overlap(ReadOnlySpan<Complex> a, ReadOnlySpan<Complex> b)
    {
        int half = a.Length / 2;
        if (a.Length > Block)
            return Overlap(a[..half], b[..half]) + Overlap(a[half..], b[half..]);
        Complex sum = Complex.Zero;
        for (int i = 0; i < a.Length; i++)
            sum += Complex.Conjugate(a[i]) * b[i];
        return sum;
    }

    /// <summary>target += factor · source.</summary>
    public static void AddScaled(Complex factor, ReadOnlySpan<Complex> source, Span<Complex> target)
    {
        for (int i = 0; i < source.Length; i++)
            target[i] += factor * source[i];
    }
}
