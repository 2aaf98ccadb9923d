using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Resolves expressions for classical values from one point of view and checks their sorts.</summary>
/// <param name="context">The binding.</param>
/// <param name="view">Whose names are meant.</param>
internal sealed class ExpressionBinder(BindContext context, NameView view)
{
    /// <summary>The binding.</summary>
    public BindContext Context => context;

    /// <summary>Whose names are meant.</summary>
    public NameView View => view;

    /// <summary>Whether the expression is about one copy at a time, inside a function of lists.</summary>
    public bool InPredicate { get; init; }

    /// <summary>Whether positions may be drawn at random: in a value that is set or sent, not in a condition that several parties read.</summary>
    public bool MayDraw { get; init; }

    /// <summary>Whether the expression is an end of a range that holds for all copies, even in a round.</summary>
    public bool IsRange { get; init; }

    /// <summary>The same rules with another's names.</summary>
    public ExpressionBinder With(NameView other) => new(context, other) { InPredicate = InPredicate, MayDraw = MayDraw, IsRange = IsRange };

    /// <summary>A value of a name, which must be one per run where whole lists are worked on.</summary>
    public Typed Single(Typed typed, string label, Span span)
    {
        bool lists = (context.OnLists || IsRange) && !InPredicate;
        return lists && typed.Bound is { } bound && BoundWalk.Slots(bound).Any(context.IsPerCopy) ? Refuse(span, BindingMessages.OnePerCopy(label)) : typed;
    }

    /// <summary>Resolves an expression that must be of one sort.</summary>
    public Typed Expect(Expression expression, ValueKind wanted)
    {
        if (wanted == ValueKind.Basis && expression is NameExpression name && IsNameless(name.Text))
            return Report(expression.Span, name.Text, BindingMessages.NoBasis(name.Text, NearWords.Find(name.Text, ["level", "fourier", "phased", "matrix"])));
        return Fitting(expression, Bind(expression), wanted);
    }

    /// <summary>Resolves an expression.</summary>
    public Typed Bind(Expression expression) => expression switch
    {
        NumberExpression e => Typed.Of(e.Span, new NumberValue(e.Value)),
        TruthExpression e => Typed.Of(e.Span, Value.Of(e.Value)),
        NoneExpression e => Typed.Of(e.Span, Value.None),
        NameExpression e => Name(e),
        PartyExpression e => Party(e.Span, new PartyResolver(context).Single(e.Party)),
        MemberExpression e => Member(e),
        UnaryExpression e => Unary(e),
        BinaryExpression e => Binary(e),
        IfExpression e => If(e),
        BasisExpression e => Basis(e),
        CallExpression e => new CallBinder(this).Bind(e),
        OfExpression e => Refuse(e.Span, BindingMessages.ListOutsideFunction(context.TextOf(e.Span))),
        _ => Refuse(expression.Span, BindingMessages.NoValueHere(context.TextOf(expression.Span))),
    };

    private Typed Fitting(Expression expression, Typed typed, ValueKind wanted)
    {
        if (ValueKinds.Fits(typed.Kind, wanted))
            return typed;
        context.Findings.Report(expression.Span, BindingMessages.WrongKind(context.TextOf(expression.Span), typed.Kind, wanted));
        return Typed.Broken;
    }

    /// <summary>Replaces an expression by its value when nothing in it varies.</summary>
    public Typed Fold(BoundExpression expression, ValueKind kind, params Typed[] parts)
    {
        if (!parts.All(p => p.Constant is not null))
            return new Typed(expression, kind);
        Value value = ValueEvaluator.Evaluate(expression, [], context.Levels);
        return new Typed(new BoundLiteral(expression.Span, value), kind);
    }

    /// <summary>Reports and gives a broken value.</summary>
    public Typed Refuse(Span span, Message message)
    {
        context.Findings.Report(span, message);
        return Typed.Broken;
    }

    private Typed Report(Span span, string name, Message message)
    {
        context.Findings.ReportName(name, span, message);
        return Typed.Broken;
    }

    private bool IsNameless(string name) =>
        !context.Findings.IsSuspect(name) && !context.IsNameTaken(name) && context.Makers.Of(name).Count == 0;

    private Typed Name(NameExpression e)
    {
        if (context.Counters.TryGetValue(e.Text, out int counter))
            return Typed.Of(e.Span, Value.Of(counter));
        if (context.Parameters.TryGetValue(e.Text, out Rational parameter))
            return Typed.Of(e.Span, new NumberValue(parameter));
        if (context.Cheat is { } cheat && view.SeesChoices && cheat.Chooses(e.Text))
            return cheat.Use(e, view);
        if (context.Parties.IndexOf(e.Text) is >= 0 and int party)
            return Party(e.Span, party);
        if (context.Parties.Families.TryGetValue(e.Text, out (int Least, int Most) range))
            return Refuse(e.Span, BindingMessages.FamilyNeedsNumber(e.Text, range.Least, range.Most));
        return context.Findings.IsSuspect(e.Text) && view.State.Makers(e.Text).Count == 0 ? Typed.Broken : Single(view.Bare(e.Text, e.Span), e.Text, e.Span);
    }

    private Typed Party(Span span, int party) => party < 0 ? Typed.Broken : Typed.Of(span, new PartyValue(party, context.NameOf(party)));

