using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>An operator between two operands.</summary>
/// <param name="Text">As written.</param>
/// <param name="Operator">Its meaning.</param>
/// <param name="Precedence">The higher, the tighter it binds.</param>
internal sealed record OperatorEntry(string Text, BinaryOperator Operator, int Precedence)
{
    public bool IsComparison => Precedence == OperatorTable.Comparison;
}

/// <summary>Precedences, for parser and printer alike. Operators of one precedence group to the left; comparisons do not group.</summary>
internal static class OperatorTable
{
    /// <summary>An <c>if</c> reaches to the end of what surrounds it.</summary>
    public const int Conditional = 0;

    /// <summary><c>v of Ada, Ben</c> takes part in no operation without brackets.</summary>
    public const int PartyList = 5;

    public const int Not = 40;
    public const int Comparison = 50;

    /// <summary><c>fourier on m</c>: the argument takes sums and products along.</summary>
    public const int FourierOn = 55;

    public const int Sum = 60;
    public const int Negation = 80;
    public const int Whole = 100;

    private static readonly OperatorEntry[] Entries =
    [
        new("or", BinaryOperator.Or, 10),
        new("and", BinaryOperator.And, 20),
        new("minus", BinaryOperator.Without, 30),
        new("=", BinaryOperator.Equal, Comparison),
        new("!=", BinaryOperator.Unequal, Comparison),
        new("<", BinaryOperator.Less, Comparison),
        new("<=", BinaryOperator.LessOrEqual, Comparison),
        new(">", BinaryOperator.Greater, Comparison),
        new(">=", BinaryOperator.GreaterOrEqual, Comparison),
        new("+", BinaryOperator.Plus, Sum),
        new("-", BinaryOperator.Minus, Sum),
        new("*", BinaryOperator.Times, 70),
        new("/", BinaryOperator.Divide, 70),
        new("mod", BinaryOperator.Modulo, 70),
    ];

    /// <summary>The operator a token stands for, or null.</summary>
    public static OperatorEntry? Find(Token token) => Array.Find(Entries, e => token.Is(e.Text));

    /// <summary>How an operator is written and binds.</summary>
    public static OperatorEntry Of(BinaryOperator binary) => Array.Find(Entries, e => e.Operator == binary)!;
}
