using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>A completely positive map on one qudit: element [a,b;p,q] is ⟨a|Φ(|p⟩⟨q|)|b⟩. What ends in a sink is left out.</summary>
internal sealed class LocalChannel
{
    /// <summary>Elements below this are round-off when a map is asked for its form.</summary>
    private const double Nothing = 1e-13;

    /// <summary>Kraus operators whose squared norm is below this are round-off of a map of lower rank.</summary>
    private const double NoWeight = 1e-13;

    private readonly Complex[] _elements;
    private IReadOnlyList<LocalOperator>? _kraus;

    private LocalChannel(int levels, Complex[] elements)
    {
        (Levels, _elements) = (levels, elements);
        IsIncoherent = FindIncoherent();
    }

    /// <summary>d.</summary>
    public int Levels { get; }

    /// <summary>
    /// Whether populations go to populations and the coherence |p⟩⟨q| to a real multiple of itself: decay, dephasing, depolarising, loss.
    /// </summary>
    public bool IsIncoherent { get; }

    public Complex this[int a, int b, int p, int q] => _elements[Index(a, b, p, q)];

    /// <summary>d⁴ elements: row a, b, then p, q.</summary>
    public ReadOnlySpan<Complex> Elements => _elements;

    /// <summary>From a map on operator space; its sink is left out.</summary>
    public static LocalChannel Of(OperatorBasis basis, SiteMap map)
    {
        int d = basis.Levels;
        Complex[] elements = new Complex[d * d * d * d];
        for (int i = 0; i < basis.OperatorCount; i++)
        {
            for (int j = 0; j < basis.OperatorCount; j++)
            {
                if (map[i, j] != 0)
                    Add(elements, d, basis.Element(i), basis.Element(j), map[i, j]);
            }
        }

        return new LocalChannel(d, elements);
    }

    /// <summary>ρ → Σ K ρ K†.</summary>
    public static LocalChannel Of(IReadOnlyList<Complex[,]> kraus)
    {
        int d = kraus[0].GetLength(0);
        Complex[] elements = new Complex[d * d * d * d];
        foreach (Complex[,] k in kraus)
        {
            for (int i = 0; i < elements.Length; i++)
            {
                (int a, int b, int p, int q) = (i / (d * d * d), i / (d * d) % d, i / d % d, i % d);
                elements[i] += k[a, p] * Complex.Conjugate(k[b, q]);
            }
        }

        return new LocalChannel(d, elements);
    }

    /// <summary>Populations p → a with <paramref name="jump"/>(a, p), the coherence between p and q times <paramref name="keep"/>(p, q).</summary>
    public static LocalChannel Incoherent(int levels, Func<int, int, double> jump, Func<int, int, double> keep)
    {
        Complex[] elements = new Complex[levels * levels * levels * levels];
        for (int i = 0; i < levels * levels; i++)
        {
            (int a, int p) = (i / levels, i % levels);
            elements[(((((a * levels) + a) * levels) + p) * levels) + p] = jump(a, p);
            if (a != p)
                elements[(((((a * levels) + p) * levels) + a) * levels) + p] = keep(a, p);
        }

        return new LocalChannel(levels, elements);
    }

    /// <summary>ρ → tr(Eρ) |v⟩⟨v|: a qudit is read out, and a vector put in its place.</summary>
    public static LocalChannel MeasureAndPrepare(LocalOperator e, Complex[] v)
    {
        int d = e.Levels;
        Complex[] elements = new Complex[d * d * d * d];
        for (int i = 0; i < elements.Length; i++)
        {
            (int a, int b, int p, int q) = (i / (d * d * d), i / (d * d) % d, i / d % d, i % d);
            elements[i] = v[a] * Complex.Conjugate(v[b]) * e[q, p];
        }

        return new LocalChannel(d, elements);
    }

    /// <summary>The channel followed by ρ → U† ρ U: its output seen from the basis U.</summary>
    public LocalChannel SeenFrom(Complex[,] basis)
    {
        int d = Levels, block = d * d;
        Complex[] elements = new Complex[_elements.Length];
        Complex[,] part = new Complex[d, d], adjoint = MatrixMath.Adjoint(basis);
        for (int input = 0; input < block; input++)
        {
            for (int output = 0; output < block; output++)
                part[output / d, output % d] = _elements[(output * block) + input];
            Complex[,] turned = MatrixMath.Multiply(adjoint, MatrixMath.Multiply(part, basis));
            for (int output = 0; output < block; output++)
                elements[(output * block) + input] = turned[output / d, output % d];
        }

        return new LocalChannel(d, elements);
    }

    /// <summary>Kraus operators of least number: eigenvectors of Choi's matrix (M.-D. Choi, Linear Algebra Appl. 10, 285 (1975)).</summary>
    public IReadOnlyList<LocalOperator> Kraus() => _kraus ??= FindKraus();

    private LocalOperator[] FindKraus()
    {
        int d = Levels, n = d * d;
        Matrix<Complex> choi = Matrix<Complex>.Build.Dense(n, n, (row, column) => this[row / d, column / d, row % d, column % d]);
        var eigen = ((choi + choi.ConjugateTranspose()) / 2).Evd(Symmetricity.Hermitian);
        return [.. Enumerable.Range(0, n).Where(k => eigen.EigenValues[k].Real > NoWeight).Select(k => Operator(eigen.EigenVectors.Column(k), eigen.EigenValues[k].Real))];
    }

    private LocalOperator Operator(MathNet.Numerics.LinearAlgebra.Vector<Complex> vector, double weight)
    {
        Complex[,] k = new Complex[Levels, Levels];
        for (int i = 0; i < vector.Count; i++)
            k[i / Levels, i % Levels] = Math.Sqrt(weight) * vector[i];
        return LocalOperator.Of(k);
    }

    private int Index(int a, int b, int p, int q) => (((((a * Levels) + b) * Levels) + p) * Levels) + q;

    private static void Add(
        Complex[] elements, int d, ReadOnlySpan<(int Row, int Column, Complex Value)> output, ReadOnlySpan<(int Row, int Column, Complex Value)> input, double factor)
    {
        foreach ((int a, int b, Complex value) in output)
        {
            foreach ((int q, int p, Complex weight) in input)
                elements[(((((a * d) + b) * d) + p) * d) + q] += factor * value * weight;
        }
    }

    private bool FindIncoherent()
    {
        for (int i = 0; i < _elements.Length; i++)
        {
            int d = Levels, a = i / (d * d * d), b = i / (d * d) % d, p = i / d % d, q = i % d;
            bool population = a == b && p == q, coherence = a == p && b == q;
            double wrong = population || coherence ? Math.Abs(_elements[i].Imaginary) : _elements[i].Magnitude;
            if (wrong > Nothing)
                return false;
        }

        return true;
    }
}
