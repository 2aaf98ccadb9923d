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
    /// <summary>Adds the shares of all lanes to the words from <paramref name="start"/> on; start and length are multiples of each run.</summary>
    public static void Accumulate(
        ReadOnlySpan<SwapLane> lanes, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source, Span<Complex> target, int start)
    {
        for (int at = 0; at < lanes.Length; at++)
        {
            SwapLane lane = lanes[at];
            if (lane.Length == 1 && at + 1 < lanes.Length && lanes[at + 1].Length == 1)
                Twofold(lane, lanes[++at], coefficients, source, target, start);
            else if (lane.Length == 1)
                Single(lane, coefficients, source, target, start);
            else if (lane.Length % 2 == 0)
                Pairs(lane, coefficients, source, target, start);
            else
                Slices(lane, coefficients, source, target, start);
        }
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
        SwapLane lane, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source, Span<Complex> target, int start)
    {
        ref double x = ref Start(source);
        ref double y = ref Start(target);
        ref int targets = ref lane.Targets[start / lane.Length];
        ref ushort indices = ref lane.Coefficients[start / lane.Length];
        nuint at = 0, step = (nuint)lane.Length * 2, last = (nuint)target.Length * 2;
        for (nuint run = 0; at < last; run++)
        {
            Complex c = coefficients[Unsafe.Add(ref indices, run)];
            Vector256<double> real = Vector256.Create(c.Real), turn = Turn(c);
            nuint from = (nuint)Unsafe.Add(ref targets, run) * 2;
            for (nuint end = at + step; at < end; at += 4, from += 4)
                Multiplied(real, turn, Vector256.LoadUnsafe(ref x, from), Vector256.LoadUnsafe(ref y, at)).StoreUnsafe(ref y, at);
        }
    }

    /// <summary>Two lanes of single words in one pass: their reads, which come from afar, overlap.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Twofold(
        SwapLane lane, SwapLane other, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source, Span<Complex> target, int start)
    {
        ref double x = ref Start(source);
        ref double y = ref Start(target);
        ref double table = ref Start(coefficients);
        ref int targets = ref lane.Targets[start];
        ref int others = ref other.Targets[start];
        ref ushort indices = ref lane.Coefficients[start];
        ref ushort otherIndices = ref other.Coefficients[start];
        for (nuint q = 0; q < (nuint)target.Length; q++)
        {
            Vector128<double> sum = Vector128.LoadUnsafe(ref y, q * 2);
            sum = Added(ref table, Unsafe.Add(ref indices, q), ref x, Unsafe.Add(ref targets, q), sum);
            Added(ref table, Unsafe.Add(ref otherIndices, q), ref x, Unsafe.Add(ref others, q), sum).StoreUnsafe(ref y, q * 2);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Single(
        SwapLane lane, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source, Span<Complex> target, int start)
    {
        ref double x = ref Start(source);
        ref double y = ref Start(target);
        ref double table = ref Start(coefficients);
        ref int targets = ref lane.Targets[start];
        ref ushort indices = ref lane.Coefficients[start];
        for (nuint q = 0; q < (nuint)target.Length; q++)
        {
            Vector128<double> sum = Vector128.LoadUnsafe(ref y, q * 2);
            Added(ref table, Unsafe.Add(ref indices, q), ref x, Unsafe.Add(ref targets, q), sum).StoreUnsafe(ref y, q * 2);
        }
    }

    private static void Slices(
        SwapLane lane, ReadOnlySpan<Complex> coefficients, ReadOnlySpan<Complex> source, Span<Complex> target, int start)
    {
        int first = start / lane.Length;
        for (int run = 0; run < target.Length / lane.Length; run++)
        {
            Complex c = coefficients[lane.Coefficients[first + run]];
            Add(c, source.Slice(lane.Targets[first + run], lane.Length), target.Slice(run * lane.Length, lane.Length));
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector128<double> Added(ref double table, int index, ref double x, int target, Vector128<double> sum)
    {
        Vector128<double> c = Vector128.LoadUnsafe(ref table, (nuint)index * 2), value = Vector128.LoadUnsafe(ref x, (nuint)target * 2);
        sum = Vector128.FusedMultiplyAdd(Vector128.Shuffle(c, Vector128.Create(0L, 0)), value, sum);
        Vector128<double> turn = Vector128.Shuffle(c, Vector128.Create(1L, 1)) * Vector128.Create(-1.0, 1);
        return Vector128.FusedMultiplyAdd(turn, Vector128.Shuffle(value, Vector128.Create(1L, 0)), sum);
    }

    private static Vector256<double> Turn(Complex c) => Vector256.Create(-c.Imaginary, c.Imaginary, -c.Imaginary, c.Imaginary);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> Multiplied(
        Vector256<double> real, Vector256<double> turn, Vector256<double> value, Vector256<double> sum) =>
        Vector256.FusedMultiplyAdd(
            turn, Vector256.Shuffle(value, Vector256.Create(1L, 0, 3, 2)), Vector256.FusedMultiplyAdd(real, value, sum));

    private static ref double Start(ReadOnlySpan<Complex> span) => ref Unsafe.As<Complex, double>(ref MemoryMarshal.GetReference(span));
}
