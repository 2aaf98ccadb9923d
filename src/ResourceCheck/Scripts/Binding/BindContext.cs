using System.Collections.Immutable;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>What the passes of one binding share: declarations, findings, slots and the state at the current line.</summary>
/// <param name="tree">The script.</param>
internal sealed class BindContext(ScriptTree tree)
{
    private readonly List<SlotInfo> _slots = [];
    private readonly HashSet<int> _heard = [];
    private readonly HashSet<int> _perCopy = [];
    private readonly Dictionary<(Span Span, int Party, SlotKind Kind, string Turn), int> _made = [];

    /// <summary>The script.</summary>
    public ScriptTree Tree { get; } = tree;

    /// <summary>Findings so far.</summary>
    public BindingFindings Findings { get; } = new(tree.Source);

    /// <summary>Where names are made.</summary>
    public MakerIndex Makers { get; set; } = new(tree, null);

    /// <summary>Whether the rounds run on many copies, so that their values are lists.</summary>
    public bool HasCopies { get; set; }

    /// <summary>Whether the current line works on whole lists: a discussion's line or a referee's.</summary>
    public bool OnLists { get; set; }

    /// <summary>The cheating strategy that is being bound; null in the honest case.</summary>
    public Cheat? Cheat { get; set; }

    /// <summary>Rounds and discussions, as written and with counters replaced.</summary>
    public List<(string Written, string Title)> Blocks { get; } = [];

    /// <summary>Values of parameters.</summary>
    public Dictionary<string, Rational> Parameters { get; } = [];

    /// <summary>The parties.</summary>
    public PartyTable Parties { get; } = new();

    /// <summary>Private inputs.</summary>
    public List<InputValues> Inputs { get; } = [];

    /// <summary>Values of the counters of the enclosing loops.</summary>
    public ImmutableDictionary<string, int> Counters { get; set; } = ImmutableDictionary<string, int>.Empty;

    /// <summary>Loops around the current line.</summary>
    public ImmutableStack<ForStatement> Loops { get; set; } = [];

    /// <summary>Who holds what at the current line.</summary>
    public NameState Now { get; set; } = new();

    /// <summary>Parties named so far in the current round; null where <c>others</c> has no meaning.</summary>
    public HashSet<int>? Named { get; set; }

    /// <summary>Uses of values by parties that do not know them, in the current statement.</summary>
    public KnowledgeMisses Misses { get; private set; } = new();

    /// <summary>Values that a keep line used although not everybody knows them; each is told once.</summary>
    public HashSet<string> ToldNotPublic { get; } = [];

    /// <summary>Slots so far.</summary>
    public IReadOnlyList<SlotInfo> Slots => _slots;

    /// <summary>Levels of each qudit.</summary>
    public int Levels => Parties.Holders.Count;

    /// <summary>Name of a party.</summary>
    public string NameOf(int party) => Parties.Names[party];

    /// <summary>Line of a place.</summary>
    public int LineOf(Span span) => Tree.Source.LineOf(span.Start);

    /// <summary>The script's text at a place.</summary>
    public string TextOf(Span span)
    {
        string text = Tree.Source.Text;
        int start = Math.Clamp(span.Start, 0, text.Length);
        return text[start..Math.Clamp(span.End, start, text.Length)];
    }

    /// <summary>Adds a slot. A line that stays as it is under a cheating strategy keeps the slot of the honest case.</summary>
    public int AddSlot(string name, int party, SlotKind kind, Span span)
    {
        string turn = string.Join(';', Counters.OrderBy(c => c.Key, StringComparer.Ordinal).Select(c => $"{c.Key}={c.Value}"));
        if (Cheat is not null && _made.TryGetValue((span, party, kind, turn), out int made))
            return made;
        int slot = _slots.Count;
        _slots.Add(new SlotInfo(name, party, kind, span));
        _made[(span, party, kind, turn)] = slot;
        if (kind == SlotKind.Message)
            _heard.Add(slot);
        if (HasCopies && !OnLists && kind != SlotKind.Input)
            _perCopy.Add(slot);
        return slot;
    }

    /// <summary>Whether a slot holds one value in each copy rather than one per run.</summary>
    public bool IsPerCopy(int slot) => _perCopy.Contains(slot);

    /// <summary>Forgets what was told and where the last pass stood, so that the script can be gone through again.</summary>
    public void Restart(NameState start)
    {
        Misses = new KnowledgeMisses();
        ToldNotPublic.Clear();
        (Now, Counters, Loops, Named, OnLists) = (start, ImmutableDictionary<string, int>.Empty, [], null, false);
    }

    /// <summary>Notes that a slot's value depends on messages when its expression does.</summary>
    public void NoteHeard(int slot, BoundExpression expression)
    {
        if (DependsOnMessages(expression))
            _heard.Add(slot);
    }

    /// <summary>Whether a value depends on anything that was received.</summary>
    public bool DependsOnMessages(BoundExpression expression) => BoundWalk.Slots(expression).Any(_heard.Contains);

    /// <summary>Findings about a value given to a party of this name, unless it may have it.</summary>
    public bool IsNameTaken(string name) =>
        Parameters.ContainsKey(name) || Counters.ContainsKey(name) || Parties.IndexOf(name) >= 0 || Parties.Families.ContainsKey(name);

    /// <summary>What a name that everybody knows stands for, in words.</summary>
    public string RoleOf(string name) =>
        Parameters.ContainsKey(name) ? "a parameter" : Counters.ContainsKey(name) ? "a counter"
        : Parties.Families.ContainsKey(name) ? "a family of parties" : "a party";
}
