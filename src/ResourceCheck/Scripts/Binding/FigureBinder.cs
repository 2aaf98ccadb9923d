using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Resolves figures about the whole ensemble of copies.</summary>
/// <param name="context">The binding.</param>
/// <param name="labels">Labels of checkpoints and reports.</param>
/// <param name="line">The line that the figure stands in.</param>
/// <param name="lastCheckpoint">Parties whose state a Bell value is of.</param>
internal sealed class FigureBinder(BindContext context, LabelBinder labels, RefereeLine line, IReadOnlyList<int> lastCheckpoint)
{
    private static readonly Dictionary<string, string> Shapes = new()
    {
        ["probability"] = "probability(condition) or probability(condition given condition)",
        ["mean"] = "mean(number) or mean(number given condition)",
        ["guess"] = "guess(value from value, …)",
        ["information"] = "information(value, …; value, …)",
        ["bellvalue"] = "bellvalue(party, party)",
        ["entropy"] = "entropy(probability)",
        ["harm"] = "harm \"case\"",
    };

    private readonly ExpressionBinder _values = new(context, new RefereeView(context, line.State));

    private static readonly Dictionary<string, MetricKind> Metrics = new()
    {
        ["success"] = MetricKind.Success,
        ["failure"] = MetricKind.Failure,
        ["abort"] = MetricKind.Abort,
        ["yield"] = MetricKind.Yield,
    };

    /// <summary>Names of all functions that give figures.</summary>
    public static IEnumerable<string> Names => Shapes.Keys;

    /// <summary>Resolves a figure, or gives null after a finding.</summary>
    public Figure? Bind(Expression expression) => Fixed(expression) ?? expression switch
    {
        LabelExpression e => Metric(e.Span, labels.Find(e.Label, line.Label.Length > 0 ? line.Label : null)),
        NameExpression e => Name(e),
        UnaryExpression { Operator: UnaryOperator.Minus } e => Bind(e.Operand) is { } operand ? new MinusFigure(e.Span, operand) : null,
        BinaryExpression { Operator: >= BinaryOperator.Plus and <= BinaryOperator.Divide } e => Arithmetic(e),
        CallExpression e => Call(e),
        _ => Refuse(expression.Span, BindingMessages.NoFigure(context.TextOf(expression.Span))),
    };

    /// <summary>The metric that an expression names, or null when it names none.</summary>
    public static MetricKind? MetricOf(Expression expression) =>
        expression is NameExpression name && Metrics.TryGetValue(name.Text, out MetricKind kind) ? kind : null;

    /// <summary>Words that name a metric by themselves.</summary>
    public static IEnumerable<string> MetricWords => Metrics.Keys;

    /// <summary>Whether an expression has the form of a metric: a metric's word, a label, or a harm.</summary>
    public static bool NamesMetric(Expression expression) =>
        MetricOf(expression) is not null || expression is LabelExpression or CallExpression { Function.Text: "harm" };

    // Numbers from parameters alone stay exact until they are complete, so that 1/3 is the double nearest to one third.
    private NumberFigure? Fixed(Expression expression)
    {
        bool open = TreeWalk.Within(expression).Any(e => e is not (NumberExpression or UnaryExpression or BinaryExpression)
            && !(e is NameExpression name && (context.Parameters.ContainsKey(name.Text) || context.Counters.ContainsKey(name.Text))));
        if (open || expression is BinaryExpression { Operator: < BinaryOperator.Plus } or UnaryExpression { Operator: UnaryOperator.Not })
            return null;
        Value? value = new ExpressionBinder(context, new ConstantView(context)).Expect(expression, ValueKind.Number).Constant;
        if (value is NoneValue)
            context.Findings.Report(expression.Span, BindingMessages.Undefined(context.TextOf(expression.Span)));
        return value is NumberValue number ? new NumberFigure(expression.Span, number.Number.ToDouble()) : null;
    }

    private MetricFigure? Name(NameExpression e)
    {
        if (MetricOf(e) is { } metric)
            return new MetricFigure(e.Span, new MetricName(metric, ""));
        if (!context.Findings.IsSuspect(e.Text))
            context.Findings.Report(e.Span, BindingMessages.NoFigure(e.Text, NearWords.Find(e.Text, MetricWords)));
        return null;
    }

    private ArithmeticFigure? Arithmetic(BinaryExpression e)
    {
        Figure? left = Bind(e.Left), right = Bind(e.Right);
        return left is null || right is null ? null : new ArithmeticFigure(e.Span, e.Operator, left, right);
    }

