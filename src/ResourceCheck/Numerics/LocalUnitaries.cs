using System.Numerics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Numerics;

/// <summary>Local unitaries of the script language as d×d matrices, column l the image of level l.</summary>
internal static class LocalUnitaries
{
    /// <summary>|l⟩ → |l + k mod d⟩.</summary>
    public static Complex[,] Shift(int levels, int k)
    {
        Complex[,] u = new Complex[levels, levels];
        for (int l = 0; l < levels; l++)
            u[(int)((((long)l + k) % levels + levels) % levels), l] = 1;
        return u;
    }

    /// <summary>|l⟩ → exp(2πi kl/d)|l⟩.</summary>
    public static Complex[,] Clock(int levels, int k)
    {
        Complex[,] u = new Complex[levels, levels];
        for (int l = 0; l < levels; l++)
            u[l, l] = BasisVectors.RootOfUnity((long)k * l, levels);
        return u;
    }

    /// <summary>Exchanges two levels.</summary>
    public static Complex[,] LevelSwap(int levels, int i, int j)
    {
        Complex[,] u = MatrixMath.Identity(levels);
        if (i == j)
            return u;
        (u[i, i], u[j, j]) = (0, 0);
        (u[i, j], u[j, i]) = (1, 1);
        return u;
    }

    /// <summary>
    /// Maps the vectors of a basis other than vector k, in order, to levels 0, 1, … and vector k to the last level it acts on.
    /// On the first m levels it leaves the others alone; k outside 0 … m-1 gives null: nothing is to be corrected.
    /// </summary>
    public static Complex[,]? Complement(BasisValue basis, Complex[,] vectors, int k)
    {
        int levels = vectors.GetLength(0);
        int count = basis.Kind == Scripts.Syntax.BasisKind.Fourier && basis.Argument >= 0 ? basis.Argument : levels;
        if (k < 0 || k >= count)
            return null;
        Complex[,] u = new Complex[levels, levels];
        for (int vector = 0; vector < levels; vector++)
        {
            int target = vector >= count || vector < k ? vector : vector == k ? count - 1 : vector - 1;
            for (int l = 0; l < levels; l++)
                u[target, l] = Complex.Conjugate(vectors[l, vector]);
        }

        return u;
    }
}
