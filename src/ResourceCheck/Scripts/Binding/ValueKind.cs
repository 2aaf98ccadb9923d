namespace ResourceCheck.Scripts.Binding;

/// <summary>What sort of value an expression gives, as far as it is known before a run.</summary>
internal enum ValueKind
{
    /// <summary>Not known, because an error was reported already; fits everywhere.</summary>
    Unknown,

    /// <summary>The literal <c>none</c>; fits everywhere.</summary>
    None,

    /// <summary>An exact number.</summary>
    Number,

    /// <summary>A truth value.</summary>
    Truth,

    /// <summary>A measurement basis.</summary>
    Basis,

    /// <summary>A party.</summary>
    Party,

    /// <summary>A set of positions in the lists.</summary>
    Set,
}

/// <summary>Rules of the sorts of values.</summary>
internal static class ValueKinds
{
    /// <summary>Whether a value of one sort may stand where another is wanted.</summary>
    public static bool Fits(ValueKind kind, ValueKind wanted) =>
        kind == wanted || kind is ValueKind.Unknown or ValueKind.None || wanted == ValueKind.Unknown;

    /// <summary>Whether two sorts may be compared or stand for each other.</summary>
    public static bool Together(ValueKind first, ValueKind second) => Fits(first, second) || Fits(second, first);

    /// <summary>The sort of a value that may be either.</summary>
    public static ValueKind Join(ValueKind first, ValueKind second) => first switch
    {
        ValueKind.None => second,
        ValueKind.Unknown => ValueKind.Unknown,
        _ => second == ValueKind.Unknown ? second : first,
    };

    /// <summary>The sort of a value.</summary>
    public static ValueKind Of(Value value) => value switch
    {
        NumberValue => ValueKind.Number,
        TruthValue => ValueKind.Truth,
        BasisValue => ValueKind.Basis,
        PartyValue => ValueKind.Party,
        _ => ValueKind.None,
    };

    /// <summary>The sort in words, with its article.</summary>
    public static string Name(ValueKind kind) => kind switch
    {
        ValueKind.Number => "a number",
        ValueKind.Truth => "a truth value",
        ValueKind.Basis => "a basis",
        ValueKind.Party => "a party",
        ValueKind.Set => "a set of positions",
        _ => "none",
    };
}

/// <summary>A resolved expression with its sort; without an expression an error was reported already.</summary>
/// <param name="Bound">The expression, or null.</param>
/// <param name="Kind">Its sort.</param>
internal sealed record Typed(BoundExpression? Bound, ValueKind Kind)
{
    /// <summary>An expression that could not be resolved; the finding stands already.</summary>
    public static Typed Broken { get; } = new(null, default);

    /// <summary>The fixed value, or null when the expression is broken or varies.</summary>
    public Value? Constant => (Bound as BoundLiteral)?.Value;

    /// <summary>A fixed value as an expression.</summary>
    public static Typed Of(Span span, Value value) => new(new BoundLiteral(span, value), ValueKinds.Of(value));
}
