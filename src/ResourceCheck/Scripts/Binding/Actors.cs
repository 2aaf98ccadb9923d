using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Finds the actors of a statement and whether they may act so.</summary>
/// <param name="context">The binding.</param>
/// <param name="parties">Reads lists of parties.</param>
/// <param name="whens">The conditional blocks around.</param>
internal sealed class Actors(BindContext context, PartyResolver parties, WhenBinder whens)
{
    /// <summary>Actors of a statement about qudits, each holding one.</summary>
    public IReadOnlyList<PartyMention> WithQudits(PartyList list, string verb) =>
        [.. Named(parties.Quantum(list)).Where(m => IsInsider(m, verb) && HoldsQudit(m, verb))];

    /// <summary>Actors that idle; they need no qudit.</summary>
    public IReadOnlyList<PartyMention> Idle(PartyList list) => [.. Named(parties.Quantum(list)).Where(m => IsInsider(m, "wait"))];

    /// <summary>Actors of a classical statement.</summary>
    /// <param name="list">The list as written.</param>
    /// <param name="verb">What they do, for the finding about outsiders that may not; null when outsiders may.</param>
    public IReadOnlyList<PartyMention> Classical(PartyList list, string? verb) =>
        [.. Named(parties.Classical(list)).Where(m => verb is null || IsInsider(m, verb))];

    /// <summary>Actors that must be outsiders.</summary>
    public IReadOnlyList<PartyMention> Outsiders(PartyList list)
    {
        IReadOnlyList<PartyMention> mentions = Named(parties.Classical(list));
        foreach (PartyMention insider in mentions.Where(m => !context.Parties.IsOutsider(m.Party)))
            context.Findings.Report(insider.Span, BindingMessages.OnlyOutsidersIntercept(context.NameOf(insider.Party)));
        return [.. mentions.Where(m => context.Parties.IsOutsider(m.Party))];
    }

    /// <summary>Whether a party holds its qudit; reports when it does not.</summary>
    public bool HoldsQudit(PartyMention mention, string verb)
    {
        if (context.Now.Qudit(mention.Party) is not { } qudit)
        {
            if (context.Parties.HasResource)
                context.Findings.Report(mention.Span, BindingMessages.HoldsNoQudit(context.NameOf(mention.Party), verb));
            return false;
        }

        if (qudit.IsHeld)
            return true;
        int line = context.LineOf(qudit.By);
        context.Findings.Report(mention.Span, qudit.Phase == QuditPhase.Measured
            ? BindingMessages.AlreadyMeasured(context.NameOf(mention.Party), verb, line)
            : BindingMessages.MeasuredInOneBranch(context.NameOf(mention.Party), verb, line));
        return false;
    }

    /// <summary>Notes an interception for the conditional blocks around.</summary>
    public void NoteIntercept(Span span) => whens.NoteIntercept(span);

    /// <summary>Notes that parties are named in this round.</summary>
    public void Name(IEnumerable<PartyMention> mentions) =>
        context.Named?.UnionWith(mentions.Where(m => !m.Collective).Select(m => m.Party));

    private IReadOnlyList<PartyMention> Named(IReadOnlyList<PartyMention> mentions)
    {
        Name(mentions);
        IReadOnlyList<PartyMention> acting = context.Cheat is { } cheat ? Under(cheat, mentions) : mentions;
        whens.NoteActors(acting.Select(m => m.Party));
        return acting;
    }

    private IReadOnlyList<PartyMention> Under(Cheat cheat, IReadOnlyList<PartyMention> mentions)
    {
        if (!cheat.Speaks)
            return cheat.Replaces ? [.. mentions.Where(m => !cheat.By.Contains(m.Party))] : mentions;
        foreach (PartyMention honest in mentions.Where(m => cheat.By.Count > 0 && !cheat.By.Contains(m.Party)))
            context.Findings.Report(honest.Span, BindingMessages.HonestInCheat(context.NameOf(honest.Party), cheat.Names));
        return [.. mentions.Where(m => cheat.By.Contains(m.Party))];
    }

    private bool IsInsider(PartyMention mention, string verb)
    {
        if (!context.Parties.IsOutsider(mention.Party))
            return true;
        context.Findings.Report(mention.Span, BindingMessages.OutsiderMayNot(context.NameOf(mention.Party), verb));
        return false;
    }
}
