using System.Numerics;
using System.Runtime.Intrinsics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Σ_δ (Π_i δ_i) det(Σ_i δ_i A_i) over signs δ_i = ±1 with δ_1 = 1. For N matrices of order N this is N! 2^{N-1} times their mixed
/// discriminant, as Glynn's formula is for permanents (D. G. Glynn, Eur. J. Comb. 31, 1887 (2010)). Its terms are of one size, where the
/// sum over subsets (R. B. Bapat, Linear Algebra Appl. 126, 107 (1989)) has terms of all sizes and loses digits.
/// Three signs run across vector lanes, the others through a tree of partial sums, so that a term costs two additions of matrices and
/// one determinant. One object works for one thread; its loops allocate nothing.
/// </summary>
internal sealed class SignedDeterminants
{
    /// <summary>Signs that run across the eight lanes.</summary>
    private const int LaneSigns = 3;

    /// <summary>Half the distance from 1 to the next number.</summary>
    private const double Unit = 1.0 / (1L << 53);

    private readonly int _order;
    private readonly int _lanes;
    private readonly int _depth;
    private readonly Vector512<double>[] _re;
    private readonly Vector512<double>[] _im;
    private readonly Vector512<double> _laneSign;
    private Vector512<double> _sumRe, _sumIm, _size;

    /// <param name="terms">How many matrices are summed with signs.</param>
    /// <param name="order">Rows of each.</param>
    public SignedDeterminants(int terms, int order)
    {
        _order = order;
        _lanes = Math.Min(LaneSigns, terms - 1);
        _depth = terms - 1 - _lanes;
        _re = new Vector512<double>[(_depth + 1) * order * order];
        _im = new Vector512<double>[_re.Length];
        for (int lane = 0; lane < 1 << _lanes; lane++)
            _laneSign = _laneSign.WithElement(lane, int.IsEvenInteger(BitOperations.PopCount((uint)lane)) ? 1 : -1);
    }

    /// <summary>Branches of the tree below the lanes: parts of the sum that may be asked for apart.</summary>
    public long Leaves => 1L << _depth;

    /// <summary>Complex multiplications of a whole sum.</summary>
    public static double Work(int terms, int order) => Math.Pow(2, Math.Max(terms - 1, LaneSigns)) * order * order * ((order / 3.0) + 2);

    /// <summary>The whole sum.</summary>
    /// <param name="re">Real parts of the matrices, one after the other, row after row.</param>
    /// <param name="im">Imaginary parts.</param>
    public RoundedSum Sum(ReadOnlySpan<double> re, ReadOnlySpan<double> im) => Sum(re, im, 0, Leaves);

    /// <summary>The part of the sum that the leaves from <paramref name="first"/> to before <paramref name="end"/> make.</summary>
    public RoundedSum Sum(ReadOnlySpan<double> re, ReadOnlySpan<double> im, long first, long end)
    {
        _sumRe = _sumIm = _size = Vector512<double>.Zero;
        Seed(re, im);
        for (long leaf = first; leaf < end; leaf++)
        {
            int from = leaf == first ? 0 : _depth - 1 - BitOperations.Log2((ulong)(leaf ^ (leaf - 1)));
            for (int level = from; level < _depth; level++)
                Descend(re, im, level, (leaf >> (_depth - 1 - level)) & 1);
            Add(int.IsEvenInteger(BitOperations.PopCount((ulong)leaf)) ? Vector512<double>.One : -Vector512<double>.One);
        }

        return new RoundedSum(new Complex(Vector512.Sum(_sumRe), Vector512.Sum(_sumIm)), Vector512.Sum(_size) * _order * Unit);
    }

    /// <summary>Level 0 of the tree: the first matrix and, with signs by lane, the next few.</summary>
    private void Seed(ReadOnlySpan<double> re, ReadOnlySpan<double> im)
    {
        int size = _order * _order;
        for (int i = 0; i < size; i++)
        {
            Vector512<double> x = Vector512.Create(re[i]), y = Vector512.Create(im[i]);
            for (int s = 0; s < _lanes; s++)
            {
                x += SignOfLanes(s) * re[((s + 1) * size) + i];
                y += SignOfLanes(s) * im[((s + 1) * size) + i];
            }

            (_re[i], _im[i]) = (x, y);
        }
    }

    private static Vector512<double> SignOfLanes(int bit) => bit switch
    {
        0 => Vector512.Create(1.0, -1, 1, -1, 1, -1, 1, -1),
        1 => Vector512.Create(1.0, 1, -1, -1, 1, 1, -1, -1),
        _ => Vector512.Create(1.0, 1, 1, 1, -1, -1, -1, -1),
    };

    private void Descend(ReadOnlySpan<double> re, ReadOnlySpan<double> im, int level, long negative)
    {
        int size = _order * _order, term = (1 + _lanes + level) * size;
        ReadOnlySpan<double> addRe = re.Slice(term, size), addIm = im.Slice(term, size);
        ReadOnlySpan<Vector512<double>> fromRe = _re.AsSpan(level * size, size), fromIm = _im.AsSpan(level * size, size);
        Span<Vector512<double>> toRe = _re.AsSpan((level + 1) * size, size), toIm = _im.AsSpan((level + 1) * size, size);
        double sign = negative == 0 ? 1 : -1;
        for (int i = 0; i < size; i++)
        {
            toRe[i] = fromRe[i] + Vector512.Create(sign * addRe[i]);
            toIm[i] = fromIm[i] + Vector512.Create(sign * addIm[i]);
        }
    }

    /// <summary>Adds the determinants of the deepest level, which is remade for every leaf and may be overwritten.</summary>
    private void Add(Vector512<double> sign)
    {
        int size = _order * _order;
        (Vector512<double> re, Vector512<double> im) = LaneDeterminants.Of(_re.AsSpan(_depth * size, size), _im.AsSpan(_depth * size, size), _order);
        Vector512<double> factor = sign * _laneSign;
        _sumRe += factor * re;
        _sumIm += factor * im;
        _size += Vector512.Abs(factor) * (Vector512.Abs(re) + Vector512.Abs(im));
    }
}
