using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// target += coefficient · source along the runs of a lane, two amplitudes a register where runs allow. Each method is compiled with all
/// optimisation at once: a whole evolution is often over before a method would be compiled again. References go without bounds checks;
/// lanes are built so that targets stay within the source.
/// </summary>
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
            Single(targets, indices, coefficients, source, target);
        else if (lane.Length % 2 == 0)
            Pairs(lane.Length, targets, indices, coefficients, source, target);
        else
            Slices(lane.Length, targets, indices, coefficients, source, target);
    }

    /// <summary>target += c · source.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Add(Complex c, ReadOnlySpan<Complex> source, Span<Complex> target)
    {
        ref double x = ref Start(source);
        ref double y = ref Start(target);
        Vector256<double> real = Vector256.Create(c.Real), turn = Turn(c);
        nuint end = (nuint)(target.Length & ~1) * 2;
        for (nuint i = 0; i < end; i += 4)
            Multiplied(real, turn, Vector256.LoadUnsafe(ref x, i), Vector256.LoadUnsafe(ref y, i)).StoreUnsafe(ref y, i);
        if (target.Length % 2 == 1)
            target[^1] += c * source[target.Length - 1];
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Pairs(
        int length, ReadOnlySpan<int> targets, ReadOnlySpan<ushort> indices, ReadOnlySpan<Complex> coefficients,
        ReadOnlySpan<Complex> source, Span<Complex> target)
    {
        ref double x = ref Start(source);
        ref double y = ref Start(target);
        nuint at = 0, step = (nuint)length * 2;
        for (int run = 0; run < targets.Length; run++)
        {
            Complex c = coefficients[indices[run]];
            Vector256<double> real = Vector256.Create(c.Real), turn = Turn(c);
            nuint from = (nuint)targets[run] * 2;
            for (nuint end = at + step; at < end; at += 4, from += 4)
                Multiplied(real, turn, Vector256.LoadUnsafe(ref x, from), Vector256.LoadUnsafe(ref y, at)).StoreUnsafe(ref y, at);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Single(
        ReadOnlySpan<int> targets, ReadOnlySpan<ushort> indices, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source,
        Span<Complex> target)
    {
        ref double x = ref Start(source);
        ref double y = ref Start(target);
        ref double table = ref Start(coefficients);
        for (int q = 0; q < targets.Length; q++)
        {
            Vector128<double> c = Vector128.LoadUnsafe(ref table, (nuint)indices[q] * 2);
            Vector128<double> value = Vector128.LoadUnsafe(ref x, (nuint)targets[q] * 2);
            Vector128<double> sum = Vector128.LoadUnsafe(ref y, (nuint)q * 2);
            sum = Vector128.FusedMultiplyAdd(Vector128.Shuffle(c, Vector128.Create(0L, 0)), value, sum);
            Vector128<double> turned = Vector128.Shuffle(c, Vector128.Create(1L, 1)) * Vector128.Create(-1.0, 1);
            sum = Vector128.FusedMultiplyAdd(turned, Vector128.Shuffle(value, Vector128.Create(1L, 0)), sum);
            sum.StoreUnsafe(ref y, (nuint)q * 2);
        }
    }

    private static void Slices(
        int length, ReadOnlySpan<int> targets, ReadOnlySpan<ushort> indices, ReadOnlySpan<Complex> coefficients,
        ReadOnlySpan<Complex> source, Span<Complex> target)
    {
        for (int run = 0; run < targets.Length; run++)
            Add(coefficients[indices[run]], source.Slice(targets[run], length), target.Slice(run * length, length));
    }

    private static Vector256<double> Turn(Complex c) => Vector256.Create(-c.Imaginary, c.Imaginary, -c.Imaginary, c.Imaginary);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> Multiplied(
        Vector256<double> real, Vector256<double> turn, Vector256<double> value, Vector256<double> sum) =>
        Vector256.FusedMultiplyAdd(
            turn, Vector256.Shuffle(value, Vector256.Create(1L, 0, 3, 2)), Vector256.FusedMultiplyAdd(real, value, sum));

    private static ref double Start(ReadOnlySpan<Complex> span) => ref Unsafe.As<Complex, double>(ref MemoryMarshal.GetReference(span));
}
