using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Resolves functions of classical values.</summary>
/// <param name="values">Resolves the arguments.</param>
internal sealed class CallBinder(ExpressionBinder values)
{
    private static readonly Dictionary<string, (ValueFunction Function, ValueKind Argument, ValueKind Result, string Shape)> Functions = new()
    {
        ["distinct"] = (ValueFunction.Distinct, ValueKind.Unknown, ValueKind.Truth, "distinct(value, …)"),
        ["same"] = (ValueFunction.Same, ValueKind.Unknown, ValueKind.Truth, "same(value, …)"),
        ["missing"] = (ValueFunction.Missing, ValueKind.Number, ValueKind.Number, "missing(level, …)"),
        ["count"] = (ValueFunction.Count, ValueKind.Truth, ValueKind.Number, "count(condition over parties)"),
        ["largest"] = (ValueFunction.Largest, ValueKind.Number, ValueKind.Number, "largest(number over parties)"),
        ["abs"] = (ValueFunction.Absolute, ValueKind.Number, ValueKind.Number, "abs(number)"),
    };

    /// <summary>Names of all functions of classical values.</summary>
    public static IEnumerable<string> Names => Functions.Keys.Concat(ListCalls.Names);

    private BindContext Context => values.Context;

    /// <summary>Resolves a function with its arguments.</summary>
    public Typed Bind(CallExpression call)
    {
        string name = call.Function.Text;
        if (ListCalls.Fits(call))
            return new ListCalls(values).Bind(call);
        if (FigureBinder.Names.Contains(name))
            return values.Refuse(call.Function.Span, BindingMessages.FigureAmongValues(name));
        if (!Functions.TryGetValue(name, out (ValueFunction Function, ValueKind Argument, ValueKind Result, string Shape) shape))
            return values.Refuse(call.Function.Span, BindingMessages.UnknownFunction(name, NearWords.Find(name, Names.Concat(FigureBinder.Names)), Names));
        if (!HasRightCount(call, shape.Function))
            return values.Refuse(call.Span, BindingMessages.WrongArguments(name, shape.Shape));
        Typed[] arguments = call.Over is { } over ? Over(call.Arguments[0], over, shape.Argument) : Expand(call.Arguments, shape.Argument);
        if (!CompareAlike(call, shape.Function, arguments) || arguments.Any(a => a.Bound is null))
            return new Typed(null, shape.Result);
        return Build(call, shape.Function, shape.Result, arguments);
    }

    /// <summary>Arguments with lists such as <c>v of all</c> unfolded into one value per party.</summary>
    public Typed[] Expand(IEnumerable<Expression> arguments, ValueKind wanted) =>
        [.. arguments.SelectMany(a => a is OfExpression of ? Members(of, wanted) : [values.Expect(a, wanted)])];

    private Typed Build(CallExpression call, ValueFunction function, ValueKind kind, Typed[] arguments)
    {
        BoundCall bound = new(call.Span, function, [.. arguments.Select(a => a.Bound!)]);
        // Whether exactly one level is missing is a legitimate question about fixed values too, so none is no mistake here.
        return function is ValueFunction.Missing or ValueFunction.Largest ? new Typed(bound, kind) : values.Fold(bound, kind, arguments);
    }

    private static bool HasRightCount(CallExpression call, ValueFunction function)
    {
        bool plain = call.Over is null && call.Separator is null && call.Second.Count == 0;
        return function switch
        {
            ValueFunction.Count => call.Over is not null && call.Arguments.Count == 1,
            ValueFunction.Largest => (call.Over is not null && call.Arguments.Count == 1) || (plain && call.Arguments.Count >= 1),
            ValueFunction.Absolute => plain && call.Arguments.Count == 1 && call.Arguments[0] is not OfExpression,
            _ => plain && call.Arguments.Count >= 1,
        };
    }

    private Typed[] Over(Expression each, PartyList parties, ValueKind wanted) =>
        [.. new PartyResolver(Context).Classical(parties).Select(p => values.With(values.View.As(p.Party)).Expect(each, wanted))];

    private IEnumerable<Typed> Members(OfExpression of, ValueKind wanted)
    {
        foreach (PartyMention party in new PartyResolver(Context).Classical(of.Parties))
        {
            Typed value = values.Single(
                values.View.Member(party.Party, of.Member.Text, of.Member.Span), $"{Context.NameOf(party.Party)}.{of.Member.Text}", of.Member.Span);
            bool fits = ValueKinds.Fits(value.Kind, wanted);
            yield return fits ? value : values.Refuse(of.Member.Span, BindingMessages.WrongKind(of.Member.Text, value.Kind, wanted));
        }
    }

    private bool CompareAlike(CallExpression call, ValueFunction function, Typed[] arguments)
    {
        if (function is not (ValueFunction.Distinct or ValueFunction.Same))
            return true;
        if (arguments.Any(a => a.Kind == ValueKind.Set))
        {
            values.Refuse(call.Span, BindingMessages.SetsCompared(call.Function.Text));
            return false;
        }

        foreach (Typed argument in arguments.Skip(1))
        {
            if (ValueKinds.Together(arguments[0].Kind, argument.Kind))
                continue;
            values.Refuse(call.Span, BindingMessages.NeverEqual(arguments[0].Kind, argument.Kind));
            return false;
        }

        return true;
    }
}
