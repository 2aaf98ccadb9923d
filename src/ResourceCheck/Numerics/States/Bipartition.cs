using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace ResourceCheck.Numerics.States;

/// <summary>
/// A cut of N qudits into two groups. Negativity is the sum of the absolute values of the negative eigenvalues of the partial transpose
/// (Vidal and Werner, Phys. Rev. A 65, 032314 (2002)), not its double.
/// </summary>
/// <param name="Inside">Whether each qudit belongs to the first group.</param>
internal sealed record Bipartition(bool[] Inside)
{
    /// <summary>Every cut once: the first group is the smaller one, and holds the first qudit when both are equal.</summary>
    /// <param name="n">Number of qudits.</param>
    /// <param name="largestGroup">Largest size of the first group.</param>
    public static IEnumerable<Bipartition> Cuts(int n, int largestGroup) =>
        from set in Enumerable.Range(1, (1 << n) - 2)
        let inside = Enumerable.Range(0, n).Select(i => (set >> i & 1) == 1).ToArray()
        let size = inside.Count(member => member)
        where size <= largestGroup && (2 * size < n || (2 * size == n && inside[0]))
        orderby size, set
        select new Bipartition(inside);

    /// <summary>Groups written with qudits counted from 1, such as <c>1 | 2, 3</c>.</summary>
    public override string ToString() => $"{List(true)} | {List(false)}";

    /// <summary>Negativity of a state vector: ((Σ s)² - Σ s²)/2 with its Schmidt coefficients s.</summary>
    public double NegativityOfKet(Complex[] ket, int d)
    {
        double[] s = SchmidtCoefficients(ket, d);
        double sum = s.Sum();
        return (sum * sum - s.Sum(x => x * x)) / 2;
    }

    /// <summary>Schmidt coefficients in descending order.</summary>
    public double[] SchmidtCoefficients(Complex[] ket, int d)
    {
        int columns = AntisymmetricState.Power(d, Inside.Count(member => member));
        Matrix<Complex> matrix = Matrix<Complex>.Build.Dense(ket.Length / columns, columns);
        for (int index = 0; index < ket.Length; index++)
        {
            (int inner, int outer) = Split(index, d);
            matrix[outer, inner] = HermitianMatrix.WithoutDenormals(ket[index]);
        }

        return [.. matrix.Svd(false).S.Select(value => value.Real)];
    }

    /// <summary>Negativity of a density matrix.</summary>
    public double NegativityOfDensity(Complex[] density, int d)
    {
        int size = AntisymmetricState.Power(d, Inside.Length);
        return HermitianMatrix.Eigenvalues(PartialTranspose(density, d, size), size).Sum(value => Math.Max(0, -value));
    }

    private Complex[] PartialTranspose(Complex[] density, int d, int size)
    {
        Complex[] result = new Complex[density.Length];
        int[] inner = [.. Enumerable.Range(0, size).Select(index => InsidePart(index, d))];
        for (int r = 0; r < size; r++)
        {
            for (int c = 0; c < size; c++)
                result[(r - inner[r] + inner[c]) * size + (c - inner[c] + inner[r])] = density[r * size + c];
        }

        return result;
    }

    /// <summary>The index with the digits of the second group set to 0.</summary>
    private int InsidePart(int index, int d)
    {
        int part = 0;
        int weight = 1;
        for (int which = Inside.Length - 1; which >= 0; which--, index /= d, weight *= d)
            part += Inside[which] ? index % d * weight : 0;
        return part;
    }

    private (int Inner, int Outer) Split(int index, int d)
    {
        (int inner, int innerWeight, int outer, int outerWeight) = (0, 1, 0, 1);
        for (int which = Inside.Length - 1; which >= 0; which--, index /= d)
        {
            if (Inside[which])
                (inner, innerWeight) = (inner + index % d * innerWeight, innerWeight * d);
            else
                (outer, outerWeight) = (outer + index % d * outerWeight, outerWeight * d);
        }

        return (inner, outer);
    }

    private string List(bool side) => string.Join(", ", Enumerable.Range(0, Inside.Length).Where(i => Inside[i] == side).Select(i => i + 1));
}
