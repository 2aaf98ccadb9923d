namespace ResourceCheck.Scripts.Syntax;

/// <summary>A statement as written.</summary>
/// <param name="Span">The statement's first line, from its first word to its last.</param>
public abstract record Statement(Span Span);

/// <summary><c>protocol "…"</c>.</summary>
public sealed record ProtocolStatement(Span Span, Quoted Title) : Statement(Span);

/// <summary><c>about "…"</c>.</summary>
public sealed record AboutStatement(Span Span, Quoted Text) : Statement(Span);

/// <summary>Values a parameter, input or choice may take: a list in braces, a whole range <c>2..12</c>, or a real one <c>0 to 1</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Values">The listed values; null for a range.</param>
/// <param name="From">Lower end of a range.</param>
/// <param name="To">Upper end of a range.</param>
/// <param name="Whole">True for <c>..</c>, false for <c>to</c>.</param>
public sealed record Domain(Span Span, IReadOnlyList<Expression>? Values, Expression? From, Expression? To, bool Whole);

/// <summary><c>parameter x = 0 in {0, 1}</c>.</summary>
public sealed record ParameterStatement(Span Span, Name Name, Expression Default, Domain Domain) : Statement(Span);

/// <summary><c>input x of S in {0, 1}</c>.</summary>
public sealed record InputStatement(Span Span, Name Name, PartyRef Owner, Domain Domain) : Statement(Span);

/// <summary><c>require COND, "reason"</c>.</summary>
public sealed record RequireStatement(Span Span, Expression Condition, Quoted Reason) : Statement(Span);

/// <summary><c>parties Ada, P[1..n]</c>.</summary>
public sealed record PartiesStatement(Span Span, PartyList Parties) : Statement(Span);

/// <summary><c>outsider Eve</c>.</summary>
public sealed record OutsiderStatement(Span Span, Name Name) : Statement(Span);

/// <summary><c>resource antisymmetric on LIST</c>.</summary>
public sealed record ResourceStatement(Span Span, PartyList Parties) : Statement(Span);

/// <summary><c>copies M</c>.</summary>
public sealed record CopiesStatement(Span Span, Expression Count) : Statement(Span);

/// <summary><c>for m from n down to 3 … end</c>.</summary>
public sealed record ForStatement(Span Span, Name Counter, Expression From, Expression To, bool Down, IReadOnlyList<Statement> Body) : Statement(Span);

/// <summary><c>round "…" … end</c>.</summary>
public sealed record RoundStatement(Span Span, Quoted Title, IReadOnlyList<Statement> Body) : Statement(Span);

/// <summary><c>discussion "…" … end</c>.</summary>
public sealed record DiscussionStatement(Span Span, Quoted Title, IReadOnlyList<Statement> Body) : Statement(Span);

/// <summary><c>ACTORS measure BASIS as v</c>.</summary>
public sealed record MeasureStatement(Span Span, PartyList Actors, Expression Basis, Name Result) : Statement(Span);

/// <summary><c>ACTORS pick b from level, fourier</c>.</summary>
public sealed record PickStatement(Span Span, PartyList Actors, Name Result, IReadOnlyList<Expression> Options) : Statement(Span);

/// <summary>One item of a message: a value and the name it travels under.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Value">What is sent.</param>
/// <param name="Name">Its name at the recipients; null when the value is a bare name.</param>
public sealed record MessageItem(Span Span, Expression Value, Name? Name);

/// <summary><c>ACTORS send E as w, v to LIST</c>; <c>announce</c> when <paramref name="Recipients"/> is null.</summary>
public sealed record SendStatement(Span Span, PartyList Actors, IReadOnlyList<MessageItem> Items, PartyList? Recipients) : Statement(Span);

/// <summary>A local unitary as written.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Kind">Which kind.</param>
/// <param name="Basis">Basis of <c>complement</c>.</param>
/// <param name="First">k of shift, clock and complement; i of levelswap; m of <c>fourier on m</c>.</param>
/// <param name="Second">j of levelswap.</param>
/// <param name="File">File of <c>matrix</c>.</param>
public sealed record UnitaryExpression(Span Span, UnitaryKind Kind, Expression? Basis, Expression? First, Expression? Second, Quoted? File)
    : Expression(Span);

/// <summary><c>ACTORS apply U</c>.</summary>
public sealed record ApplyStatement(Span Span, PartyList Actors, UnitaryExpression Unitary) : Statement(Span);

/// <summary><c>ACTORS wait 3 us</c>.</summary>
public sealed record WaitStatement(Span Span, PartyList Actors, string Number, string Unit, Span QuantitySpan) : Statement(Span);

/// <summary><c>Eve intercepts C in BASIS as g</c>.</summary>
public sealed record InterceptStatement(Span Span, PartyList Actors, PartyRef Victim, Expression Basis, Name Result) : Statement(Span);

/// <summary><c>when COND … otherwise … end</c>.</summary>
public sealed record WhenStatement(Span Span, Expression Condition, IReadOnlyList<Statement> Then, IReadOnlyList<Statement> Otherwise) : Statement(Span);

/// <summary><c>keep when COND</c>.</summary>
public sealed record KeepStatement(Span Span, Expression Condition) : Statement(Span);

/// <summary><c>checkpoint "…": fidelity with antisymmetric on LIST</c>.</summary>
public sealed record CheckpointStatement(Span Span, Quoted Label, PartyList Parties) : Statement(Span);

/// <summary><c>ACTORS set v to EXPR</c>.</summary>
public sealed record SetStatement(Span Span, PartyList Actors, Name Result, Expression Value) : Statement(Span);

/// <summary><c>ACTORS abort when COND</c>.</summary>
public sealed record AbortStatement(Span Span, PartyList Actors, Expression Condition) : Statement(Span);

/// <summary><c>success when EXPR</c>.</summary>
public sealed record SuccessStatement(Span Span, Expression Condition) : Statement(Span);

/// <summary><c>report "…" = EXPR</c>.</summary>
public sealed record ReportStatement(Span Span, Quoted Label, Expression Value) : Statement(Span);

/// <summary><c>claim EXPR</c>; the expression is a comparison.</summary>
public sealed record ClaimStatement(Span Span, Expression Comparison) : Statement(Span);

/// <summary><c>goal METRIC >= NUMBER</c>; the expression is a comparison.</summary>
public sealed record GoalStatement(Span Span, Expression Comparison) : Statement(Span);

/// <summary><c>dishonest "…" by S … end</c>.</summary>
public sealed record DishonestStatement(Span Span, Quoted Title, PartyList By, IReadOnlyList<Statement> Body) : Statement(Span);

/// <summary><c>choose pad in 0..M/3</c>.</summary>
public sealed record ChooseStatement(Span Span, Name Name, Domain Domain) : Statement(Span);

/// <summary><c>instead of "block" … end</c> or <c>before "block" … end</c>.</summary>
public sealed record ReplaceStatement(Span Span, Quoted Block, bool Before, IReadOnlyList<Statement> Body) : Statement(Span);

/// <summary><c>perfect hardware</c>: the cheat's own apparatus is without noise.</summary>
public sealed record PerfectStatement(Span Span) : Statement(Span);

/// <summary><c>harm when EXPR</c>.</summary>
public sealed record HarmStatement(Span Span, Expression Condition) : Statement(Span);

/// <summary>A line that could not be read; the parser went on behind it.</summary>
public sealed record BrokenStatement(Span Span) : Statement(Span);
