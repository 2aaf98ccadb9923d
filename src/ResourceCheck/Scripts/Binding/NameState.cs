using System.Collections.Immutable;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A value that a party holds: the slots that may contain it (several when branches made it differently) and where it came up.</summary>
/// <param name="Slots">Slots of which at most one is filled in a run.</param>
/// <param name="Kind">Sort of value.</param>
/// <param name="Span">The line that made it.</param>
internal sealed record Holding(ImmutableArray<int> Slots, ValueKind Kind, Span Span);

/// <summary>How far a party has used its qudit.</summary>
internal enum QuditPhase
{
    /// <summary>Held, nothing done yet.</summary>
    Fresh,

    /// <summary>Held, and acted on.</summary>
    Touched,

    /// <summary>Measured.</summary>
    Measured,

    /// <summary>Measured in one branch only.</summary>
    Uncertain,
}

/// <summary>A qudit's state and the line that brought it about.</summary>
/// <param name="Phase">How far it is used.</param>
/// <param name="By">The line that used it last.</param>
internal sealed record QuditState(QuditPhase Phase, Span By)
{
    /// <summary>Whether the party certainly still holds it.</summary>
    public bool IsHeld => Phase is QuditPhase.Fresh or QuditPhase.Touched;
}

/// <summary>A name at a party.</summary>
internal sealed record HeldName(int Party, string Name);

/// <summary>A value and who sent it.</summary>
internal sealed record Receipt(int Sender, Holding Value);

/// <summary>Who holds which value under which name, and whose qudit is still there, at one point of a script. Never changed, only replaced.</summary>
internal sealed record NameState
{
    // Keys and values are classes on purpose: collections of structs are compiled anew at every start, which took a fifth of a short run.

    /// <summary>Values that parties made themselves.</summary>
    public ImmutableDictionary<HeldName, Holding> Own { get; init; } = ImmutableDictionary<HeldName, Holding>.Empty;

    /// <summary>Values that parties received, in the order of the senders.</summary>
    public ImmutableDictionary<HeldName, ImmutableList<Receipt>> Received { get; init; } = ImmutableDictionary<HeldName, ImmutableList<Receipt>>.Empty;

    /// <summary>Values that parties sent, under the name they travelled by.</summary>
    public ImmutableDictionary<HeldName, ImmutableList<Holding>> Sent { get; init; } = ImmutableDictionary<HeldName, ImmutableList<Holding>>.Empty;

    /// <summary>For a message that only passes a value on: the slot that the value was made in.</summary>
    public ImmutableDictionary<int, int> Origins { get; init; } = ImmutableDictionary<int, int>.Empty;

    /// <summary>Qudits by party; null for those who have none. Parties beyond the end have none either.</summary>
    public ImmutableArray<QuditState?> Qudits { get; init; } = [];

    /// <summary>Slot in which a value was made, however often it was passed on.</summary>
    public int Origin(int slot) => Origins.GetValueOrDefault(slot, slot);

    /// <summary>A party's qudit; null when it never had one.</summary>
    public QuditState? Qudit(int party) => party < Qudits.Length ? Qudits[party] : null;

    /// <summary>From whom a party received values of some name; null when from nobody.</summary>
    public IEnumerable<int>? Senders(int party, string name) => Received.GetValueOrDefault(new(party, name))?.Select(r => r.Sender);

    /// <summary>The value of some name that a party received from another; null when there is none.</summary>
    public Holding? ReceivedFrom(int party, int sender, string name) => Received.GetValueOrDefault(new(party, name))?.Find(r => r.Sender == sender)?.Value;

    /// <summary>Tells equal values from different ones, whatever they are called.</summary>
    public string Identity(Holding holding) => string.Join(',', holding.Slots.Select(Origin));

    /// <summary>What a party means by a bare name: its own, else what it received or sent; several when these differ.</summary>
    public IReadOnlyList<Holding> Meanings(int party, string name)
    {
        if (Own.TryGetValue(new(party, name), out Holding? own))
            return [own];
        if (Received.TryGetValue(new(party, name), out ImmutableList<Receipt>? received))
            return Different(received.Select(r => r.Value));
        return Sent.TryGetValue(new(party, name), out ImmutableList<Holding>? sent) ? Different(sent) : [];
    }

    /// <summary>What a party holds of another party's value of some name.</summary>
    public IReadOnlyList<Holding> MeaningsFrom(int party, int sender, string name)
    {
        if (party == sender)
            return Meanings(party, name);
        return ReceivedFrom(party, sender, name) is { } holding ? [holding] : [];
    }

    /// <summary>A party's copy of a value that goes by some name, or null when it does not know it.</summary>
    public Holding? CopyAt(int party, string name, string identity)
    {
        IEnumerable<Holding> held = Own.TryGetValue(new(party, name), out Holding? own) ? [own] : [];
        if (Received.TryGetValue(new(party, name), out ImmutableList<Receipt>? received))
            held = held.Concat(received.Select(r => r.Value));
        if (Sent.TryGetValue(new(party, name), out ImmutableList<Holding>? sent))
            held = held.Concat(sent);
        return held.FirstOrDefault(h => Identity(h) == identity);
    }

    /// <summary>Parties that made a value of a name themselves, or sent it under that name.</summary>
    public IReadOnlyList<(int Party, Holding Value)> Makers(string name)
    {
        (int Party, Holding Value)[] own = [.. Own.Where(o => o.Key.Name == name).Select(o => (o.Key.Party, o.Value))];
        if (own.Length == 0)
            own = [.. Sent.Where(s => s.Key.Name == name).Select(s => (s.Key.Party, s.Value[0]))];
        return [.. own.OrderBy(o => o.Party)];
    }

    /// <summary>The state with a value a party made.</summary>
    public NameState WithOwn(int party, string name, Holding holding) => this with { Own = Own.SetItem(new(party, name), holding) };

    /// <summary>The state with a value a party received.</summary>
    public NameState WithReceived(int party, int sender, string name, Holding holding)
    {
        ImmutableList<Receipt> others = Received.GetValueOrDefault(new(party, name), []);
        return this with { Received = Received.SetItem(new(party, name), With(others, new Receipt(sender, holding))) };
    }

    /// <summary>Receipts with one more, in the order of the senders, or with another in place of the same sender's.</summary>
    public static ImmutableList<Receipt> With(ImmutableList<Receipt> receipts, Receipt added)
    {
        int at = receipts.FindIndex(r => r.Sender >= added.Sender);
        if (at < 0)
            return receipts.Add(added);
        return receipts[at].Sender == added.Sender ? receipts.SetItem(at, added) : receipts.Insert(at, added);
    }

    /// <summary>The state with a value a party sent.</summary>
    public NameState WithSent(int party, string name, Holding holding) =>
        this with { Sent = Sent.SetItem(new(party, name), Sent.GetValueOrDefault(new HeldName(party, name), []).Add(holding)) };

    /// <summary>The state with a qudit used.</summary>
    public NameState WithQudit(int party, QuditPhase phase, Span by) => this with { Qudits = Qudits.SetItem(party, new QuditState(phase, by)) };

    /// <summary>The state with the names of an earlier one, as after a turn of a loop.</summary>
    public NameState WithNamesOf(NameState earlier) => this with { Own = earlier.Own, Received = earlier.Received, Sent = earlier.Sent };

    private Holding[] Different(IEnumerable<Holding> holdings) => [.. holdings.DistinctBy(Identity)];
}
