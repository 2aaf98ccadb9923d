using System.Numerics;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Numerics;

/// <summary>
/// Measurement bases as d×d unitaries whose columns are the basis vectors. Fourier: (1/√d) Σ_l exp(2πi lk/d)|l⟩.
/// Phased j: vector k is (1/√d) Σ_l q^{j l²} exp(2πi kl/d)|l⟩ with q = exp(2πi/d) for odd d and exp(πi/d) for even d;
/// with the levels they are the mutually unbiased bases for odd prime d (Wootters and Fields, Ann. Phys. 191, 363 (1989)).
/// </summary>
internal static class BasisVectors
{
    /// <summary>The basis of a value; <paramref name="matrices"/> holds the script's matrix files, already checked.</summary>
    public static Complex[,] Of(BasisValue basis, int levels, IReadOnlyDictionary<string, Complex[,]> matrices) => basis.Kind switch
    {
        BasisKind.Level => MatrixMath.Identity(levels),
        BasisKind.Fourier => Fourier(levels, basis.Argument < 0 ? levels : basis.Argument),
        BasisKind.Phased => Phased(levels, basis.Argument),
        _ => matrices[basis.File!],
    };

    /// <summary>The Fourier matrix on the first <paramref name="count"/> levels, the others left as they are.</summary>
    public static Complex[,] Fourier(int levels, int count)
    {
        Complex[,] vectors = MatrixMath.Identity(levels);
        for (int l = 0; l < count; l++)
        {
            for (int k = 0; k < count; k++)
                vectors[l, k] = RootOfUnity((long)l * k, count) / Math.Sqrt(count);
        }

        return vectors;
    }

    /// <summary>exp(2πi k/n), with the exponent reduced first so that large products lose no digits.</summary>
    public static Complex RootOfUnity(long k, int n)
    {
        long rest = ((k % n) + n) % n;
        return (4 * rest % n) == 0 ? QuarterTurns((int)(4 * rest / n)) : Complex.FromPolarCoordinates(1, 2 * Math.PI * rest / n);
    }

    private static Complex[,] Phased(int levels, int j)
    {
        Complex[,] vectors = Fourier(levels, levels);
        int period = levels % 2 == 0 ? 2 * levels : levels;
        for (int l = 0; l < levels; l++)
        {
            Complex phase = RootOfUnity((long)j * l * l, period);
            for (int k = 0; k < levels; k++)
                vectors[l, k] *= phase;
        }

        return vectors;
    }

    private static Complex QuarterTurns(int quarters) => quarters switch
    {
        0 => Complex.One,
        1 => Complex.ImaginaryOne,
        2 => -Complex.One,
        _ => -Complex.ImaginaryOne,
    };
}
