using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Binds <c>when</c> blocks: both branches from the same state, then the condition as those who act inside know it.</summary>
/// <param name="context">The binding.</param>
/// <param name="names">Gives names.</param>
/// <param name="reach">Finds lines that never run.</param>
/// <param name="block">Binds the statements of a branch.</param>
internal sealed class WhenBinder(BindContext context, NameMaker names, Reachability reach, Action<IReadOnlyList<Statement>, List<Step>> block)
{
    private readonly Stack<(SortedSet<int> Actors, List<Span> Intercepts)> _open = [];

    /// <summary>Notes who acts inside the blocks that are open.</summary>
    public void NoteActors(IEnumerable<int> parties)
    {
        foreach ((SortedSet<int> actors, _) in _open)
            actors.UnionWith(parties);
    }

    /// <summary>Notes an interception inside the blocks that are open.</summary>
    public void NoteIntercept(Span span)
    {
        foreach ((_, List<Span> intercepts) in _open)
            intercepts.Add(span);
    }

    /// <summary>Binds a block.</summary>
    public void Bind(WhenStatement when, List<Step> steps)
    {
        bool? taken = Known(when.Condition);
        NameState before = context.Now;
        int firstSlot = context.Slots.Count;
        _open.Push(([], []));
        List<Step> then = Branch(when.Then, taken == false);
        NameState first = context.Now;
        Span? firstEnd = reach.End;
        context.Now = before;
        names.EnterSibling(first);
        List<Step> otherwise = Branch(when.Otherwise, taken == true);
        names.LeaveSibling();
        NameState second = context.Now;
        reach.End = firstEnd is not null && reach.End is not null ? firstEnd : null;
        (SortedSet<int> actors, List<Span> intercepts) = _open.Pop();
        context.Now = taken switch
        {
            true => BranchMerge.Take(first, second, firstSlot, names.Shared),
            false => BranchMerge.Take(second, first, firstSlot, names.Shared),
            _ => BranchMerge.Merge(first, second, firstSlot, names.Shared),
        };
        // Only the cheat acted in it: its own lines stand elsewhere.
        if (context.Cheat is { Replaces: true } && then.Count == 0 && otherwise.Count == 0)
            return;
        if (taken is { } holds)
            steps.AddRange(holds ? then : otherwise);
        else if (Condition(when.Condition, before, actors, intercepts) is { } condition)
            steps.Add(new WhenStep(when.Span, condition, then, otherwise));
    }

    private List<Step> Branch(IReadOnlyList<Statement> statements, bool off)
    {
        List<Step> steps = [];
        Span? end = reach.End;
        reach.End = null;
        if (off)
            context.Findings.Mute(true);
        block(statements, steps);
        if (off)
            context.Findings.Mute(false);
        reach.End ??= end;
        return steps;
    }

    // A condition on parameters and counters alone is decided here: the other branch does not exist at these values.
    private bool? Known(Expression condition)
    {
        bool open = TreeWalk.Within(condition).Any(e => e is not (NumberExpression or TruthExpression or NoneExpression or UnaryExpression
            or BinaryExpression or IfExpression) && !(e is NameExpression name && IsFixed(name.Text)));
        if (open)
            return null;
        Value? value = new ExpressionBinder(context, new ConstantView(context)).Expect(condition, ValueKind.Truth).Constant;
        return value is null ? null : value is TruthValue { Truth: true };
    }

    private bool IsFixed(string name) => context.Parameters.ContainsKey(name) || context.Counters.ContainsKey(name);

    private BoundExpression? Condition(Expression condition, NameState before, SortedSet<int> actors, List<Span> intercepts)
    {
        if (actors.Count == 0)
            return new ExpressionBinder(context, new PublicView(context, before)).Expect(condition, ValueKind.Truth).Bound;
        BoundExpression?[] seen = [.. actors.Select(a => As(condition, before, a, intercepts))];
        TellMisses();
        if (seen.Any(s => s is null))
            return null;
        if (seen.All(s => BoundWalk.Same(s!, seen[0]!)))
            return seen[0];
        BoundExpression[] made = [.. seen.Select(s => BoundWalk.Map(s!, before.Origin))];
        if (made.All(m => BoundWalk.Same(m, made[0])))
            return made[0];
        context.Findings.Report(condition.Span, BindingMessages.ReadDifferently([.. actors.Select(context.NameOf)]));
        return null;
    }

    private BoundExpression? As(Expression condition, NameState before, int actor, List<Span> intercepts)
    {
        BoundExpression? bound = new ExpressionBinder(context, new ActorView(context, before, actor)).Expect(condition, ValueKind.Truth).Bound;
        if (bound is not null && context.Parties.IsOutsider(actor) && context.DependsOnMessages(bound))
        {
            foreach (Span intercept in intercepts)
                context.Findings.Report(intercept, BindingMessages.InterceptUsesMessages(context.NameOf(actor)));
        }

        return bound;
    }

    private void TellMisses()
    {
        foreach ((Miss miss, IReadOnlyCollection<int> actors) in context.Misses.Take())
            context.Findings.Report(miss.Span, BindingMessages.NotKnown(miss, [.. actors.Select(context.NameOf)], "under a condition on", context));
    }
}
