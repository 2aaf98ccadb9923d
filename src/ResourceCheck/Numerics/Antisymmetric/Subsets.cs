using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>Subsets of n elements as bit masks, numbered within each size by the combinatorial number system: mask {c_1 &lt; … &lt; c_k} has number Σ C(c_i, i).</summary>
internal sealed class Subsets
{
    private static readonly Subsets?[] Known = new Subsets?[MostElements + 1];

    private readonly int[] _ranks;
    private readonly int[][] _masks;

    private Subsets(int n)
    {
        Count = n;
        _ranks = new int[1 << n];
        _masks = [.. Enumerable.Range(0, n + 1).Select(k => new int[Choose(n, k)])];
        int[] next = new int[n + 1];
        for (int mask = 0; mask < 1 << n; mask++)
        {
            int size = BitOperations.PopCount((uint)mask);
            _masks[size][next[size]] = mask; // ascending masks of one size are ascending numbers
            _ranks[mask] = next[size]++;
        }
    }

    /// <summary>Most elements whose subsets are laid out.</summary>
    public const int MostElements = 20;

    /// <summary>n.</summary>
    public int Count { get; }

    /// <summary>The table of n elements; made once.</summary>
    public static Subsets Of(int n) => Known[n] ??= new Subsets(n);

    /// <summary>All subsets of a size, ascending.</summary>
    public ReadOnlySpan<int> OfSize(int size) => _masks[size];

    /// <summary>Numbers of all masks within their sizes.</summary>
    public ReadOnlySpan<int> Ranks => _ranks;

    /// <summary>Number of a mask within its size.</summary>
    public int Rank(int mask) => _ranks[mask];

    /// <summary>C(n, k).</summary>
    public static int Choose(int n, int k) => checked((int)ChooseReal(n, k));

    /// <summary>C(n, k) as a real number, exact up to 2^53.</summary>
    public static double ChooseReal(int n, int k)
    {
        double product = 1;
        for (int i = 1; i <= k; i++)
            product = Math.Round(product * (n - k + i) / i);
        return k < 0 || k > n ? 0 : product;
    }

    /// <summary>Sign of the permutation that brings an element of a set behind all the set's others.</summary>
    public static int SignOfRemoval(int mask, int element) => int.IsEvenInteger(BitOperations.PopCount((uint)(mask >> (element + 1)))) ? 1 : -1;

    /// <summary>Sign of the permutation that sorts a set followed by its complement in n elements.</summary>
    public static int SignOfShuffle(int mask, int n)
    {
        int inversions = 0, size = BitOperations.PopCount((uint)mask), at = 0;
        for (int i = 0; i < n; i++)
        {
            if ((mask >> i & 1) != 0)
                inversions += i - at++;
        }

        return size == 0 || int.IsEvenInteger(inversions) ? 1 : -1;
    }
}
