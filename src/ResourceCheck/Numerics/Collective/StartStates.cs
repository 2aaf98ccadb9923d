using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Collective;

/// <summary>Starts of relaxation as d^N amplitudes; the first emitter is the most significant digit.</summary>
internal static class StartStates
{
    /// <summary>Each emitter in a level of its own choice.</summary>
    public static Complex[] Product(IReadOnlyList<int> levels, int d)
    {
        Complex[] ket = new Complex[AntisymmetricState.Power(d, levels.Count)];
        ket[Permutations.IndexOf([.. levels], d)] = Complex.One;
        return ket;
    }

    /// <summary>All N emitters in level 0: fully inverted.</summary>
    public static Complex[] Inverted(int emitters, int d) => Product(new int[emitters], d);

    /// <summary>(|01⟩ - |10⟩)/√2 of the first two emitters, the bystanders in the given levels.</summary>
    public static Complex[] Pair(IReadOnlyList<int> bystanders, int d)
    {
        Complex[] ket = new Complex[AntisymmetricState.Power(d, bystanders.Count + 2)];
        ket[Permutations.IndexOf([0, 1, .. bystanders], d)] = Math.Sqrt(0.5);
        ket[Permutations.IndexOf([1, 0, .. bystanders], d)] = -Math.Sqrt(0.5);
        return ket;
    }

    /// <summary>|ψ⟩⟨ψ|, row after row.</summary>
    public static Complex[] Operator(Complex[] ket)
    {
        Complex[] rho = new Complex[checked(ket.Length * ket.Length)];
        for (int r = 0; r < ket.Length; r++)
        {
            for (int c = 0; ket[r] != Complex.Zero && c < ket.Length; c++)
                rho[(r * ket.Length) + c] = ket[r] * Complex.Conjugate(ket[c]);
        }

        return rho;
    }
}
