using System.Numerics;

namespace ResourceCheck.Numerics;

/// <summary>
/// Orthonormal Hermitian operator basis of one d-level site: identity/√d; the d-1 traceless diagonal matrices
/// (Σ_{j&lt;m}|j⟩⟨j| - m|m⟩⟨m|)/√(m(m+1)); for each pair a&lt;b (|a⟩⟨b|+|b⟩⟨a|)/√2 and (-i|a⟩⟨b|+i|b⟩⟨a|)/√2.
/// These are the generalised Gell-Mann matrices (Bertlmann and Krammer, J. Phys. A 41, 235303 (2008)), scaled to norm 1.
/// A state is the real vector of its expectation values; depolarising and dephasing with one rate are diagonal.
/// With a sink, one more component holds the population of lost qudits, which have no coherence with any level.
/// </summary>
internal sealed class OperatorBasis
{
    private readonly (int Row, int Column, Complex Value)[][] _elements;

    public OperatorBasis(int levels, bool sink)
    {
        Levels = levels;
        HasSink = sink;
        OperatorCount = levels * levels;
        Dimension = OperatorCount + (sink ? 1 : 0);
        _elements = [.. Elements(levels)];
        Trace = Functional(Identity(levels), 1);
    }

    public int Levels { get; }

    public bool HasSink { get; }

    /// <summary>d², the number of components without the sink's.</summary>
    public int OperatorCount { get; }

    /// <summary>d², plus 1 with a sink.</summary>
    public int Dimension { get; }

    /// <summary>Functional of the trace, the sink counted.</summary>
    public double[] Trace { get; }

    /// <summary>Nonzero entries of basis element <paramref name="index"/>, below <see cref="OperatorCount"/>.</summary>
    public ReadOnlySpan<(int Row, int Column, Complex Value)> Element(int index) => _elements[index];

    /// <summary>Components Tr(B_i A) of a Hermitian d×d matrix; the same numbers serve as state vector and as functional.</summary>
    public double[] Functional(Complex[,] hermitian, double sink)
    {
        double[] components = new double[Dimension];
        for (int i = 0; i < OperatorCount; i++)
            components[i] = Component(i, hermitian);
        if (HasSink)
            components[OperatorCount] = sink;
        return components;
    }

    /// <summary>The map ρ → Σ K ρ K†. What the operators do not keep goes to the sink when there is one, and is dropped otherwise.</summary>
    public SiteMap FromKraus(IReadOnlyList<Complex[,]> operators)
    {
        double[] entries = new double[Dimension * Dimension];
        for (int j = 0; j < OperatorCount; j++)
        {
            Complex[,] image = Apply(operators, j);
            for (int i = 0; i < OperatorCount; i++)
                entries[(i * Dimension) + j] = Component(i, image);
            if (HasSink)
                entries[(OperatorCount * Dimension) + j] = TraceOf(j) - MatrixMath.Trace(image).Real;
        }

        if (HasSink)
            entries[^1] = 1;
        return SiteMap.From(Dimension, entries);
    }

    /// <summary>The map ρ → U ρ U†.</summary>
    public SiteMap FromUnitary(Complex[,] unitary)
    {
        SiteMap map = FromKraus([unitary]);
        if (HasSink)
            Array.Clear(map.Entries, OperatorCount * Dimension, OperatorCount); // round-off only: a unitary loses nothing
        return map;
    }

    /// <summary>The map ρ → K ρ K† that drops what K does not keep, the sink included.</summary>
    public SiteMap DropLost(Complex[,] k)
    {
        SiteMap map = FromKraus([k]);
        if (HasSink)
            Array.Clear(map.Entries, OperatorCount * Dimension, Dimension);
        return map;
    }

    /// <summary>The map that keeps what is in the levels and drops the sink.</summary>
    public SiteMap DropSink()
    {
        SiteMap map = SiteMap.Identity(Dimension);
        if (HasSink)
            map.Entries[^1] = 0;
        return map;
    }

    private double TraceOf(int index) => index == 0 ? Math.Sqrt(Levels) : 0;

    private double Component(int index, Complex[,] hermitian)
    {
        double sum = 0;
        foreach ((int row, int column, Complex value) in _elements[index])
            sum += (value * hermitian[column, row]).Real;
        return sum;
    }

    private Complex[,] Apply(IReadOnlyList<Complex[,]> operators, int index)
    {
        Complex[,] image = new Complex[Levels, Levels];
        foreach (Complex[,] k in operators)
        {
            foreach ((int row, int column, Complex value) in _elements[index])
                AddOuter(image, k, row, column, value);
        }

        return image;
    }

    private void AddOuter(Complex[,] image, Complex[,] k, int row, int column, Complex value)
    {
        for (int a = 0; a < Levels; a++)
        {
            for (int b = 0; b < Levels; b++)
                image[a, b] += k[a, row] * value * Complex.Conjugate(k[b, column]);
        }
    }

    private static Complex[,] Identity(int levels) => MatrixMath.Identity(levels);

    private static IEnumerable<(int Row, int Column, Complex Value)[]> Elements(int d)
    {
        yield return [.. Enumerable.Range(0, d).Select(j => (j, j, new Complex(1 / Math.Sqrt(d), 0)))];
        for (int m = 1; m < d; m++)
        {
            double norm = 1 / Math.Sqrt(m * (m + 1.0));
            int last = m;
            yield return [.. Enumerable.Range(0, m + 1).Select(j => (j, j, new Complex(j < last ? norm : -last * norm, 0)))];
        }

        double half = 1 / Math.Sqrt(2);
        for (int a = 0; a < d; a++)
        {
            for (int b = a + 1; b < d; b++)
            {
                yield return [(a, b, half), (b, a, half)];
                yield return [(a, b, new Complex(0, -half)), (b, a, new Complex(0, half))];
            }
        }
    }
}
