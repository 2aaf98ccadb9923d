using System.Numerics;
using ResourceCheck.Numerics;
using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Numerics.States;
using ResourceCheck.Tests.Engines;

namespace ResourceCheck.Tests.Antisymmetric;

/// <summary>The plain slow twins of the kernels for antisymmetric states: vectors of N^N amplitudes, every string and every Kraus operator one by one.</summary>
internal static class PlainTensors
{
    /// <summary>⟨S_N|A_1⊗…⊗A_N|S_N⟩.</summary>
    public static Complex Expectation(IReadOnlyList<LocalOperator> operators)
    {
        int n = operators.Count;
        Complex[] ket = AntisymmetricState.Ket(n), image = ket;
        for (int i = 0; i < n; i++)
            image = LocalOperation.Apply(image, n, n, i, operators[i].ToMatrix());
        return ket.Zip(image, (a, b) => Complex.Conjugate(a) * b).Aggregate(Complex.Zero, (sum, x) => sum + x);
    }

    /// <summary>Σ over strings of Kraus operators and of operators of those who were read out of the overlap with |S_m⟩ on the first m parties.</summary>
    public static double Overlap(IReadOnlyList<IReadOnlyList<Complex[,]>> kraus, IReadOnlyList<LocalOperator> others)
    {
        int m = kraus.Count, n = m + others.Count;
        Complex[] target = AntisymmetricState.Ket(m, n);
        return Strings([.. kraus.Select(k => k.Count)]).Sum(string_ =>
        {
            Complex[] image = AntisymmetricState.Ket(n);
            for (int i = 0; i < m; i++)
                image = LocalOperation.Apply(image, n, n, i, kraus[i][string_[i]]);
            return OverlapOf(image, target, others, n, m);
        });
    }

    /// <summary>All strings of outcomes with the given numbers of outcomes, the first most significant.</summary>
    public static IEnumerable<int[]> Strings(IReadOnlyList<int> counts)
    {
        IEnumerable<int[]> strings = [[]];
        foreach (int count in counts)
            strings = strings.SelectMany(s => Enumerable.Range(0, count).Select(k => (int[])[.. s, k]));
        return strings;
    }

    /// <summary>A random positive operator of norm about 1, with a random trace.</summary>
    public static LocalOperator Effect(Random random, int d)
    {
        Complex[,] m = RandomWorld.Matrix(random, d);
        return LocalOperator.Of(MatrixMath.Multiply(MatrixMath.Adjoint(m), m));
    }

    /// <summary>Random operators of d outcomes that add up to the identity: random vectors, made complete.</summary>
    public static LocalOperator[] Measurement(Random random, int d)
    {
        Complex[,] u = RandomWorld.Unitary(random, d);
        double[,] confusion = RandomWorld.Stochastic(random, d);
        return [.. Enumerable.Range(0, d).Select(k => LocalOperator.Combination(
            [.. Enumerable.Range(0, d).Select(l => LocalOperator.Of(Projector(u, l)))], [.. Enumerable.Range(0, d).Select(l => (Complex)confusion[l, k])]))];
    }

    /// <summary>Random Kraus operators, not complete.</summary>
    public static Complex[][,] Kraus(Random random, int d, int count) => [.. Enumerable.Range(0, count).Select(_ => RandomWorld.Matrix(random, d))];

    /// <summary>Kraus operators of random jumps and of the damped coherences between.</summary>
    public static Complex[][,] IncoherentKraus(Random random, int d)
    {
        Complex[,] keep = new Complex[d, d], other = new Complex[d, d];
        List<Complex[,]> kraus = [keep, other];
        for (int a = 0; a < d; a++)
        {
            (keep[a, a], other[a, a]) = (random.NextDouble(), random.NextDouble() - 0.5);
            for (int b = 0; b < d; b++)
            {
                Complex[,] jump = new Complex[d, d];
                jump[a, b] = a == b ? 0 : 0.4 * random.NextDouble();
                kraus.Add(jump);
            }
        }

        return [.. kraus];
    }

    public static Complex[,] Projector(Complex[,] vectors, int k)
    {
        int d = vectors.GetLength(0);
        Complex[,] projector = new Complex[d, d];
        for (int i = 0; i < d * d; i++)
            projector[i / d, i % d] = vectors[i / d, k] * Complex.Conjugate(vectors[i % d, k]);
        return projector;
    }

    private static double OverlapOf(Complex[] image, Complex[] target, IReadOnlyList<LocalOperator> others, int n, int m)
    {
        int rest = AntisymmetricState.Power(n, n - m);
        Complex[] left = new Complex[rest]; // ⟨S_m|image⟩, a vector of the others
        for (int i = 0; i < image.Length; i++)
            left[i % rest] += Complex.Conjugate(target[i / rest]) * image[i];
        Complex[] after = left;
        for (int j = 0; j < others.Count; j++)
            after = LocalOperation.Apply(after, n, n - m, j, others[j].ToMatrix());
        return left.Zip(after, (a, b) => (Complex.Conjugate(a) * b).Real).Sum();
    }
}
