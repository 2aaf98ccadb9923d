using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Resolves functions of whole lists: positions that satisfy a condition, and how many there are.</summary>
/// <param name="values">Resolves what stands around.</param>
internal sealed class ListCalls(ExpressionBinder values)
{
    private static readonly Dictionary<string, string> Shapes = new()
    {
        ["where"] = "where(condition)",
        ["size"] = "size(set)",
        ["count"] = "count(condition in set)",
        ["share"] = "share(condition in set)",
        ["some"] = "some(number of set)",
    };

    /// <summary>Names that only functions of lists have.</summary>
    public static IEnumerable<string> Names => Shapes.Keys.Where(n => n != "count");

    private BindContext Context => values.Context;

    /// <summary>Whether a call is one of a list.</summary>
    public static bool Fits(CallExpression call) => Shapes.ContainsKey(call.Function.Text) && (call.Function.Text != "count" || call.Separator == "in");

    /// <summary>Resolves a call.</summary>
    public Typed Bind(CallExpression call)
    {
        string name = call.Function.Text, shape = Shapes[name];
        if (!Context.OnLists)
            return values.Refuse(call.Function.Span, BindingMessages.ListsNotHere(shape, Context.HasCopies));
        if (!HasShape(call))
            return values.Refuse(call.Span, BindingMessages.WrongArguments(name, shape));
        return name switch
        {
            "where" => Where(call),
            "size" => Size(call),
            "some" => Some(call),
            _ => Tally(call),
        };
    }

    private static bool HasShape(CallExpression call)
    {
        string? separator = call.Function.Text switch { "count" or "share" => "in", "some" => "of", _ => null };
        return call.Over is null && call.Arguments.Count == 1 && call.Separator == separator && call.Second.Count == (separator is null ? 0 : 1);
    }

    private Typed Where(CallExpression call) =>
        Predicate(call.Arguments[0]) is { } predicate ? new Typed(new BoundWhere(call.Span, predicate), ValueKind.Set) : new Typed(null, ValueKind.Set);

    private Typed Size(CallExpression call) =>
        values.Expect(call.Arguments[0], ValueKind.Set).Bound is { } set ? new Typed(new BoundSize(call.Span, set), ValueKind.Number) : new Typed(null, ValueKind.Number);

    private Typed Tally(CallExpression call)
    {
        BoundExpression? predicate = Predicate(call.Arguments[0]), set = values.Expect(call.Second[0], ValueKind.Set).Bound;
        return predicate is null || set is null
            ? new Typed(null, ValueKind.Number)
            : new Typed(new BoundTally(call.Span, predicate, set, call.Function.Text == "share"), ValueKind.Number);
    }

    private Typed Some(CallExpression call)
    {
        if (!values.MayDraw)
            return values.Refuse(call.Span, BindingMessages.NothingDrawnHere());
        BoundExpression? count = values.Expect(call.Arguments[0], ValueKind.Number).Bound, set = values.Expect(call.Second[0], ValueKind.Set).Bound;
        return count is null || set is null ? new Typed(null, ValueKind.Set) : new Typed(new BoundSome(call.Span, count, set), ValueKind.Set);
    }

    private BoundExpression? Predicate(Expression condition)
    {
        BoundExpression? bound = new ExpressionBinder(Context, values.View) { InPredicate = true }.Expect(condition, ValueKind.Truth).Bound;
        if (bound is null or BoundLiteral || !Context.HasCopies || BoundWalk.Slots(bound).Any(Context.IsPerCopy))
            return bound;
        Context.Findings.Report(condition.Span, BindingMessages.SameInEveryCopy(Context.TextOf(condition.Span)));
        return null;
    }
}
