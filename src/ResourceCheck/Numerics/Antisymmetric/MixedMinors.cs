using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// M[I,J] = Σ_{π→I, σ→J} sgn(π) sgn(σ) Π_j E_j[σ(j), π(j)] for k operators, I and J the subsets of k among d levels: what the antisymmetric
/// state leaves on the other parties once k of them have been read out, up to 1/N!. One more operator costs C(d,k+1)² (k+1)² multiplications;
/// with all d of them M is d! times the mixed discriminant. Histories that share their beginning share the work.
/// </summary>
internal sealed class MixedMinors
{
    private readonly Complex[] _entries;

    private MixedMinors(int levels, int size, Complex[] entries) => (Levels, Size, _entries) = (levels, size, entries);

    /// <summary>d.</summary>
    public int Levels { get; }

    /// <summary>k.</summary>
    public int Size { get; }

    /// <summary>C(d,k)² entries, I after I.</summary>
    public ReadOnlySpan<Complex> Entries => _entries;

    /// <summary>Of no operator: 1.</summary>
    public static MixedMinors None(int levels) => new(levels, 0, [Complex.One]);

    /// <summary>Multiplications of one more operator.</summary>
    public static double Work(int levels, int size) => Math.Pow(Subsets.ChooseReal(levels, size + 1) * (size + 1), 2);

    /// <summary>With one operator more.</summary>
    public MixedMinors With(LocalOperator e)
    {
        Subsets subsets = Subsets.Of(Levels);
        ReadOnlySpan<int> sets = subsets.OfSize(Size + 1);
        int before = Subsets.Choose(Levels, Size), after = sets.Length;
        Complex[] entries = new Complex[after * after];
        for (int row = 0; row < after; row++)
        {
            for (int column = 0; column < after; column++)
                entries[(row * after) + column] = Entry(e, subsets, sets[row], sets[column], before);
        }

        return new MixedMinors(Levels, Size + 1, entries);
    }

    /// <summary>Trace against the identity on the rest, each rest level once: Σ_I M[I,I]; k!(d-k)!/d! of it … see <see cref="MixedDiscriminant"/>.</summary>
    public Complex Trace()
    {
        int count = Subsets.Choose(Levels, Size);
        Complex sum = Complex.Zero;
        for (int i = 0; i < count; i++)
            sum += _entries[i * (count + 1)];
        return sum;
    }

    /// <summary>
    /// The Hermitian M as C(d,k)² real numbers whose scalar product with <see cref="ComplementParts"/> of the other operators' minors is d! D of them all.
    /// </summary>
    public void Parts(Span<double> target)
    {
        int count = Subsets.Choose(Levels, Size);
        Write(target, count, (row, column) => _entries[(row * count) + column], -1);
    }

    /// <summary>See <see cref="Parts"/>: entries of complementary sets, with the signs of Laplace's expansion.</summary>
    public void ComplementParts(Span<double> target)
    {
        Subsets subsets = Subsets.Of(Levels);
        int other = Levels - Size, count = Subsets.Choose(Levels, other), full = (1 << Levels) - 1;
        int[] map = new int[count], sign = new int[count];
        for (int i = 0; i < count; i++)
        {
            int mask = subsets.OfSize(other)[i];
            (map[i], sign[i]) = (subsets.Rank(full & ~mask), Subsets.SignOfShuffle(mask, Levels));
        }

        Write(target, count, (row, column) => sign[row] * sign[column] * _entries[(map[row] * count) + map[column]], 1);
    }

    private static void Write(Span<double> target, int count, Func<int, int, Complex> entry, int signOfImaginary)
    {
        int at = 0;
        for (int row = 0; row < count; row++)
        {
            target[at++] = entry(row, row).Real;
            for (int column = row + 1; column < count; column++)
            {
                Complex value = entry(row, column) * Math.Sqrt(2);
                target[at++] = value.Real;
                target[at++] = signOfImaginary * value.Imaginary;
            }
        }
    }

    private Complex Entry(LocalOperator e, Subsets subsets, int rows, int columns, int before)
    {
        double re = 0, im = 0;
        for (int i = rows; i != 0; i &= i - 1)
        {
            int p = BitOperations.TrailingZeroCount(i), from = subsets.Rank(rows & ~(1 << p)) * before, sign = Subsets.SignOfRemoval(rows, p);
            for (int j = columns; j != 0; j &= j - 1)
            {
                int q = BitOperations.TrailingZeroCount(j), s = sign * Subsets.SignOfRemoval(columns, q), at = (q * Levels) + p;
                Complex minor = _entries[from + subsets.Rank(columns & ~(1 << q))];
                re += s * ((e.Re[at] * minor.Real) - (e.Im[at] * minor.Imaginary));
                im += s * ((e.Re[at] * minor.Imaginary) + (e.Im[at] * minor.Real));
            }
        }

        return new Complex(re, im);
    }
}
