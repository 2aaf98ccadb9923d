using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// Probabilities of all strings of outcomes: Laplace's expansion of the mixed discriminant along two groups of parties makes them one
/// real matrix product of the groups' mixed minors.
/// </summary>
internal static class JointLaw
{
    /// <summary>Rows and columns of the product that are worked on at once: sixteen running sums fill the vector registers.</summary>
    private const int Block = 4;

    /// <summary>The law. The first party's outcome is the most significant digit of a string.</summary>
    /// <param name="effects">N lists: the operators of each party's outcomes; one for a party whose outcome is settled.</param>
    public static double[] Of(IReadOnlyList<IReadOnlyList<LocalOperator>> effects)
    {
        int n = effects.Count, first = Split(effects);
        double[][] left = Strings(effects, 0, first, false), right = Strings(effects, first, n, true);
        double[] law = new double[left.Length * right.Length];
        double scale = 1 / AntisymmetricState.Factorial(n);
        int bands = (left.Length + Block - 1) / Block;
        Parallel.For(0, bands, band => Band(left, right, band * Block, law, scale));
        return law;
    }

    /// <summary>Multiplications, with the making of the minors.</summary>
    public static double Work(IReadOnlyList<int> outcomes)
    {
        int n = outcomes.Count, first = Split(outcomes);
        double left = Product(outcomes.Take(first)), right = Product(outcomes.Skip(first));
        double half = Math.Pow(Subsets.ChooseReal(n, first), 2);
        return (left * right * half) + (4 * half * ((left * first * first) + (right * (n - first) * (n - first))));
    }

    /// <summary>Bytes of the law and of both halves.</summary>
    public static double Bytes(IReadOnlyList<int> outcomes)
    {
        int first = Split(outcomes);
        double left = Product(outcomes.Take(first)), right = Product(outcomes.Skip(first));
        return 8 * ((left * right) + ((left + right) * Math.Pow(Subsets.ChooseReal(outcomes.Count, first), 2)));
    }

    private static int Split(IReadOnlyList<IReadOnlyList<LocalOperator>> effects) => Split([.. effects.Select(e => e.Count)]);

    /// <summary>How many parties make the first half: as even in strings as can be.</summary>
    private static int Split(IReadOnlyList<int> outcomes)
    {
        double all = Product(outcomes);
        return Enumerable.Range(0, outcomes.Count + 1).MinBy(k => Math.Abs(Math.Log(Product(outcomes.Take(k))) - (Math.Log(all) / 2)) + (1e-3 * Math.Abs(k - (outcomes.Count / 2.0))));
    }

    private static double Product(IEnumerable<int> factors) => factors.Aggregate(1.0, (p, f) => p * f);

    private static double[][] Strings(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, int from, int to, bool complement)
    {
        List<double[]> rows = [];
        Collect(effects, from, to, MixedMinors.None(effects.Count), complement, rows);
        return [.. rows];
    }

    private static void Collect(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, int party, int to, MixedMinors minors, bool complement, List<double[]> rows)
    {
        if (party < to)
        {
            foreach (LocalOperator effect in effects[party])
                Collect(effects, party + 1, to, minors.With(effect), complement, rows);
            return;
        }

        double[] row = new double[minors.Entries.Length];
        if (complement)
            minors.ComplementParts(row);
        else
            minors.Parts(row);
        rows.Add(row);
    }

    private static void Band(double[][] left, double[][] right, int row, double[] law, double scale)
    {
        int rows = Math.Min(Block, left.Length - row);
        for (int column = 0; column < right.Length; column += Block)
        {
            int columns = Math.Min(Block, right.Length - column);
            if (rows == Block && columns == Block)
            {
                Tile(left, right, row, column, law, scale);
                continue;
            }

            for (int r = row; r < row + rows; r++)
            {
                for (int c = column; c < column + columns; c++)
                    law[(r * right.Length) + c] = scale * Vectors.Dot(left[r], right[c]);
            }
        }
    }

    private static void Tile(double[][] left, double[][] right, int row, int column, double[] law, double scale)
    {
        for (int c = column; c < column + Block; c++)
            Column(left[row], left[row + 1], left[row + 2], left[row + 3], right[c], law.AsSpan((row * right.Length) + c), right.Length, scale);
    }

    /// <summary>Four scalar products that share one factor.</summary>
    private static void Column(double[] a, double[] b, double[] c, double[] d, double[] x, Span<double> target, int stride, double scale)
    {
        ReadOnlySpan<Vector512<double>> va = Lanes(a), vb = Lanes(b), vc = Lanes(c), vd = Lanes(d), vx = Lanes(x);
        Vector512<double> sa = Vector512<double>.Zero, sb = sa, sc = sa, sd = sa;
        for (int i = 0; i < vx.Length; i++)
        {
            sa = Vector512.FusedMultiplyAdd(va[i], vx[i], sa);
            sb = Vector512.FusedMultiplyAdd(vb[i], vx[i], sb);
            sc = Vector512.FusedMultiplyAdd(vc[i], vx[i], sc);
            sd = Vector512.FusedMultiplyAdd(vd[i], vx[i], sd);
        }

        (double ra, double rb, double rc, double rd) = (Vector512.Sum(sa), Vector512.Sum(sb), Vector512.Sum(sc), Vector512.Sum(sd));
        for (int i = vx.Length * Vector512<double>.Count; i < x.Length; i++)
        {
            ra += a[i] * x[i];
            rb += b[i] * x[i];
            rc += c[i] * x[i];
            rd += d[i] * x[i];
        }

        (target[0], target[stride], target[2 * stride], target[3 * stride]) = (scale * ra, scale * rb, scale * rc, scale * rd);
    }

    private static ReadOnlySpan<Vector512<double>> Lanes(double[] row) => MemoryMarshal.Cast<double, Vector512<double>>(row);
}