    private Figure? Call(CallExpression e)
    {
        string name = e.Function.Text;
        if (CallBinder.Names.Contains(name))
            return Refuse(e.Span, BindingMessages.NoFigure(context.TextOf(e.Span)));
        if (!Shapes.TryGetValue(name, out string? shape))
            return Refuse(e.Function.Span, BindingMessages.UnknownFunction(name, NearWords.Find(name, Names.Concat(CallBinder.Names)), Names));
        return HasShape(e) ? Build(e) : Refuse(e.Span, BindingMessages.WrongArguments(name, shape));
    }

    private static bool HasShape(CallExpression e)
    {
        (int first, int second) = (e.Arguments.Count, e.Second.Count);
        return e.Over is null && e.Function.Text switch
        {
            "probability" or "mean" => first == 1 && (e.Separator is null || (e.Separator == "given" && second == 1)),
            "guess" => first == 1 && e.Separator == "from" && second >= 1,
            "information" => first >= 1 && e.Separator == ";" && second >= 1,
            "bellvalue" => first == 2 && e.Separator is null,
            "harm" => first == 1 && e.Arguments[0] is LabelExpression,
            _ => first == 1 && e.Separator is null,
        };
    }

    private Figure? Build(CallExpression e)
    {
        switch (e.Function.Text)
        {
            case "probability":
                return Given(e, ValueKind.Truth, (value, given) => new ProbabilityFigure(e.Span, value, given));
            case "mean":
                return Given(e, ValueKind.Number, (value, given) => new MeanFigure(e.Span, value, given));
            case "guess":
                return Groups(e, (left, right) => new GuessFigure(e.Span, left[0], right));
            case "information":
                return Groups(e, (left, right) => new InformationFigure(e.Span, left, right));
            case "bellvalue":
                return Bell(e);
            case "harm":
                return Metric(e.Span, Harm((LabelExpression)e.Arguments[0]));
            default:
                return Bind(e.Arguments[0]) is { } operand ? new EntropyFigure(e.Span, operand) : null;
        }
    }

    private Figure? Given(CallExpression e, ValueKind wanted, Func<BoundExpression, BoundExpression?, Figure> build)
    {
        Typed value = _values.Expect(e.Arguments[0], wanted);
        Typed given = e.Second.Count == 0 ? Typed.Broken : _values.Expect(e.Second[0], ValueKind.Truth);
        return value.Bound is null || (e.Second.Count > 0 && given.Bound is null) ? null : build(value.Bound, given.Bound);
    }

    private Figure? Groups(CallExpression e, Func<BoundExpression[], BoundExpression[], Figure> build)
    {
        CallBinder lists = new(_values);
        Typed[] left = lists.Expand(e.Arguments, ValueKind.Unknown), right = lists.Expand(e.Second, ValueKind.Unknown);
        if (e.Function.Text == "guess" && left.Length != 1)
            return Refuse(e.Arguments[0].Span, BindingMessages.WrongArguments("guess", Shapes["guess"]));
        return left.Concat(right).Any(v => v.Bound is null)
            ? null
            : build([.. left.Select(v => v.Bound!)], [.. right.Select(v => v.Bound!)]);
    }

    private BellFigure? Bell(CallExpression e)
    {
        Value?[] parties = [.. e.Arguments.Select(a => _values.Expect(a, ValueKind.Party).Constant)];
        if (parties[0] is not PartyValue first || parties[1] is not PartyValue second)
            return null;
        foreach ((PartyValue party, Expression argument) in new[] { (first, e.Arguments[0]), (second, e.Arguments[1]) })
        {
            if (lastCheckpoint.Contains(party.Party) || !context.Parties.HasResource)
                continue;
            context.Findings.Report(argument.Span, BindingMessages.NotInCheckpoint(party.Name, [.. lastCheckpoint.Select(context.NameOf)]));
            return null;
        }

        if (first.Party != second.Party)
            return new BellFigure(e.Span, first.Party, second.Party);
        context.Findings.Report(e.Arguments[1].Span, BindingMessages.NamedTwice(first.Name));
        return null;
    }

    private MetricName? Harm(LabelExpression e)
    {
        string label = labels.Write(e.Label);
        string[] cases = [.. context.Tree.Statements.OfType<DishonestStatement>().Select(d => d.Title.Text)];
        if (cases.Contains(label))
            return new MetricName(MetricKind.Harm, label);
        context.Findings.Report(e.Span, BindingMessages.UnknownCase(label, NearWords.Find(label, cases), cases));
        return null;
    }

    private static MetricFigure? Metric(Span span, MetricName? metric) => metric is null ? null : new MetricFigure(span, metric);

    private Figure? Refuse(Span span, Message message)
    {
        context.Findings.Report(span, message);
        return null;
    }
}
