using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>How names are read from one point of view: a party's, everybody's, or the referee's.</summary>
/// <param name="context">The binding.</param>
/// <param name="state">Who holds what where the names stand.</param>
internal abstract class NameView(BindContext context, NameState state)
{
    /// <summary>The binding.</summary>
    protected BindContext Context { get; } = context;

    /// <summary>Who holds what.</summary>
    public NameState State { get; } = state;

    /// <summary>Whether numbers left to a cheat are known here.</summary>
    public virtual bool SeesChoices => false;

    /// <summary>The value of a bare name.</summary>
    public abstract Typed Bare(string name, Span span);

    /// <summary>The value of a party's name, such as <c>Ada.v</c>.</summary>
    public abstract Typed Member(int party, string name, Span span);

    /// <summary>A value that another party means by a name, as far as it may be used here.</summary>
    public abstract Typed Seen(int subject, string name, Holding holding, string label, Span span);

    /// <summary>The same view with bare names read as another party reads them.</summary>
    public NameView As(int subject) => new SubjectView(Context, this, subject);

    /// <summary>The content of a holding: of its slots at most one is filled.</summary>
    public static Typed Read(Holding holding, Span span)
    {
        BoundExpression value = new BoundSlot(span, holding.Slots[^1]);
        foreach (int slot in holding.Slots.Reverse().Skip(1))
        {
            BoundSlot first = new(span, slot);
            value = new BoundIf(span, new BoundBinary(span, BinaryOperator.Unequal, first, new BoundLiteral(span, Value.None)), first, value);
        }

        return new Typed(value, holding.Kind);
    }

    /// <summary>Reports that a bare name has several meanings.</summary>
    protected Typed Ambiguous(string name, Span span, string reader, IEnumerable<int> parties)
    {
        Context.Findings.Report(span, BindingMessages.SeveralMeanings(reader, name, [.. parties.Order().Select(Context.NameOf)]));
        return Typed.Broken;
    }

    /// <summary>Reports that nobody, or not this party, has a value of that name.</summary>
    protected Typed Absent(int? party, string name, Span span)
    {
        UnknownNames.Report(Context, State, party, name, span);
        return Typed.Broken;
    }
}

/// <summary>A party's own view. Parties that cheat together know what any of them knows.</summary>
/// <param name="context">The binding.</param>
/// <param name="state">Who holds what.</param>
/// <param name="actor">The party.</param>
internal sealed class ActorView(BindContext context, NameState state, int actor) : NameView(context, state)
{
    /// <inheritdoc/>
    public override bool SeesChoices => Context.Cheat is { Speaks: true };

    private IEnumerable<int> Fellows => Context.Cheat is { Speaks: true } cheat ? cheat.By.Where(p => p != actor) : [];

    /// <inheritdoc/>
    public override Typed Bare(string name, Span span)
    {
        IReadOnlyList<Holding> meanings = Together(p => State.Meanings(p, name));
        if (meanings.Count == 1)
            return Read(meanings[0], span);
        if (meanings.Count > 1)
            return Ambiguous(name, span, Context.NameOf(actor), State.Senders(actor, name) ?? [actor, .. Fellows]);
        IReadOnlyList<(int Party, Holding Value)> makers = State.Makers(name);
        return makers.Count == 0 ? Absent(null, name, span) : Missed(name, name, makers, span);
    }

    /// <inheritdoc/>
    public override Typed Member(int party, string name, Span span)
    {
        bool fellow = Fellows.Contains(party);
        IReadOnlyList<Holding> meanings = fellow ? State.Meanings(party, name) : Together(p => State.MeaningsFrom(p, party, name));
        if (meanings.Count == 1)
            return Read(meanings[0], span);
        if (meanings.Count > 1)
            return Ambiguous(name, span, Context.NameOf(actor), State.Senders(actor, name) ?? [actor, .. Fellows]);
        IReadOnlyList<Holding> held = State.Meanings(party, name);
        return held.Count == 0 ? Absent(party, name, span) : Missed($"{Context.NameOf(party)}.{name}", name, [(party, held[0])], span);
    }

    /// <inheritdoc/>
    public override Typed Seen(int subject, string name, Holding holding, string label, Span span)
    {
        string identity = State.Identity(holding);
        Holding? copy = Fellows.Prepend(actor).Select(p => State.CopyAt(p, name, identity)).FirstOrDefault(c => c is not null);
        return copy is not null ? Read(copy, span) : Missed(label, name, [(subject, holding)], span);
    }

    // What one means oneself comes before what the others know.
    private IReadOnlyList<Holding> Together(Func<int, IReadOnlyList<Holding>> meanings)
    {
        IReadOnlyList<Holding> own = meanings(actor);
        return own.Count > 0 ? own : [.. Fellows.SelectMany(meanings).DistinctBy(State.Identity)];
    }

    private Typed Missed(string label, string name, IReadOnlyList<(int Party, Holding Value)> makers, Span span)
    {
        string identity = State.Identity(makers[0].Value);
        IEnumerable<int> knowers = makers.SelectMany(m => Knowers(name, m.Value));
        Context.Misses.Add(actor, identity, new Miss(span, label, name, makers, [.. knowers.Distinct().Order()]));
        return Typed.Broken;
    }

    private IEnumerable<int> Knowers(string name, Holding value) =>
        Enumerable.Range(0, Context.Parties.Names.Count).Where(p => State.CopyAt(p, name, State.Identity(value)) is not null);
}

