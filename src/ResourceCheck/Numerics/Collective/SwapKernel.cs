using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>target += coefficient · source along the runs of a lane; two amplitudes a register where runs allow.</summary>
internal static class SwapKernel
{
    /// <summary>Adds the share of one lane to the words from <paramref name="start"/> on; start and length are multiples of the run.</summary>
    public static void Accumulate(
        SwapLane lane, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source, Span<Complex> target, int start)
    {
        int runs = target.Length / lane.Length, first = start / lane.Length;
        ReadOnlySpan<int> targets = lane.Targets.AsSpan(first, runs);
        ReadOnlySpan<ushort> indices = lane.Coefficients.AsSpan(first, runs);
        if (lane.Length == 1)
        {
            Gather(targets, indices, coefficients, source, target);
            return;
        }

        for (int run = 0; run < runs; run++)
        {
            Complex c = coefficients[indices[run]];
            Add(c, source.Slice(targets[run], lane.Length), target.Slice(run * lane.Length, lane.Length));
        }
    }

    /// <summary>target += c · source.</summary>
    public static void Add(Complex c, ReadOnlySpan<Complex> source, Span<Complex> target)
    {
        Vector256<double> real = Vector256.Create(c.Real), turn = Vector256.Create(-c.Imaginary, c.Imaginary, -c.Imaginary, c.Imaginary);
        ref double x = ref Unsafe.As<Complex, double>(ref MemoryMarshal.GetReference(source));
        ref double y = ref Unsafe.As<Complex, double>(ref MemoryMarshal.GetReference(target));
        nuint i = 0, end = (nuint)(target.Length & ~1) * 2;
        for (; i < end; i += 4)
        {
            Vector256<double> value = Vector256.LoadUnsafe(ref x, i);
            Vector256<double> swapped = Vector256.Shuffle(value, Vector256.Create(1L, 0, 3, 2));
            Vector256<double> sum = Vector256.FusedMultiplyAdd(real, value, Vector256.LoadUnsafe(ref y, i));
            Vector256.FusedMultiplyAdd(turn, swapped, sum).StoreUnsafe(ref y, i);
        }

        if (target.Length % 2 == 1)
            target[^1] += c * source[target.Length - 1];
    }

    private static void Gather(
        ReadOnlySpan<int> targets, ReadOnlySpan<ushort> indices, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source,
        Span<Complex> target)
    {
        for (int q = 0; q < target.Length; q++)
        {
            Vector128<double> c = Load(coefficients, indices[q]), value = Load(source, targets[q]);
            Vector128<double> sum = Vector128.FusedMultiplyAdd(Vector128.Create(c.GetElement(0)), value, Load(target, q));
            Vector128<double> turn = Vector128.Create(-c.GetElement(1), c.GetElement(1));
            sum = Vector128.FusedMultiplyAdd(turn, Vector128.Shuffle(value, Vector128.Create(1L, 0)), sum);
            Unsafe.As<Complex, Vector128<double>>(ref target[q]) = sum;
        }
    }

    private static Vector128<double> Load(ReadOnlySpan<Complex> from, int at) =>
        Unsafe.As<Complex, Vector128<double>>(ref Unsafe.AsRef(in from[at]));
}
