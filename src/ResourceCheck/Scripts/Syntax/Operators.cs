namespace ResourceCheck.Scripts.Syntax;

/// <summary>Operators with one operand.</summary>
public enum UnaryOperator
{
    /// <summary>Arithmetic negation.</summary>
    Minus,

    /// <summary>Logical negation.</summary>
    Not,
}

/// <summary>Operators with two operands, weakest binding first.</summary>
public enum BinaryOperator
{
    /// <summary>Logical or; union of sets.</summary>
    Or,

    /// <summary>Logical and; intersection of sets.</summary>
    And,

    /// <summary>Set difference.</summary>
    Without,

    /// <summary>Equality; <c>none = none</c> holds.</summary>
    Equal,

    /// <summary>Inequality.</summary>
    Unequal,

    /// <summary>Less than.</summary>
    Less,

    /// <summary>Less than or equal.</summary>
    LessOrEqual,

    /// <summary>Greater than.</summary>
    Greater,

    /// <summary>Greater than or equal.</summary>
    GreaterOrEqual,

    /// <summary>Sum.</summary>
    Plus,

    /// <summary>Difference.</summary>
    Minus,

    /// <summary>Product.</summary>
    Times,

    /// <summary>Quotient.</summary>
    Divide,

    /// <summary>Remainder, never negative for a positive divisor.</summary>
    Modulo,
}

/// <summary>Kinds of measurement bases.</summary>
public enum BasisKind
{
    /// <summary>The levels themselves.</summary>
    Level,

    /// <summary>The Fourier basis, of all levels or of the first m.</summary>
    Fourier,

    /// <summary>The quadratically phased Fourier bases.</summary>
    Phased,

    /// <summary>Columns of a matrix file.</summary>
    Matrix,
}

/// <summary>Kinds of local unitaries of <c>apply</c>.</summary>
public enum UnitaryKind
{
    /// <summary>Level l to l + k modulo d.</summary>
    Shift,

    /// <summary>Level l gains the phase 2πkl/d.</summary>
    Clock,

    /// <summary>The Fourier matrix.</summary>
    Fourier,

    /// <summary>The inverse of the Fourier matrix.</summary>
    InverseFourier,

    /// <summary>Maps the other basis vectors, in order, to the lowest levels.</summary>
    Complement,

    /// <summary>Exchanges two levels.</summary>
    LevelSwap,

    /// <summary>A matrix file.</summary>
    Matrix,
}
