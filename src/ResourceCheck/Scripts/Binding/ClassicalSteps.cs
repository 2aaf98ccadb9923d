using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Binds classical statements: choices, computations, messages, giving up.</summary>
/// <param name="context">The binding.</param>
/// <param name="actors">Finds who acts.</param>
/// <param name="names">Gives names.</param>
/// <param name="parties">Reads lists of parties.</param>
internal sealed class ClassicalSteps(BindContext context, Actors actors, NameMaker names, PartyResolver parties)
{
    /// <summary>Binds <c>pick</c>.</summary>
    public void Pick(PickStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        if (context.OnLists)
            context.Findings.Report(statement.Span, BindingMessages.NothingPickedHere());
        foreach (PartyMention actor in Acting(statement.Actors, null, statement.Result))
        {
            ExpressionBinder values = Values(before, actor.Party);
            Typed[] options = [.. statement.Options.Select(values.Bind)];
            ValueKind kind = CommonKind(statement, options);
            int slot = names.Make(actor.Party, statement.Result, SlotKind.Pick, kind);
            if (options.Any(o => o.Bound is null))
                continue;
            foreach (Typed option in options)
                context.NoteHeard(slot, option.Bound!);
            steps.Add(new PickStep(statement.Span, actor.Party, slot, [.. options.Select(o => o.Bound!)]));
        }
    }

    /// <summary>Binds <c>set</c>.</summary>
    public void Set(SetStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        foreach (PartyMention actor in Acting(statement.Actors, null, statement.Result))
        {
            Typed value = Drawing(before, actor.Party).Bind(statement.Value);
            int slot = names.Make(actor.Party, statement.Result, SlotKind.Set, value.Kind);
            if (value.Bound is null)
                continue;
            context.NoteHeard(slot, value.Bound);
            steps.Add(new SetStep(statement.Span, actor.Party, slot, value.Bound));
        }
    }

    /// <summary>Binds <c>send</c> and <c>announce</c>.</summary>
    public void Send(SendStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        IReadOnlyList<PartyMention> senders = actors.Classical(statement.Actors, statement.Recipients is null ? "announce" : "send");
        PartyMention[]? recipients = statement.Recipients is { } list ? [.. parties.Classical(list)] : null;
        if (recipients is not null)
            actors.Name(recipients);
        CheckNames(statement);
        foreach (PartyMention sender in senders)
        {
            int[] to = recipients is null ? Everybody(sender.Party) : Others(sender, recipients);
            foreach (MessageItem item in statement.Items)
                Send(statement, sender.Party, item, to, before, steps);
        }
    }

    /// <summary>Binds <c>abort</c>.</summary>
    public void Abort(AbortStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        foreach (PartyMention actor in actors.Classical(statement.Actors, "abort"))
        {
            Typed condition = Values(before, actor.Party).Expect(statement.Condition, ValueKind.Truth);
            if (condition.Bound is not null)
                steps.Add(new AbortStep(statement.Span, actor.Party, condition.Bound));
        }
    }

    private void Send(SendStatement statement, int sender, MessageItem item, int[] to, NameState before, List<Step> steps)
    {
        Typed value = Drawing(before, sender).Bind(item.Value);
        if (NameOf(item) is not { } name)
            return;
        int slot = names.Send(sender, name, value, to);
        if (value.Bound is not null && to.Length > 0)
            steps.Add(new SendStep(statement.Span, sender, slot, value.Bound, to, statement.Recipients is null));
    }

    private static Name? NameOf(MessageItem item) => item.Name ?? item.Value switch
    {
        NameExpression name => new Name(name.Span, name.Text),
        MemberExpression member => member.Member,
        _ => null,
    };

    private void CheckNames(SendStatement statement)
    {
        HashSet<string> used = [];
        foreach (MessageItem item in statement.Items)
        {
            if (NameOf(item) is not { } name)
                context.Findings.Report(item.Span, BindingMessages.MessageNeedsName(context.TextOf(item.Value.Span)));
            else if (!used.Add(name.Text))
                context.Findings.Report(name.Span, BindingMessages.NameTwiceInMessage(name.Text));
            else
                names.CheckFree(name);
        }
    }

    private int[] Everybody(int sender) => [.. Enumerable.Range(0, context.Parties.Names.Count).Where(p => p != sender)];

    private int[] Others(PartyMention sender, PartyMention[] recipients)
    {
        if (recipients.FirstOrDefault(r => r.Party == sender.Party && !r.Collective) is { Span.Length: > 0 } self)
            context.Findings.Report(self.Span, BindingMessages.SentToSelf(context.NameOf(sender.Party)));
        return [.. recipients.Select(r => r.Party).Where(p => p != sender.Party)];
    }

    private IReadOnlyList<PartyMention> Acting(PartyList list, string? verb, Name result)
    {
        IReadOnlyList<PartyMention> acting = actors.Classical(list, verb);
        if (acting.Count == 0 && !context.Findings.IsEmpty)
            context.Findings.Suspect(result.Text);
        return acting;
    }

    private ExpressionBinder Values(NameState before, int actor) => new(context, new ActorView(context, before, actor));

    private ExpressionBinder Drawing(NameState before, int actor) => new(context, new ActorView(context, before, actor)) { MayDraw = true };

    private ValueKind CommonKind(PickStatement statement, Typed[] options)
    {
        ValueKind kind = options.Length == 0 ? ValueKind.Unknown : options[0].Kind;
        for (int i = 1; i < options.Length; i++)
        {
            if (!ValueKinds.Together(kind, options[i].Kind))
                context.Findings.Report(statement.Options[i].Span, BindingMessages.BranchesDiffer(kind, options[i].Kind));
            kind = ValueKinds.Join(kind, options[i].Kind);
        }

        return kind;
    }
}
