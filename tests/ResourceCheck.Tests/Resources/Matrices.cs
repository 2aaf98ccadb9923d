using System.Numerics;
using System.Text;

namespace ResourceCheck.Tests.Resources;

/// <summary>Small states and their texts.</summary>
internal static class Matrices
{
    /// <summary>|ψ⟩⟨ψ|, row after row.</summary>
    public static Complex[] Projector(Complex[] ket) =>
        [.. from r in ket from c in ket select r * Complex.Conjugate(c)];

    /// <summary>(1-w) ρ + w 1/dimension.</summary>
    public static Complex[] WithWhiteNoise(Complex[] density, int size, double w) =>
        [.. density.Select((x, at) => x * (1 - w) + (at / size == at % size ? w / size : 0))];

    /// <summary>A diagonal matrix.</summary>
    public static Complex[] Diagonal(params double[] values) =>
        [.. from r in Enumerable.Range(0, values.Length) from c in Enumerable.Range(0, values.Length) select r == c ? new Complex(values[r], 0) : Complex.Zero];

    /// <summary>A density matrix as JSON.</summary>
    public static string Json(int parties, Complex[] density, int size)
    {
        StringBuilder text = new($"{{\"parties\": {parties}, \"density\": [\n");
        for (int r = 0; r < size; r++)
            text.Append('[').AppendJoin(", ", density[(r * size)..((r + 1) * size)].Select(x => $"[{x.Real:R}, {x.Imaginary:R}]")).Append(r < size - 1 ? "],\n" : "]\n");
        return text.Append("]}").ToString();
    }

    /// <summary>A complex matrix with independent entries from a seed, each part between -1 and 1.</summary>
    public static Complex[,] Random(int seed, int size)
    {
        Random random = new(seed);
        Complex[,] a = new Complex[size, size];
        for (int r = 0; r < size; r++)
        {
            for (int c = 0; c < size; c++)
                a[r, c] = new(2 * random.NextDouble() - 1, 2 * random.NextDouble() - 1);
        }

        return a;
    }

    /// <summary>Determinant by the sum over permutations, independent of any library.</summary>
    public static Complex Determinant(Complex[,] a) =>
        ResourceCheck.Numerics.States.Permutations.Of(a.GetLength(0))
            .Select(p => p.Levels.Select((column, row) => a[row, column]).Aggregate(new Complex(p.Sign, 0), Complex.Multiply))
            .Aggregate(Complex.Add);
}
