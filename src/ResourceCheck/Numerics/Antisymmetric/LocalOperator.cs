using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>A d×d operator on one qudit in the form that the kernels read: parts apart, row after row. Never changed after it is built.</summary>
internal sealed class LocalOperator
{
    /// <summary>Entries this much smaller than the largest are round-off when an operator is asked for its form.</summary>
    private const double Nothing = 1e-14;

    /// <summary>Its square is far below round-off.</summary>
    private const double Small = 1e-10;

    private LocalOperator(int levels, double[] re, double[] im)
    {
        (Levels, Re, Im) = (levels, re, im);
        Scale = re.Concat(im).Max(Math.Abs);
        IsScalar = FindScalar();
    }

    /// <summary>d.</summary>
    public int Levels { get; }

    /// <summary>d² real parts.</summary>
    public double[] Re { get; }

    /// <summary>d² imaginary parts.</summary>
    public double[] Im { get; }

    /// <summary>Largest part of an entry.</summary>
    public double Scale { get; }

    /// <summary>Whether it is a real multiple of the identity.</summary>
    public bool IsScalar { get; }

    /// <summary>Trace; complex for operators that are not Hermitian.</summary>
    public Complex Trace => Enumerable.Range(0, Levels).Aggregate(Complex.Zero, (sum, a) => sum + this[a, a]);

    public Complex this[int row, int column] => new(Re[(row * Levels) + column], Im[(row * Levels) + column]);

    public static LocalOperator Identity(int levels) => Of(MatrixMath.Identity(levels));

    /// <summary>An operator from its matrix.</summary>
    public static LocalOperator Of(Complex[,] matrix)
    {
        int d = matrix.GetLength(0);
        double[] re = new double[d * d], im = new double[d * d];
        for (int i = 0; i < d * d; i++)
            (re[i], im[i]) = (matrix[i / d, i % d].Real, matrix[i / d, i % d].Imaginary);
        return new LocalOperator(d, re, im);
    }

    /// <summary>The Hermitian operator whose components in a basis are given; a sink's component is left out: no resource has lost qudits.</summary>
    public static LocalOperator Of(OperatorBasis basis, double[] components)
    {
        Complex[,] matrix = new Complex[basis.Levels, basis.Levels];
        for (int i = 0; i < basis.OperatorCount; i++)
        {
            foreach ((int row, int column, Complex value) in basis.Element(i))
                matrix[row, column] += components[i] * value;
        }

        return Of(matrix);
    }

    /// <summary>Σ_i f_i A_i.</summary>
    public static LocalOperator Combination(IReadOnlyList<LocalOperator> operators, IReadOnlyList<Complex> factors)
    {
        int d = operators[0].Levels;
        double[] re = new double[d * d], im = new double[d * d];
        for (int k = 0; k < operators.Count; k++)
        {
            (double x, double y) = (factors[k].Real, factors[k].Imaginary);
            for (int i = 0; i < re.Length; i++)
            {
                re[i] += (x * operators[k].Re[i]) - (y * operators[k].Im[i]);
                im[i] += (x * operators[k].Im[i]) + (y * operators[k].Re[i]);
            }
        }

        return new LocalOperator(d, re, im);
    }

    /// <summary>Σ_i A_i.</summary>
    public static LocalOperator Sum(IReadOnlyList<LocalOperator> operators) =>
        operators.Count == 1 ? operators[0] : Combination(operators, [.. Enumerable.Repeat(Complex.One, operators.Count)]);

    /// <summary>U† A U for a unitary U: the same operator seen from a turned basis.</summary>
    public LocalOperator In(Complex[,] basis) => Of(MatrixMath.Multiply(MatrixMath.Adjoint(basis), MatrixMath.Multiply(ToMatrix(), basis)));

    public Complex[,] ToMatrix()
    {
        Complex[,] matrix = new Complex[Levels, Levels];
        for (int i = 0; i < Re.Length; i++)
            matrix[i / Levels, i % Levels] = new Complex(Re[i], Im[i]);
        return matrix;
    }

    /// <summary>
    /// Whether all off-diagonal entries are small against <paramref name="scale"/>. Among diagonal operators they count in second order, so that this
    /// may be asked less strictly than equality.
    /// </summary>
    public bool IsDiagonal(double scale)
    {
        for (int i = 0; i < Re.Length; i++)
        {
            if (i % (Levels + 1) != 0 && Math.Abs(Re[i]) + Math.Abs(Im[i]) > Small * scale)
                return false;
        }

        return true;
    }

    /// <summary>Whether two operators are the same, entry by entry up to round-off.</summary>
    public bool IsNear(LocalOperator other)
    {
        if (ReferenceEquals(this, other))
            return true;
        for (int i = 0; i < Re.Length; i++)
        {
            if (Math.Abs(Re[i] - other.Re[i]) + Math.Abs(Im[i] - other.Im[i]) > Nothing * Scale)
                return false;
        }

        return true;
    }

    private bool FindScalar()
    {
        for (int i = 0; i < Re.Length; i++)
        {
            double expected = i % (Levels + 1) == 0 ? Re[0] : 0;
            if (Math.Abs(Re[i] - expected) + Math.Abs(Im[i]) > Nothing * Math.Abs(Re[0]))
                return false;
        }

        return true;
    }
}