/// <summary>The referee's view: everything is known; a party's name is what that party holds.</summary>
/// <param name="context">The binding.</param>
/// <param name="state">Who holds what at the end.</param>
internal sealed class RefereeView(BindContext context, NameState state) : NameView(context, state)
{
    /// <inheritdoc/>
    public override bool SeesChoices => true;

    /// <inheritdoc/>
    public override Typed Bare(string name, Span span)
    {
        IReadOnlyList<(int Party, Holding Value)> makers = State.Makers(name);
        return makers.Count switch
        {
            0 => Absent(null, name, span),
            1 => Read(makers[0].Value, span),
            _ => Ambiguous(name, span, "the referee", makers.Select(m => m.Party)),
        };
    }

    /// <inheritdoc/>
    public override Typed Member(int party, string name, Span span)
    {
        IReadOnlyList<Holding> meanings = State.Meanings(party, name);
        return meanings.Count switch
        {
            0 => Absent(party, name, span),
            1 => Read(meanings[0], span),
            _ => Ambiguous(name, span, Context.NameOf(party), State.Senders(party, name) ?? [party]),
        };
    }

    /// <inheritdoc/>
    public override Typed Seen(int subject, string name, Holding holding, string label, Span span) => Read(holding, span);
}

/// <summary>What everybody knows who is no outsider: the view of <c>keep</c>.</summary>
/// <param name="context">The binding.</param>
/// <param name="state">Who holds what.</param>
internal sealed class PublicView(BindContext context, NameState state) : NameView(context, state)
{
    /// <inheritdoc/>
    public override Typed Bare(string name, Span span)
    {
        Holding[] meanings = [.. Context.Parties.Insiders.SelectMany(p => State.Meanings(p, name)).DistinctBy(State.Identity)];
        if (meanings.Length == 0)
            return Absent(null, name, span);
        IReadOnlyList<(int Party, Holding Value)> makers = State.Makers(name);
        return meanings.Length > 1 && makers.Count > 1
            ? Ambiguous(name, span, "everybody", makers.Select(m => m.Party))
            : Shared(name, name, makers.Count == 1 ? makers[0].Value : meanings[0], span);
    }

    /// <inheritdoc/>
    public override Typed Member(int party, string name, Span span)
    {
        IReadOnlyList<Holding> meanings = State.Meanings(party, name);
        return meanings.Count switch
        {
            0 => Absent(party, name, span),
            1 => Shared(name, $"{Context.NameOf(party)}.{name}", meanings[0], span),
            _ => Ambiguous(name, span, Context.NameOf(party), State.Senders(party, name) ?? [party]),
        };
    }

    /// <inheritdoc/>
    public override Typed Seen(int subject, string name, Holding holding, string label, Span span) => Shared(name, label, holding, span);

    private Typed Shared(string name, string label, Holding holding, Span span)
    {
        string identity = State.Identity(holding);
        string[] without = [.. Context.Parties.Insiders.Where(p => State.CopyAt(p, name, identity) is null).Select(Context.NameOf)];
        if (without.Length == 0)
            return Read(holding with { Slots = [.. holding.Slots.Select(State.Origin).Distinct()] }, span);
        if (Context.ToldNotPublic.Add(identity))
            Context.Findings.Report(span, BindingMessages.NotPublic(label, without));
        return Typed.Broken;
    }
}

/// <summary>Another view with bare names read as one party reads them: inside <c>count(COND over LIST)</c>.</summary>
/// <param name="context">The binding.</param>
/// <param name="outer">The view around.</param>
/// <param name="subject">The party whose names are meant.</param>
internal sealed class SubjectView(BindContext context, NameView outer, int subject) : NameView(context, outer.State)
{
    /// <inheritdoc/>
    public override bool SeesChoices => outer.SeesChoices;

    /// <inheritdoc/>
    public override Typed Bare(string name, Span span) => Through(State.Meanings(subject, name), name, null, span);

    /// <inheritdoc/>
    public override Typed Member(int party, string name, Span span) =>
        outer is RefereeView ? outer.Member(party, name, span) : Through(State.MeaningsFrom(subject, party, name), name, party, span);

    /// <inheritdoc/>
    public override Typed Seen(int other, string name, Holding holding, string label, Span span) => outer.Seen(other, name, holding, label, span);

    private Typed Through(IReadOnlyList<Holding> meanings, string name, int? sender, Span span) => meanings.Count switch
    {
        0 => Absent(sender ?? subject, name, span),
        1 => outer.Seen(subject, name, meanings[0], $"{Context.NameOf(sender ?? subject)}.{name}", span),
        _ => Ambiguous(name, span, Context.NameOf(subject), State.Senders(subject, name) ?? [subject]),
    };
}

/// <summary>Where only parameters and counters are known: declarations, requirements, ranges.</summary>
/// <param name="context">The binding.</param>
internal sealed class ConstantView(BindContext context) : NameView(context, new NameState())
{
    /// <inheritdoc/>
    public override Typed Bare(string name, Span span)
    {
        IEnumerable<string> known = Context.Parameters.Keys.Concat(Context.Counters.Keys);
        Context.Findings.ReportName(name, span, BindingMessages.NotConstant(name, NearWords.Find(name, known), [.. known.Order()]));
        return Typed.Broken;
    }

    /// <inheritdoc/>
    public override Typed Member(int party, string name, Span span) => Bare(Context.TextOf(span), span);

    /// <inheritdoc/>
    public override Typed Seen(int subject, string name, Holding holding, string label, Span span) => Bare(label, span);
}
