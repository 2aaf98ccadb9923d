using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Binds rounds and discussions, honestly or with the lines that a cheating strategy puts in place of its parties' own.</summary>
/// <param name="context">The binding.</param>
/// <param name="labels">Writes titles.</param>
/// <param name="parties">Reads lists of parties.</param>
/// <param name="block">Binds statements.</param>
internal sealed class BlockBinder(BindContext context, LabelBinder labels, PartyResolver parties, Action<IReadOnlyList<Statement>, List<Step>> block)
{
    private readonly List<Step> _listSteps = [];
    private readonly List<BlockRange> _discussions = [];
    private Span? _firstDiscussion;

    /// <summary>Steps of the discussions.</summary>
    public IReadOnlyList<Step> ListSteps => _listSteps;

    /// <summary>Where each discussion's steps stand.</summary>
    public IReadOnlyList<BlockRange> Discussions => _discussions;

    /// <summary>Binds a round.</summary>
    public void Round(RoundStatement round, List<Step> steps)
    {
        _ = StandsAboveDiscussions(round);
        Inside(round.Title, round.Body, steps);
    }

    /// <summary>Binds a discussion.</summary>
    public void Discussion(DiscussionStatement discussion)
    {
        _firstDiscussion ??= discussion.Span;
        if (!context.HasCopies && !context.Findings.IsSuspect("copies"))
            context.Findings.Report(discussion.Span, BindingMessages.DiscussionWithoutCopies());
        int first = _listSteps.Count;
        context.OnLists = true;
        string title = Inside(discussion.Title, discussion.Body, _listSteps);
        context.OnLists = false;
        _discussions.Add(new BlockRange(title, first, _listSteps.Count - first));
    }

    /// <summary>Whether a line about single copies stands above every discussion of all of them; reports it when it does not.</summary>
    public bool StandsAboveDiscussions(Statement statement)
    {
        if (_firstDiscussion is not { } first || context.OnLists)
            return true;
        context.Findings.Report(statement.Span, BindingMessages.BelowDiscussion(context.LineOf(first)));
        return false;
    }

    private string Inside(Quoted quoted, IReadOnlyList<Statement> body, List<Step> steps)
    {
        string title = labels.Write(quoted);
        if (context.Cheat is null)
            context.Blocks.Add((quoted.Text, title));
        HashSet<int>? outer = context.Named;
        context.Named = [];
        if (context.Cheat is { } cheat)
            Cheating(cheat, quoted.Text, title, body, steps);
        else
            block(body, steps);
        context.Named = outer;
        return title;
    }

    private void Cheating(Cheat cheat, string written, string title, IReadOnlyList<Statement> body, List<Step> steps)
    {
        if (cheat.For(written, title, before: true) is { } added)
            Speak(cheat, added, steps);
        if (cheat.For(written, title, before: false) is { } instead)
            Replace(cheat, instead, body, steps);
        else
            block(body, steps);
    }

    private void Replace(Cheat cheat, ReplaceStatement instead, IReadOnlyList<Statement> body, List<Step> steps)
    {
        bool spoken = false;
        foreach (Statement statement in body)
        {
            if (!spoken && Acts(cheat, statement))
            {
                Speak(cheat, instead, steps);
                spoken = true;
            }

            cheat.Replaces = true;
            block([statement], steps);
            cheat.Replaces = false;
        }

        if (!spoken && cheat.By.Count > 0)
            context.Findings.Report(instead.Span, BindingMessages.NothingToReplace(cheat.Names, instead.Block.Text, cheat.By.Count));
    }

    private void Speak(Cheat cheat, ReplaceStatement lines, List<Step> steps)
    {
        cheat.Speaks = true;
        block(lines.Body, steps);
        cheat.Speaks = false;
    }

    // Lines of a when stand together: its first line is where the block opens.
    private bool Acts(Cheat cheat, Statement statement) => statement switch
    {
        MeasureStatement s => Acts(cheat, parties.Quantum(s.Actors)),
        ApplyStatement s => Acts(cheat, parties.Quantum(s.Actors)),
        WaitStatement s => Acts(cheat, parties.Quantum(s.Actors)),
        PickStatement s => Acts(cheat, parties.Classical(s.Actors)),
        SetStatement s => Acts(cheat, parties.Classical(s.Actors)),
        SendStatement s => Acts(cheat, parties.Classical(s.Actors)),
        AbortStatement s => Acts(cheat, parties.Classical(s.Actors)),
        WhenStatement s => s.Then.Concat(s.Otherwise).Any(inner => Acts(cheat, inner)),
        _ => false,
    };

    private static bool Acts(Cheat cheat, IReadOnlyList<PartyMention> mentions) => mentions.Any(m => cheat.By.Contains(m.Party));
}
