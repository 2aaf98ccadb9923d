using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace ResourceCheck.Numerics.States;

/// <summary>
/// Largest ⟨S|(U_1⊗…⊗U_N)† ρ (U_1⊗…⊗U_N)|S⟩ over local unitaries: how much of a lost fidelity is only a turned frame. In each U_i alone the
/// value is a convex function, so that replacing U_i by the unitary polar factor of the gradient never lowers it (the polar factor is the
/// nearest unitary: Fan and Hoffman, Proc. Am. Math. Soc. 6, 111 (1955)). Sweeps over all parties from several starts end in local maxima:
/// every value reached is a lower bound of the largest one. ρ must be positive for values never to fall; the best value seen is returned.
/// </summary>
internal static class LocalFrames
{
    /// <summary>Sweeps gain a constant factor each; 200 suffice for 1e-12 unless two maxima almost coincide.</summary>
    private const int MostSweeps = 200;

    /// <summary>For dimension 3125 a sweep takes about a second.</summary>
    private const int MostSweepsWhenLarge = 12;

    private const int Starts = 6;
    private const double Gain = 1e-13;

    /// <summary>The best value over all starts; the first start leaves all frames as they are, the others are drawn from a fixed seed.</summary>
    /// <param name="apply">ρ times a vector.</param>
    /// <param name="n">Number of qudits, and of levels.</param>
    /// <param name="large">Whether applying ρ is so dear that only the first start and few sweeps are affordable.</param>
    public static double Best(Func<Complex[], Complex[]> apply, int n, bool large)
    {
        Random random = new(20240229);
        double best = 0;
        for (int start = 0; start < (large ? 1 : Starts); start++)
        {
            Matrix<Complex>[] frames = [.. Enumerable.Range(0, n).Select(_ => start == 0 ? Matrix<Complex>.Build.DenseIdentity(n) : Draw(random, n))];
            best = Math.Max(best, Climb(apply, frames, large ? MostSweepsWhenLarge : MostSweeps));
        }

        return best;
    }

    private static double Climb(Func<Complex[], Complex[]> apply, Matrix<Complex>[] frames, int sweeps)
    {
        double best = 0;
        for (int sweep = 0; sweep < sweeps; sweep++)
        {
            double before = best;
            for (int which = 0; which < frames.Length; which++)
                best = Math.Max(best, Improve(apply, frames, which));
            if (sweep > 0 && best - before <= Gain)
                break;
        }

        return best;
    }

    /// <summary>The value before the change of one frame.</summary>
    private static double Improve(Func<Complex[], Complex[]> apply, Matrix<Complex>[] frames, int which)
    {
        int n = frames.Length;
        Complex[] others = Others(frames, which);
        Complex[] w = apply(LocalOperation.Apply(others, n, n, which, frames[which].ToArray()));
        Matrix<Complex> gradient = Gradient(w, others, n, which);
        double value = frames[which].ConjugateTransposeThisAndMultiply(gradient).Trace().Real;
        frames[which] = PolarFactor(gradient);
        return value;
    }

    private static Complex[] Others(Matrix<Complex>[] frames, int which)
    {
        Complex[] ket = AntisymmetricState.Ket(frames.Length);
        for (int i = 0; i < frames.Length; i++)
            ket = i == which ? ket : LocalOperation.Apply(ket, frames.Length, frames.Length, i, frames[i].ToArray());
        return ket;
    }

    /// <summary>G_ab = Σ_rest w_{a,rest} s*_{b,rest}, the derivative of the value with respect to the conjugate of the frame's entry ab.</summary>
    private static Matrix<Complex> Gradient(Complex[] w, Complex[] s, int n, int which)
    {
        int stride = AntisymmetricState.Power(n, n - 1 - which);
        Matrix<Complex> gradient = Matrix<Complex>.Build.Dense(n, n);
        for (int index = 0; index < w.Length; index++)
        {
            int a = index / stride % n;
            int rest = index - a * stride;
            for (int b = 0; b < n; b++)
                gradient[a, b] += w[index] * Complex.Conjugate(s[rest + b * stride]);
        }

        return gradient;
    }

    private static Matrix<Complex> PolarFactor(Matrix<Complex> matrix)
    {
        Svd<Complex> svd = matrix.Map(HermitianMatrix.WithoutDenormals).Svd();
        return svd.U * svd.VT;
    }

    private static Matrix<Complex> Draw(Random random, int n) =>
        PolarFactor(Matrix<Complex>.Build.Dense(n, n, (_, _) => new Complex(Normal(random), Normal(random))));

    private static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