    private Typed Member(MemberExpression e)
    {
        int party = new PartyResolver(context).Single(e.Party);
        return party < 0 ? Typed.Broken : Single(view.Member(party, e.Member.Text, e.Span), context.TextOf(e.Span), e.Span);
    }

    private Typed Unary(UnaryExpression e)
    {
        ValueKind kind = e.Operator == UnaryOperator.Not ? ValueKind.Truth : ValueKind.Number;
        Typed operand = Expect(e.Operand, kind);
        return operand.Bound is null ? new Typed(null, kind) : Fold(new BoundUnary(e.Span, e.Operator, operand.Bound), kind, operand);
    }

    private Typed Binary(BinaryExpression e)
    {
        if (e.Operator is BinaryOperator.Without or BinaryOperator.And or BinaryOperator.Or)
            return Junction(e);
        (ValueKind wanted, ValueKind kind) = Sorts(e.Operator);
        Typed left = Expect(e.Left, wanted), right = Expect(e.Right, wanted);
        return ValueKinds.Together(left.Kind, right.Kind) ? Joined(e, kind, left, right) : Refuse(e.Span, BindingMessages.NeverEqual(left.Kind, right.Kind));
    }

    // and, or and minus join sets; and and or join truth values as well. Their operands tell which.
    private Typed Junction(BinaryExpression e)
    {
        Typed left = Bind(e.Left), right = Bind(e.Right);
        bool sets = e.Operator == BinaryOperator.Without || left.Kind == ValueKind.Set || right.Kind == ValueKind.Set;
        ValueKind kind = sets ? ValueKind.Set : ValueKind.Truth;
        return Joined(e, kind, Fitting(e.Left, left, kind), Fitting(e.Right, right, kind));
    }

    private Typed Joined(BinaryExpression e, ValueKind kind, Typed left, Typed right)
    {
        if (left.Bound is null || right.Bound is null)
            return new Typed(null, kind);
        Typed folded = Fold(new BoundBinary(e.Span, e.Operator, left.Bound, right.Bound), kind, left, right);
        bool undefined = folded.Constant is NoneValue && left.Constant is not NoneValue && right.Constant is not NoneValue;
        // With parameters in it, an undefined number is none, so that a requirement on it is broken rather than wrong.
        return undefined && TreeWalk.IsLiteral(e) ? Refuse(e.Span, BindingMessages.Undefined(context.TextOf(e.Span))) : folded;
    }

    private static (ValueKind Operands, ValueKind Result) Sorts(BinaryOperator op) => op switch
    {
        BinaryOperator.Equal or BinaryOperator.Unequal => (ValueKind.Unknown, ValueKind.Truth),
        BinaryOperator.Less or BinaryOperator.LessOrEqual or BinaryOperator.Greater or BinaryOperator.GreaterOrEqual => (ValueKind.Number, ValueKind.Truth),
        _ => (ValueKind.Number, ValueKind.Number),
    };

    private Typed If(IfExpression e)
    {
        Typed condition = Expect(e.Condition, ValueKind.Truth);
        bool? known = condition.Constant is { } value ? value is TruthValue { Truth: true } : null;
        Typed then = Branch(e.Then, known == false), otherwise = Branch(e.Else, known == true);
        if (!ValueKinds.Together(then.Kind, otherwise.Kind))
            return Refuse(e.Span, BindingMessages.BranchesDiffer(then.Kind, otherwise.Kind));
        ValueKind kind = ValueKinds.Join(then.Kind, otherwise.Kind);
        if (known is { } holds)
            return new Typed(holds ? then.Bound : otherwise.Bound, kind);
        return condition.Bound is null || then.Bound is null || otherwise.Bound is null
            ? new Typed(null, kind)
            : new Typed(new BoundIf(e.Span, condition.Bound, then.Bound, otherwise.Bound), kind);
    }

    private Typed Branch(Expression expression, bool off)
    {
        if (off)
            context.Findings.Mute(true);
        Typed typed = Bind(expression);
        if (off)
            context.Findings.Mute(false);
        return typed;
    }

    private Typed Basis(BasisExpression e)
    {
        if (e.Argument is null)
            return Fold(new BoundBasis(e.Span, e.Kind, null, e.File?.Text), ValueKind.Basis);
        bool fourier = e.Kind == BasisKind.Fourier;
        Typed argument = fourier ? Index(e.Argument, "fourier on", 1, context.Levels) : Index(e.Argument, "phased", 0, context.Levels - 1);
        return argument.Bound is null
            ? new Typed(null, ValueKind.Basis)
            : Fold(new BoundBasis(e.Span, e.Kind, argument.Bound, null), ValueKind.Basis, argument);
    }

    /// <summary>Resolves a whole number that must lie in a range, as far as it is fixed.</summary>
    public Typed Index(Expression expression, string where, int least, int most)
    {
        Typed typed = Expect(expression, ValueKind.Number);
        if (typed.Constant is not NumberValue number || !context.Parties.HasResource)
            return typed;
        bool inside = number.Number.IsWhole && number.Number >= least && number.Number <= most;
        return inside ? typed : Refuse(expression.Span, BindingMessages.OutsideLevels(where, Written.Number(number.Number), least, most, context.Levels));
    }
}
