using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Unrolls a script's statements into steps and checks each for its actor.</summary>
internal sealed class StepBinder
{
    // A protocol beyond this cannot be evaluated anyway; the limits keep a slip in a range from running for ever.
    private const int MostSteps = 100_000;
    private const int MostTurns = 10_000;

    private readonly BindContext _context;
    private readonly NameMaker _names;
    private readonly PartyResolver _parties;
    private readonly QuantumSteps _quantum;
    private readonly ClassicalSteps _classical;
    private readonly WhenBinder _whens;
    private readonly Reachability _reach;
    private readonly LabelBinder _labels;
    private readonly BlockBinder _blocks;
    private List<RefereeLine> _openLines = [];
    private int _turns;
    private int _steps;
    private bool _full;

    /// <summary>Prepares the pass.</summary>
    public StepBinder(BindContext context, LabelBinder labels)
    {
        _context = context;
        _labels = labels;
        _names = new NameMaker(context);
        _parties = new PartyResolver(context);
        _reach = new Reachability(context);
        _whens = new WhenBinder(context, _names, _reach, Block);
        Actors actors = new(context, _parties, _whens);
        _quantum = new QuantumSteps(context, actors, _names, labels);
        _classical = new ClassicalSteps(context, actors, _names, _parties);
        _blocks = new BlockBinder(context, labels, _parties, Block);
    }

    /// <summary>Steps of the discussions.</summary>
    public IReadOnlyList<Step> ListSteps => _blocks.ListSteps;

    /// <summary>Where each discussion's steps stand among <see cref="ListSteps"/>.</summary>
    public IReadOnlyList<BlockRange> Discussions => _blocks.Discussions;

    /// <summary>Lines for the referee, in the order written, with the state they are to be read in.</summary>
    public List<RefereeLine> RefereeLines { get; } = [];

    /// <summary>Binds the whole script.</summary>
    public IReadOnlyList<Step> Bind()
    {
        List<Step> steps = [];
        _context.Named = [];
        Block(_context.Tree.Statements, steps);
        CloseLines([]);
        _context.Named = null;
        return steps;
    }

    private void Block(IReadOnlyList<Statement> statements, List<Step> steps)
    {
        foreach (Statement statement in statements)
        {
            if (_full)
                return;
            _reach.Visit(statement);
            int before = steps.Count;
            Bind(statement, steps);
            for (int i = before; i < steps.Count && _context.Counters.Count > 0; i++)
                steps[i] = steps[i].Counters.IsEmpty ? steps[i] with { Counters = _context.Counters } : steps[i];
            TellMisses();
            Limit(statement, steps.Count - before);
        }
    }

    private void Bind(Statement statement, List<Step> steps)
    {
        switch (statement)
        {
            case ForStatement s: For(s, steps); break;
            case RoundStatement s: _blocks.Round(s, steps); break;
            case DiscussionStatement s: _blocks.Discussion(s); break;
            case MeasureStatement or ApplyStatement or WaitStatement or InterceptStatement when _context.OnLists: Quantum(statement); break;
            case WhenStatement s: _whens.Bind(s, steps); break;
            case MeasureStatement s: _quantum.Measure(s, steps); break;
            case ApplyStatement s: _quantum.Apply(s, steps); break;
            case WaitStatement s: _quantum.Wait(s, steps); break;
            case InterceptStatement s: _quantum.Intercept(s, steps); break;
            case CheckpointStatement s when _blocks.StandsAboveDiscussions(s): _quantum.Checkpoint(s, steps); break;
            case CheckpointStatement: Suspect(statement); break;
            case PickStatement s: _classical.Pick(s, steps); break;
            case SetStatement s: _classical.Set(s, steps); break;
            case SendStatement s: _classical.Send(s, steps); break;
            case AbortStatement s: _classical.Abort(s, steps); break;
            case KeepStatement s: Keep(s, steps); break;
            case SuccessStatement or ReportStatement or ClaimStatement or GoalStatement: ForReferee(statement); break;
            default: NotAStep(statement); break;
        }
    }

