using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Determinants of eight complex matrices at once, one per vector lane, by Gaussian elimination. Real and imaginary parts lie apart,
/// entry after entry. Rows change places only in lanes whose pivot is small against its column (threshold pivoting: Duff, Erisman and
/// Reid, Direct Methods for Sparse Matrices (1986), section 5.4), because full pivoting would cost as much as the elimination.
/// Where the processor has no 512-bit lanes the runtime makes two halves of each vector.
/// </summary>
internal static class LaneDeterminants
{
    /// <summary>Matrices side by side.</summary>
    public const int Lanes = 8;

    /// <summary>A pivot may be smaller than its column's largest entry by this factor in the square of the modulus: growth stays below 4.2 a step.</summary>
    private const double Threshold = 0.1;

    /// <summary>The determinants; the matrices are overwritten.</summary>
    /// <param name="re">order² vectors of real parts, row after row.</param>
    /// <param name="im">Imaginary parts.</param>
    /// <param name="order">Rows of each matrix.</param>
    public static (Vector512<double> Re, Vector512<double> Im) Of(Span<Vector512<double>> re, Span<Vector512<double>> im, int order)
    {
        Vector512<double> detRe = Vector512<double>.One, detIm = Vector512<double>.Zero;
        for (int c = 0; c < order; c++)
        {
            Vector512<double> turned = Pivot(re, im, order, c);
            Vector512<double> pr = re[(c * order) + c], pi = im[(c * order) + c];
            Vector512<double> next = ((detRe * pr) - (detIm * pi)) * turned;
            detIm = ((detRe * pi) + (detIm * pr)) * turned;
            detRe = next;
            Vector512<double> norm = (pr * pr) + (pi * pi);
            Vector512<double> scale = Vector512.ConditionalSelect(Vector512.GreaterThan(norm, Vector512<double>.Zero), Vector512<double>.One / norm, Vector512<double>.Zero);
            Eliminate(re, im, order, c, pr * scale, -pi * scale);
        }

        return (detRe, detIm);
    }

    private static void Eliminate(Span<Vector512<double>> re, Span<Vector512<double>> im, int order, int c, Vector512<double> inverseRe, Vector512<double> inverseIm)
    {
        ref Vector512<double> pivotRe = ref Unsafe.Add(ref MemoryMarshal.GetReference(re), c * order);
        ref Vector512<double> pivotIm = ref Unsafe.Add(ref MemoryMarshal.GetReference(im), c * order);
        for (int r = c + 1; r < order; r++)
        {
            ref Vector512<double> rowRe = ref Unsafe.Add(ref MemoryMarshal.GetReference(re), r * order);
            ref Vector512<double> rowIm = ref Unsafe.Add(ref MemoryMarshal.GetReference(im), r * order);
            Vector512<double> hr = Unsafe.Add(ref rowRe, c), hi = Unsafe.Add(ref rowIm, c);
            Vector512<double> fr = (hi * inverseIm) - (hr * inverseRe), fi = -(hr * inverseIm) - (hi * inverseRe);
            for (int j = c + 1; j < order; j++)
            {
                Vector512<double> a = Unsafe.Add(ref pivotRe, j), b = Unsafe.Add(ref pivotIm, j);
                Vector512<double> x = Vector512.FusedMultiplyAdd(fr, a, Unsafe.Add(ref rowRe, j));
                Vector512<double> y = Vector512.FusedMultiplyAdd(fr, b, Unsafe.Add(ref rowIm, j));
                Unsafe.Add(ref rowRe, j) = Vector512.FusedMultiplyAdd(-fi, b, x);
                Unsafe.Add(ref rowIm, j) = Vector512.FusedMultiplyAdd(fi, a, y);
            }
        }
    }

    /// <summary>Brings a fit pivot to row c in every lane; the result is -1 in lanes whose rows changed places.</summary>
    private static Vector512<double> Pivot(Span<Vector512<double>> re, Span<Vector512<double>> im, int order, int c)
    {
        Vector512<double> own = Size(re, im, (c * order) + c), largest = own;
        for (int r = c + 1; r < order; r++)
            largest = Vector512.Max(largest, Size(re, im, (r * order) + c));
        Vector512<double> unfit = Vector512.LessThan(own, largest * Threshold);
        return Vector512.LessThanAny(own, largest * Threshold) ? Exchange(re, im, order, c, unfit.AsUInt64(), largest) : Vector512<double>.One;
    }

    private static Vector512<double> Size(Span<Vector512<double>> re, Span<Vector512<double>> im, int at) => (re[at] * re[at]) + (im[at] * im[at]);

    private static Vector512<double> Exchange(Span<Vector512<double>> re, Span<Vector512<double>> im, int order, int c, Vector512<ulong> unfit, Vector512<double> largest)
    {
        Span<double> x = MemoryMarshal.Cast<Vector512<double>, double>(re), y = MemoryMarshal.Cast<Vector512<double>, double>(im);
        Vector512<double> turned = Vector512<double>.One;
        for (int lane = 0; lane < Lanes; lane++)
        {
            if (unfit.GetElement(lane) == 0)
                continue;
            turned = turned.WithElement(lane, -1);
            int r = c + 1;
            while (r < order - 1 && Size(re, im, (r * order) + c).GetElement(lane) < largest.GetElement(lane))
                r++;
            for (int j = c; j < order; j++)
            {
                int upper = (((c * order) + j) * Lanes) + lane, lower = (((r * order) + j) * Lanes) + lane;
                (x[upper], x[lower]) = (x[lower], x[upper]);
                (y[upper], y[lower]) = (y[lower], y[upper]);
            }
        }

        return turned;
    }
}
