using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Gives names to values: one name, one meaning, and one slot for a name made in either branch of a <c>when</c>.</summary>
/// <param name="context">The binding.</param>
internal sealed class NameMaker(BindContext context)
{
    private readonly HashSet<int> _shared = [];
    private readonly Dictionary<int, int[]> _recipients = [];
    private List<NameState> _siblings = [];

    /// <summary>Slots that two branches fill.</summary>
    public IReadOnlySet<int> Shared => _shared;

    /// <summary>Enters the second branch of a <c>when</c>, whose first branch ended in a state.</summary>
    public void EnterSibling(NameState first) => _siblings.Add(first);

    /// <summary>Leaves the second branch.</summary>
    public void LeaveSibling() => _siblings.RemoveAt(_siblings.Count - 1);

    /// <summary>Does something as a turn of a loop, whose names are not those of other branches.</summary>
    public void InTurn(Action turn)
    {
        List<NameState> outer = _siblings;
        _siblings = [];
        turn();
        _siblings = outer;
    }

    /// <summary>Gives a party a value of its own; the slot that holds it.</summary>
    public int Make(int party, Name name, SlotKind kind, ValueKind value)
    {
        CheckFree(name);
        if (context.Now.Own.TryGetValue(new(party, name.Text), out Holding? present))
            context.Findings.Report(name.Span, BindingMessages.MadeTwice(context.NameOf(party), name.Text, context.LineOf(present.Span)));
        else if (context.Now.Sent.TryGetValue(new(party, name.Text), out var sent))
            context.Findings.Report(name.Span, BindingMessages.MadeTwice(context.NameOf(party), name.Text, context.LineOf(sent[0].Span)));
        int slot = SiblingSlot(party, name, value) ?? context.AddSlot(name.Text, party, kind, name.Span);
        context.Now = context.Now.WithOwn(party, name.Text, new Holding([slot], value, name.Span));
        return slot;
    }

    /// <summary>Sends a value; the slot that holds the message.</summary>
    public int Send(int sender, Name name, Typed value, IReadOnlyList<int> recipients)
    {
        int slot = SiblingMessage(sender, name, value.Kind, recipients) ?? context.AddSlot(name.Text, sender, SlotKind.Message, name.Span);
        _recipients[slot] = [.. recipients];
        context.Now = context.Now with
        {
            Origins = value.Bound is BoundSlot passed
                ? context.Now.Origins.SetItem(slot, context.Now.Origin(passed.Slot))
                : context.Now.Origins.Remove(slot),
        };
        Holding holding = new([slot], value.Kind, name.Span);
        // A lie is the wrong value under the right name.
        if (value.Bound is not null && context.Cheat is not { Speaks: true })
            CheckUnsent(sender, name, holding);
        context.Now = context.Now.WithSent(sender, name.Text, holding);
        foreach (int recipient in recipients)
            Receive(recipient, sender, name, holding);
        return slot;
    }

    /// <summary>Reports a name that everybody knows as something else.</summary>
    public void CheckFree(Name name)
    {
        if (context.IsNameTaken(name.Text))
            context.Findings.Report(name.Span, BindingMessages.NameTaken(name.Text, context.RoleOf(name.Text)));
    }

    private void Receive(int recipient, int sender, Name name, Holding holding)
    {
        if (context.Now.ReceivedFrom(recipient, sender, name.Text) is not { } known)
            context.Now = context.Now.WithReceived(recipient, sender, name.Text, holding);
        else if (context.Now.Identity(known) != context.Now.Identity(holding))
            context.Findings.Report(name.Span, BindingMessages.ReceivedTwice(context.NameOf(recipient), context.NameOf(sender), name.Text, context.LineOf(known.Span)));
    }

    // Ada's own v and another value that she sends as v would both be Ada.v.
    private void CheckUnsent(int sender, Name name, Holding holding)
    {
        if (context.Now.Own.TryGetValue(new(sender, name.Text), out Holding? own) && context.Now.Identity(own) != context.Now.Identity(holding))
            context.Findings.Report(name.Span, BindingMessages.MadeTwice(context.NameOf(sender), name.Text, context.LineOf(own.Span)));
    }

    private int? SiblingSlot(int party, Name name, ValueKind kind)
    {
        foreach (NameState sibling in _siblings)
        {
            if (!sibling.Own.TryGetValue(new(party, name.Text), out Holding? other) || context.Now.Own.ContainsKey(new(party, name.Text)))
                continue;
            if (!ValueKinds.Together(other.Kind, kind))
                context.Findings.Report(name.Span, BindingMessages.BranchKinds(name.Text, other.Kind, kind, context.LineOf(other.Span)));
            _shared.Add(other.Slots[0]);
            return other.Slots[0];
        }

        return null;
    }

    private int? SiblingMessage(int sender, Name name, ValueKind kind, IReadOnlyList<int> recipients)
    {
        foreach (NameState sibling in _siblings)
        {
            if (!sibling.Sent.TryGetValue(new(sender, name.Text), out var sent))
                continue;
            Holding? alike = sent.Except(context.Now.Sent.GetValueOrDefault(new HeldName(sender, name.Text), []))
                .FirstOrDefault(h => ValueKinds.Together(h.Kind, kind) && _recipients[h.Slots[0]].SequenceEqual(recipients));
            if (alike is null)
                continue;
            _shared.Add(alike.Slots[0]);
            return alike.Slots[0];
        }

        return null;
    }
}
