using ResourceCheck.Quantities;

namespace ResourceCheck.Scripts.Syntax;

/// <summary>An expression as written.</summary>
/// <param name="Span">Where it stands.</param>
public abstract record Expression(Span Span);

/// <summary>A number; exact, as written in decimal.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Value">Its exact value.</param>
/// <param name="Text">The digits as written.</param>
public sealed record NumberExpression(Span Span, Rational Value, string Text) : Expression(Span);

/// <summary><c>true</c> or <c>false</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Value">The truth value.</param>
public sealed record TruthExpression(Span Span, bool Value) : Expression(Span);

/// <summary><c>none</c>.</summary>
/// <param name="Span">Where it stands.</param>
public sealed record NoneExpression(Span Span) : Expression(Span);

/// <summary>A quoted label inside a claim or goal: a checkpoint's or report's name.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Label">The label.</param>
public sealed record LabelExpression(Span Span, Quoted Label) : Expression(Span);

/// <summary>A bare name: a variable, parameter, input, counter, party, or metric such as <c>success</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Text">The name.</param>
public sealed record NameExpression(Span Span, string Text) : Expression(Span);

/// <summary>A family member as a value: <c>P[3]</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Party">The member.</param>
public sealed record PartyExpression(Span Span, PartyRef Party) : Expression(Span);

/// <summary>A value of a named party: <c>Ada.v</c>, <c>P[2].v</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Party">Whose value.</param>
/// <param name="Member">Which value.</param>
public sealed record MemberExpression(Span Span, PartyRef Party, Name Member) : Expression(Span);

/// <summary>The values of several parties as arguments: <c>v of all</c>, <c>v of Ada, Ben</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Member">Which value.</param>
/// <param name="Parties">Whose.</param>
public sealed record OfExpression(Span Span, Name Member, PartyList Parties) : Expression(Span);

/// <summary><c>- x</c> or <c>not x</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Operator">The operator.</param>
/// <param name="Operand">What it acts on.</param>
public sealed record UnaryExpression(Span Span, UnaryOperator Operator, Expression Operand) : Expression(Span);

/// <summary>Two operands and an operator between them.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Operator">The operator.</param>
/// <param name="Left">Left operand.</param>
/// <param name="Right">Right operand.</param>
public sealed record BinaryExpression(Span Span, BinaryOperator Operator, Expression Left, Expression Right) : Expression(Span);

/// <summary><c>if C then A else B</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Condition">The condition.</param>
/// <param name="Then">Value when it holds.</param>
/// <param name="Else">Value when it does not.</param>
public sealed record IfExpression(Span Span, Expression Condition, Expression Then, Expression Else) : Expression(Span);

/// <summary>
/// A function with arguments. <c>count(C over all)</c> has <paramref name="Over"/>; <c>count(C in J)</c>, <c>some(k of J)</c>,
/// <c>guess(X from Y, Z)</c>, <c>information(X; Y)</c> and <c>probability(C given D)</c> put what follows the word in <paramref name="Second"/>.
/// </summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Function">The function's name.</param>
/// <param name="Arguments">Arguments before any separating word.</param>
/// <param name="Separator">The word or sign between the two groups: <c>over</c>, <c>in</c>, <c>of</c>, <c>from</c>, <c>given</c>, <c>;</c>; null when there is none.</param>
/// <param name="Second">Arguments behind the separator, empty when there is none or when it is <c>over</c>.</param>
/// <param name="Over">Parties behind <c>over</c>.</param>
public sealed record CallExpression(
    Span Span,
    Name Function,
    IReadOnlyList<Expression> Arguments,
    string? Separator,
    IReadOnlyList<Expression> Second,
    PartyList? Over) : Expression(Span);

/// <summary>A measurement basis as a value: <c>level</c>, <c>fourier</c>, <c>fourier on m</c>, <c>phased(j)</c>, <c>matrix "file"</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Kind">Which kind of basis.</param>
/// <param name="Argument">m of <c>fourier on m</c> (null: all levels) or j of <c>phased(j)</c>.</param>
/// <param name="File">File of <c>matrix</c>.</param>
public sealed record BasisExpression(Span Span, BasisKind Kind, Expression? Argument, Quoted? File) : Expression(Span);
