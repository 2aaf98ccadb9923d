using System.Numerics;

namespace ResourceCheck.Numerics.States;

/// <summary>
/// |S_N⟩ = (1/√N!) Σ_π sgn(π) |π(0) … π(N-1)⟩, the one state of N qudits of N levels that changes sign under every swap.
/// </summary>
internal static class AntisymmetricState
{
    /// <summary>Most parties whose d^N amplitudes are laid out: 8 take 16777216 amplitudes, 256 MiB; 9 would take 5.8 GiB.</summary>
    public const int MostParties = 8;

    /// <summary>Its N^N amplitudes; the first qudit is the most significant digit.</summary>
    public static Complex[] Ket(int n) => Ket(n, n);

    /// <summary>The same state in the lowest N of d levels: d^N amplitudes.</summary>
    public static Complex[] Ket(int n, int d)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(n, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(n, MostParties);
        ArgumentOutOfRangeException.ThrowIfLessThan(d, n);
        double amplitude = 1 / Math.Sqrt(Factorial(n));
        Complex[] ket = new Complex[Power(d, n)];
        foreach ((int[] levels, int sign) in Permutations.Of(n))
            ket[Permutations.IndexOf(levels, d)] = sign * amplitude;
        return ket;
    }

    /// <summary>n! as a number that is exact up to n = 18.</summary>
    public static double Factorial(int n)
    {
        double product = 1;
        for (int i = 2; i <= n; i++)
            product *= i;
        return product;
    }

    /// <summary>d^N; throws <see cref="OverflowException"/> beyond the range of an index.</summary>
    public static int Power(int d, int n)
    {
        int power = 1;
        for (int i = 0; i < n; i++)
            power = checked(power * d);
        return power;
    }
}