    private void NotAStep(Statement statement)
    {
        if (statement is not (BrokenStatement or DishonestStatement or ReplaceStatement or ChooseStatement or PerfectStatement or HarmStatement) && !_context.Tree.Statements.Contains(statement))
            _context.Findings.Report(statement.Span, BindingMessages.DeclarationInBlock(_context.TextOf(statement.Span)));
    }

    private void For(ForStatement loop, List<Step> steps)
    {
        _names.CheckFree(loop.Counter);
        if (_context.Now.Makers(loop.Counter.Text).Count > 0)
            _context.Findings.Report(loop.Counter.Span, BindingMessages.NameTaken(loop.Counter.Text, "a value made above"));
        if (_parties.Whole(loop.From) is not { } from || _parties.Whole(loop.To) is not { } to)
        {
            foreach (Statement inner in TreeWalk.Statements(loop.Body))
                Suspect(inner);
            return;
        }

        long count = Math.Max(0L, (loop.Down ? (long)from - to : (long)to - from) + 1);
        if (count > MostTurns - _turns)
        {
            _full = true;
            _context.Findings.Report(loop.Span, BindingMessages.TooManyTurns(MostTurns));
            return;
        }

        _turns += (int)count;
        for (int turn = 0; turn < count && !_full; turn++)
            Turn(loop, loop.Down ? from - turn : from + turn, steps);
    }

    private void Turn(ForStatement loop, int counter, List<Step> steps)
    {
        NameState before = _context.Now;
        var (counters, loops, lines) = (_context.Counters, _context.Loops, _openLines);
        _context.Counters = counters.SetItem(loop.Counter.Text, counter);
        _context.Loops = loops.Push(loop);
        _openLines = [];
        _names.InTurn(() => Block(loop.Body, steps));
        CloseLines(lines);
        _context.Now = _context.Now.WithNamesOf(before);
        (_context.Counters, _context.Loops) = (counters, loops);
    }

    // Lines that use what a skipped line would have made are not to blame.
    private void Suspect(Statement statement)
    {
        foreach (Name name in TreeWalk.Makes(statement))
            _context.Findings.Suspect(name.Text);
        if (statement is CheckpointStatement checkpoint)
            _context.Findings.Suspect(checkpoint.Label.Text);
    }

    // In a discussion as such the parser has told it; in lines that replace one it cannot know.
    private void Quantum(Statement statement)
    {
        Suspect(statement);
        if (_context.Cheat is { Speaks: true })
            _context.Findings.Report(statement.Span, BindingMessages.QuantumInDiscussion());
    }

    private void Keep(KeepStatement keep, List<Step> steps)
    {
        if (_context.Cheat is { Speaks: true })
        {
            _context.Findings.Report(keep.Span, BindingMessages.KeepInCheat());
            return;
        }

        if (_context.OnLists)
            return;
        _ = _blocks.StandsAboveDiscussions(keep);
        Typed condition = new ExpressionBinder(_context, new PublicView(_context, _context.Now)).Expect(keep.Condition, ValueKind.Truth);
        if (condition.Bound is not null)
            steps.Add(new KeepStep(keep.Span, condition.Bound));
    }

    private void ForReferee(Statement statement)
    {
        RefereeLine line = new(statement, _context.Counters, _context.Loops);
        if (statement is ReportStatement report)
            line.Label = _labels.Enter(report.Label, MetricKind.Report);
        RefereeLines.Add(line);
        _openLines.Add(line);
    }

    // A referee's line sees all names of its block, also those made below it.
    private void CloseLines(List<RefereeLine> outer)
    {
        foreach (RefereeLine line in _openLines)
            line.State = _context.Now;
        _openLines = outer;
    }

    private void TellMisses()
    {
        foreach ((Miss miss, IReadOnlyCollection<int> actors) in _context.Misses.Take())
            _context.Findings.Report(miss.Span, BindingMessages.NotKnown(miss, [.. actors.Select(_context.NameOf)], "on", _context));
    }

    private void Limit(Statement statement, int added)
    {
        if (statement is ForStatement or RoundStatement or DiscussionStatement or WhenStatement)
            return;
        _steps += added;
        if (_steps <= MostSteps || _full)
            return;
        _full = true;
        _context.Findings.Report(statement.Span, BindingMessages.TooManySteps(MostSteps));
    }
}
