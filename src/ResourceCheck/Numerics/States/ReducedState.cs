using System.Numerics;

namespace ResourceCheck.Numerics.States;

/// <summary>What one qudit's state is when the others are ignored, row after row.</summary>
internal static class ReducedState
{
    /// <summary>Of a state vector.</summary>
    public static Complex[] OfKet(Complex[] ket, int d, int n, int which)
    {
        int stride = AntisymmetricState.Power(d, n - 1 - which);
        Complex[] reduced = new Complex[d * d];
        foreach (int rest in Rests(ket.Length, d, stride))
        {
            for (int r = 0; r < d; r++)
            {
                for (int c = 0; c < d; c++)
                    reduced[r * d + c] += ket[rest + r * stride] * Complex.Conjugate(ket[rest + c * stride]);
            }
        }

        return reduced;
    }

    /// <summary>Of a density matrix.</summary>
    public static Complex[] OfDensity(Complex[] density, int d, int n, int which)
    {
        int size = AntisymmetricState.Power(d, n);
        int stride = AntisymmetricState.Power(d, n - 1 - which);
        Complex[] reduced = new Complex[d * d];
        foreach (int rest in Rests(size, d, stride))
        {
            for (int r = 0; r < d; r++)
            {
                for (int c = 0; c < d; c++)
                    reduced[r * d + c] += density[(rest + r * stride) * size + rest + c * stride];
            }
        }

        return reduced;
    }

    private static IEnumerable<int> Rests(int size, int d, int stride)
    {
        for (int block = 0; block < size; block += stride * d)
        {
            for (int offset = 0; offset < stride; offset++)
                yield return block + offset;
        }
    }
}
