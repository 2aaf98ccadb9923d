using System.Numerics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// ⟨S_N|A_1⊗…⊗A_N|S_N⟩, the mixed discriminant D(A_1, …, A_N), normalised to D(1, …, 1) = 1 (R. B. Bapat, Linear Algebra Appl. 126, 107
/// (1989)). Factors that are multiples of the identity belong to parties that nobody looks at; they leave the sum and turn determinants
/// into elementary symmetric functions of eigenvalues.
/// </summary>
internal static class MixedDiscriminant
{
    /// <summary>Up to this many observed parties the sum over cycles of permutations is cheapest, whatever N is.</summary>
    private const int MostCycles = 4;

    /// <summary>Relative error of one of its products, generously.</summary>
    private const double CycleError = 1e-16;

    /// <summary>D of N operators on N levels.</summary>
    public static RoundedSum Of(IReadOnlyList<LocalOperator> operators)
    {
        double scalar = operators.Where(a => a.IsScalar).Aggregate(1.0, (product, a) => product * a.Re[0]);
        LocalOperator[] observed = [.. operators.Where(a => !a.IsScalar)];
        return (scalar == 0 ? default : Marginal(observed, operators.Count)).Times(scalar);
    }

    /// <summary>Complex multiplications that <see cref="Of"/> takes with k factors that are no multiples of the identity.</summary>
    public static double Work(int observed, int n)
    {
        if (observed <= MostCycles)
            return 24.0 * n * n * n;
        return Math.Min(SignedDeterminants.Work(n, n), (n + 1) * SignedDeterminants.Work(observed, n));
    }

    /// <summary>Parts of one matrix after the other, real and imaginary apart, as <see cref="SignedDeterminants"/> reads them.</summary>
    public static (double[] Re, double[] Im) Pack(IReadOnlyList<LocalOperator> operators)
    {
        int size = operators[0].Re.Length;
        double[] re = new double[operators.Count * size], im = new double[re.Length];
        for (int i = 0; i < operators.Count; i++)
        {
            operators[i].Re.CopyTo(re, i * size);
            operators[i].Im.CopyTo(im, i * size);
        }

        return (re, im);
    }

    /// <summary>1 / (N! 2^{N-1}).</summary>
    public static double Normalisation(int n)
    {
        double product = 1;
        for (int i = 2; i <= n; i++)
            product /= 2.0 * i;
        return product;
    }

    private static RoundedSum Marginal(LocalOperator[] observed, int n)
    {
        if (observed.Length <= MostCycles)
            return ByCycles(observed, n);
        return SignedDeterminants.Work(n, n) <= (n + 1) * SignedDeterminants.Work(observed.Length, n) ? BySigns(observed, n) : ByCoefficient(observed, n);
    }

    /// <summary>The sign form itself; missing parties are identities.</summary>
    private static RoundedSum BySigns(LocalOperator[] observed, int n)
    {
        (double[] re, double[] im) = Pack([.. observed, .. Enumerable.Repeat(LocalOperator.Identity(n), n - observed.Length)]);
        return SignSums.Of(n, n, re, im).Times(Normalisation(n));
    }

    /// <summary>
    /// D(A_1, …, A_k, 1, …, 1) = (N-k)!/N! Σ_π sgn(π) Π_cycles tr Π A: what is left of the N-party state when N-k parties are traced out.
    /// </summary>
    private static RoundedSum ByCycles(LocalOperator[] observed, int n)
    {
        if (observed.Length == 0)
            return new RoundedSum(1, 0);
        Dictionary<string, Complex> traces = [];
        Complex sum = Complex.Zero;
        double size = 0;
        foreach ((int[] image, int sign) in Permutations.Of(observed.Length))
        {
            Complex term = Cycles(image).Aggregate((Complex)sign, (product, cycle) => product * Trace(observed, cycle, traces));
            sum += term;
            size += term.Magnitude;
        }

        double norm = Enumerable.Range(n - observed.Length + 1, observed.Length).Aggregate(1.0, (product, i) => product / i);
        return new RoundedSum(sum * norm, size * norm * n * CycleError);
    }

    private static Complex Trace(LocalOperator[] operators, int[] cycle, Dictionary<string, Complex> known)
    {
        string key = string.Join(',', cycle);
        if (!known.TryGetValue(key, out Complex trace))
            known[key] = trace = MatrixMath.Trace(cycle.Skip(1).Aggregate(operators[cycle[0]].ToMatrix(), (product, i) => MatrixMath.Multiply(product, operators[i].ToMatrix())));
        return trace;
    }

    /// <summary>Cycles of a permutation, each from its smallest element on.</summary>
    private static IEnumerable<int[]> Cycles(int[] image)
    {
        bool[] seen = new bool[image.Length];
        for (int start = 0; start < image.Length; start++)
        {
            List<int> cycle = [];
            for (int i = start; !seen[i]; i = image[i])
            {
                seen[i] = true;
                cycle.Add(i);
            }

            if (cycle.Count > 0)
                yield return [.. cycle];
        }
    }

    /// <summary>
    /// D(A_1, …, A_k, 1, …, 1) = Σ_δ (Π δ) e_k(Σ_i δ_i A_i) / (k! 2^{k-1} C(N,k)), e_k the elementary symmetric function of the
    /// eigenvalues, which is the coefficient of z^{N-k} in det(z + X): read off at roots of unity.
    /// </summary>
    private static RoundedSum ByCoefficient(LocalOperator[] observed, int n)
    {
        int k = observed.Length, points = n + 1;
        (double[] re, double[] im) = Pack(observed);
        RoundedSum sum = default;
        for (int point = 0; point < points; point++)
        {
            Complex z = BasisVectors.RootOfUnity(point, points);
            for (int a = 0; a < n; a++)
                (re[a * (n + 1)], im[a * (n + 1)]) = (observed[0].Re[a * (n + 1)] + z.Real, observed[0].Im[a * (n + 1)] + z.Imaginary);
            RoundedSum part = SignSums.Of(k, n, re, im);
            sum += new RoundedSum(part.Value * BasisVectors.RootOfUnity(-(long)point * (n - k), points), part.Error);
        }

        return sum.Times(Normalisation(k) / (points * Subsets.ChooseReal(n, k)));
    }
}
