using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Resolves the referee's lines once all steps are known: success, reports, claims, goals.</summary>
/// <param name="context">The binding.</param>
/// <param name="labels">Labels of checkpoints and reports.</param>
/// <param name="steps">The steps.</param>
internal sealed class RefereeBinder(BindContext context, LabelBinder labels, IReadOnlyList<Step> steps)
{
    private readonly IReadOnlyList<int> _lastCheckpoint = LastCheckpoint(steps)?.Parties ?? context.Parties.Holders;
    private readonly List<Report> _reports = [];
    private readonly List<Claim> _claims = [];
    private readonly List<Goal> _goals = [];
    private Span? _successAt;

    /// <summary>The success condition; null when it is missing or wrong.</summary>
    public BoundExpression? Success { get; private set; }

    /// <summary>Reports in the order written.</summary>
    public IReadOnlyList<Report> Reports => _reports;

    /// <summary>Claims in the order written.</summary>
    public IReadOnlyList<Claim> Claims => _claims;

    /// <summary>Goals in the order written.</summary>
    public IReadOnlyList<Goal> Goals => _goals;

    /// <summary>Resolves all lines.</summary>
    public void Bind(IReadOnlyList<RefereeLine> lines)
    {
        foreach (RefereeLine line in lines)
        {
            (context.Counters, context.Loops, context.Now) = (line.Counters, line.Loops, line.State);
            context.OnLists = context.HasCopies;
            switch (line.Statement)
            {
                case SuccessStatement s: Judge(s, line); break;
                case ReportStatement s: Tell(s, line); break;
                case ClaimStatement s: Promise(s, line); break;
                case GoalStatement s: Need(s, line); break;
            }
        }

        context.OnLists = false;
    }

    private void Judge(SuccessStatement statement, RefereeLine line)
    {
        if (_successAt is { } first)
            context.Findings.Report(statement.Span, BindingMessages.DeclaredTwice("success", context.LineOf(first)));
        _successAt ??= statement.Span;
        Success = new ExpressionBinder(context, new RefereeView(context, line.State)).Expect(statement.Condition, ValueKind.Truth).Bound;
    }

    private void Tell(ReportStatement statement, RefereeLine line)
    {
        if (Figures(line).Bind(statement.Value) is { } figure)
            _reports.Add(new Report(line.Label, figure));
    }

    private void Promise(ClaimStatement statement, RefereeLine line)
    {
        if (statement.Comparison is not BinaryExpression { Operator: BinaryOperator.Equal or BinaryOperator.LessOrEqual or BinaryOperator.GreaterOrEqual } comparison)
        {
            context.Findings.Report(statement.Comparison.Span, BindingMessages.ClaimForm());
            return;
        }

        Figure? left = Figures(line).Bind(comparison.Left), right = Figures(line).Bind(comparison.Right);
        if (left is not null && right is not null)
            _claims.Add(new Claim(Text(comparison.Span), left, comparison.Operator, right, statement.Span));
    }

    private void Need(GoalStatement statement, RefereeLine line)
    {
        if (statement.Comparison is not BinaryExpression { Operator: BinaryOperator.LessOrEqual or BinaryOperator.GreaterOrEqual } comparison
            || !FigureBinder.NamesMetric(comparison.Left))
        {
            context.Findings.Report(statement.Comparison.Span, BindingMessages.GoalForm(NearMetric(statement)));
            return;
        }

        Figure? metric = Figures(line).Bind(comparison.Left), threshold = Figures(line).Bind(comparison.Right);
        if (metric is null || threshold is null)
            return;
        if (metric is MetricFigure { Metric: var name } && threshold is NumberFigure { Value: var value })
            _goals.Add(new Goal(Text(comparison.Span), name, comparison.Operator, value, statement.Span));
        else
            context.Findings.Report(statement.Comparison.Span, BindingMessages.GoalForm(null));
    }

    private static string? NearMetric(GoalStatement statement) =>
        statement.Comparison is BinaryExpression { Left: NameExpression name } ? NearWords.Find(name.Text, FigureBinder.MetricWords) : null;

    private string Text(Span span) => labels.Write(context.TextOf(span), span);

    private FigureBinder Figures(RefereeLine line) => new(context, labels, line, _lastCheckpoint);

    private static CheckpointStep? LastCheckpoint(IReadOnlyList<Step> steps)
    {
        foreach (Step step in steps.Reverse())
        {
            CheckpointStep? found = step switch
            {
                CheckpointStep checkpoint => checkpoint,
                WhenStep block => LastCheckpoint(block.Otherwise) ?? LastCheckpoint(block.Then),
                _ => null,
            };
            if (found is not null)
                return found;
        }

        return null;
    }
}
