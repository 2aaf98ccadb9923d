using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// All outcomes distinct when every operator is diagonal in one common basis, as after decay seen in levels or after depolarising seen in any
/// basis: (1/N!) Σ over assignments of outcomes and of levels to parties of Π_i a_i^{outcome}[level]. Party after party takes one outcome and
/// one level; what matters is only how many indices of each class have been used as what, where a class holds indices that may be
/// exchanged (as outcome and level together) without changing any operator. No term is negative.
/// </summary>
internal sealed class DiagonalDistinct
{
    /// <summary>States of the sum over used indices that are worth keeping; beyond, the double sign form serves better.</summary>
    private const double MostStates = 3e6;

    /// <summary>Differences below this part of the largest entry do not tell indices apart.</summary>
    private const double Nothing = 1e-13;

    /// <summary>Dictionary look-ups and what goes with them, in multiplications.</summary>
    private const double WorkPerMove = 50;

    private readonly double[][][] _outcomes;
    private readonly double[][] _others;
    private readonly int[][] _classes;

    private DiagonalDistinct(double[][][] outcomes, double[][] others, int[][] classes) => (_outcomes, _others, _classes) = (outcomes, others, classes);

    /// <summary>Multiplications of the sum, at most.</summary>
    public double Work => WorkPerMove * States(_classes) * _classes.Length * _classes.Length;

    /// <summary>Prepares the sum; null when there is no common basis or too little symmetry.</summary>
    public static DiagonalDistinct? Find(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        if (effects[0].Count != effects[0][0].Levels || CommonBasis(effects, others) is not { } basis)
            return null;
        double[][][] outcomes = [.. effects.Select(p => p.Select(a => Diagonal(a, basis)).ToArray())];
        double[][] rest = [.. others.Select(a => Diagonal(a, basis))];
        (outcomes, rest) = Sorted(outcomes, rest);
        int[][] classes = Classes(outcomes, rest);
        return States(classes) > MostStates ? null : new DiagonalDistinct(outcomes, rest, classes);
    }

    /// <summary>The probability.</summary>
    public RoundedSum Probability()
    {
        UsedIndices used = new(_classes);
        foreach (double[][] party in _outcomes)
            used.Take(party);
        foreach (double[] party in _others)
            used.TakeLevel(party);
        double value = used.Total() / AntisymmetricState.Factorial(_outcomes.Length + _others.Length);
        return new RoundedSum(value, value * 1e-15);
    }

    private static double States(int[][] classes) => classes.Aggregate(1.0, (product, c) => product * Subsets.ChooseReal(c.Length + 3, 3));

    /// <summary>Level l is renamed to the outcome that it gives most likely to the first party, so that classes hold both at once.</summary>
    private static (double[][][] Outcomes, double[][] Others) Sorted(double[][][] outcomes, double[][] others)
    {
        int d = outcomes[0].Length;
        int[] order = new int[d];
        bool[] taken = new bool[d];
        for (int k = 0; k < d; k++)
        {
            order[k] = Enumerable.Range(0, d).Where(l => !taken[l]).MaxBy(l => outcomes[0][k][l]);
            taken[order[k]] = true;
        }

        double[] Renamed(double[] diagonal) => [.. order.Select(l => diagonal[l])];
        return ([.. outcomes.Select(p => p.Select(Renamed).ToArray())], [.. others.Select(Renamed)]);
    }

    private static double[] Diagonal(LocalOperator a, Complex[,] basis)
    {
        LocalOperator turned = a.In(basis);
        return [.. Enumerable.Range(0, a.Levels).Select(l => Math.Max(0, turned.Re[l * (a.Levels + 1)]))];
    }

    /// <summary>A basis in which all are diagonal; null when there is none.</summary>
    private static Complex[,]? CommonBasis(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        LocalOperator[] all = [.. effects.SelectMany(e => e).Concat(others)];
        double scale = all.Max(a => a.Scale);
        if (all.All(a => a.IsDiagonal(scale)))
            return MatrixMath.Identity(all[0].Levels);
        Complex[,] basis = Eigenbasis(effects[0]);
        return all.All(a => a.In(basis).IsDiagonal(scale)) ? basis : null;
    }

    /// <summary>Of a combination of the first party's operators in which no two outcomes weigh the same.</summary>
    private static Complex[,] Eigenbasis(IReadOnlyList<LocalOperator> operators)
    {
        LocalOperator mixture = LocalOperator.Combination(operators, [.. operators.Select((_, k) => (Complex)(1 + Math.Sqrt(2 + (3 * k))))]);
        Matrix<Complex> matrix = Matrix<Complex>.Build.DenseOfArray(mixture.ToMatrix());
        return ((matrix + matrix.ConjugateTranspose()) / 2).Evd(Symmetricity.Hermitian).EigenVectors.ToArray();
    }

    private static int[][] Classes(double[][][] outcomes, double[][] others)
    {
        List<List<int>> classes = [];
        for (int l = 0; l < outcomes[0].Length; l++)
        {
            if (classes.FirstOrDefault(c => MayChange(outcomes, others, c[0], l)) is { } same)
                same.Add(l);
            else
                classes.Add([l]);
        }

        return [.. classes.Select(c => c.ToArray())];
    }

    private static bool MayChange(double[][][] outcomes, double[][] others, int a, int b)
    {
        int Other(int l) => l == a ? b : l == b ? a : l;
        bool Same(double x, double y) => Math.Abs(x - y) <= Nothing;
        return others.All(o => Same(o[a], o[b]))
            && outcomes.All(p => Enumerable.Range(0, p.Length).All(k => Enumerable.Range(0, p.Length).All(l => Same(p[k][l], p[Other(k)][Other(l)]))));
    }
}
