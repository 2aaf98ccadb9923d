using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>An expression whose names are resolved: parameters and counters are literals, variables are slots.</summary>
/// <param name="Span">Where it stands in the script.</param>
public abstract record BoundExpression(Span Span);

/// <summary>A fixed value.</summary>
public sealed record BoundLiteral(Span Span, Value Value) : BoundExpression(Span);

/// <summary>The content of a slot; see <see cref="Protocol.Slots"/>.</summary>
public sealed record BoundSlot(Span Span, int Slot) : BoundExpression(Span);

/// <summary>One operand.</summary>
public sealed record BoundUnary(Span Span, UnaryOperator Operator, BoundExpression Operand) : BoundExpression(Span);

/// <summary>Two operands.</summary>
public sealed record BoundBinary(Span Span, BinaryOperator Operator, BoundExpression Left, BoundExpression Right) : BoundExpression(Span);

/// <summary>A choice between two values.</summary>
public sealed record BoundIf(Span Span, BoundExpression Condition, BoundExpression Then, BoundExpression Else) : BoundExpression(Span);

/// <summary>A function of values; quantifiers over parties are unfolded into one argument per party.</summary>
public sealed record BoundCall(Span Span, ValueFunction Function, IReadOnlyList<BoundExpression> Arguments) : BoundExpression(Span);

/// <summary>A basis; its argument is evaluated at run time.</summary>
public sealed record BoundBasis(Span Span, BasisKind Kind, BoundExpression? Argument, string? File) : BoundExpression(Span);

/// <summary>Functions of classical values.</summary>
public enum ValueFunction
{
    /// <summary>True when all arguments are present and differ pairwise.</summary>
    Distinct,

    /// <summary>True when all arguments are present and equal.</summary>
    Same,

    /// <summary>The one level that no argument has; none unless exactly one is missing.</summary>
    Missing,

    /// <summary>How many of the arguments are true.</summary>
    Count,

    /// <summary>The largest argument.</summary>
    Largest,

    /// <summary>Absolute value.</summary>
    Absolute,
}

// Expressions on lists. Inside a predicate, slots of the rounds stand for their value in the copy at hand; everywhere else slots hold one value per run.

/// <summary>The positions at which a predicate holds: <c>where(v = bit)</c>. The predicate may read the actor's per-copy slots and its single values.</summary>
public sealed record BoundWhere(Span Span, BoundExpression Predicate) : BoundExpression(Span);

/// <summary>Positions drawn uniformly at random from a set, all of them when it holds fewer: <c>some(k of SET)</c>.</summary>
public sealed record BoundSome(Span Span, BoundExpression Count, BoundExpression Set) : BoundExpression(Span);

/// <summary>How many positions a set holds: <c>size(SET)</c>.</summary>
public sealed record BoundSize(Span Span, BoundExpression Set) : BoundExpression(Span);

/// <summary>How many positions of a set satisfy a predicate, or (<paramref name="IsShare"/>) which fraction of them; none for the share of an empty set.</summary>
public sealed record BoundTally(Span Span, BoundExpression Predicate, BoundExpression Set, bool IsShare) : BoundExpression(Span);

/// <summary>A number left to a cheat, by its index among the case's choices.</summary>
public sealed record BoundChoice(Span Span, int Choice) : BoundExpression(Span);
