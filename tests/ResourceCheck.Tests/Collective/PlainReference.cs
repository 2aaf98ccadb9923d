using System.Numerics;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Tests.Collective;

/// <summary>The master equation written out with full matrices: the plain twin of the block kernels.</summary>
internal static class PlainReference
{
    /// <summary>H_eff = Σ_j Σ_ik (Ω^j_ik - iγ^j_ik/2) σ^j†_i σ^j_k on d^N levels.</summary>
    public static Complex[,] EffectiveHamiltonian(Couplings c)
    {
        int size = AntisymmetricState.Power(c.Levels, c.Emitters);
        Complex[,] h = new Complex[size, size];
        for (int column = 0; column < size; column++)
        {
            foreach ((int j, int i, int k) in Terms(c))
            {
                if (Lowered(c, column, k, j) is { } lower && Raised(c, lower, i, j) is { } row)
                    h[row, column] += new Complex(c.Shift[j - 1][i, k], -c.Decay[j - 1][i, k] / 2);
            }
        }

        return h;
    }

    /// <summary>dρ/dt, everything included.</summary>
    public static Complex[] Derivative(Couplings c, Complex[] rho)
    {
        Complex[,] h = EffectiveHamiltonian(c);
        int size = h.GetLength(0);
        Complex[] result = new Complex[rho.Length];
        for (int r = 0; r < size; r++)
        {
            for (int s = 0; s < size; s++)
            {
                for (int m = 0; m < size; m++)
                {
                    result[(r * size) + s] += -Complex.ImaginaryOne
                        * ((h[r, m] * rho[(m * size) + s]) - (rho[(r * size) + m] * Complex.Conjugate(h[s, m])));
                }

                AddPhotons(c, rho, size, r, s, result);
            }
        }

        return result;
    }

    private static void AddPhotons(Couplings c, Complex[] rho, int size, int r, int s, Complex[] result)
    {
        foreach ((int j, int i, int k) in Terms(c))
        {
            if (Lowered(c, r, i, j) is { } row && Lowered(c, s, k, j) is { } column)
                result[(row * size) + column] += c.Decay[j - 1][i, k] * rho[(r * size) + s];
        }
    }

    private static IEnumerable<(int J, int I, int K)> Terms(Couplings c) =>
        from j in Enumerable.Range(1, c.Levels - 1)
        from i in Enumerable.Range(0, c.Emitters)
        from k in Enumerable.Range(0, c.Emitters)
        select (j, i, k);

    private static int? Lowered(Couplings c, int index, int emitter, int level) => Moved(c, index, emitter, 0, level);

    private static int? Raised(Couplings c, int index, int emitter, int level) => Moved(c, index, emitter, level, 0);

    private static int? Moved(Couplings c, int index, int emitter, int from, int to)
    {
        int weight = AntisymmetricState.Power(c.Levels, c.Emitters - 1 - emitter);
        return index / weight % c.Levels == from ? index + ((to - from) * weight) : null;
    }
}
