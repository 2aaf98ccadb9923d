using System.Collections.Immutable;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>What the passes of one binding share: declarations, findings, slots and the state at the current line.</summary>
/// <param name="tree">The script.</param>
internal sealed class BindContext(ScriptTree tree)
{
    private readonly List<SlotInfo> _slots = [];
    private readonly List<ValueKind> _kinds = [];
    private readonly HashSet<int> _heard = [];

    /// <summary>The script.</summary>
    public ScriptTree Tree { get; } = tree;

    /// <summary>Findings so far.</summary>
    public BindingFindings Findings { get; } = new(tree.Source);

    /// <summary>Where names are made.</summary>
    public MakerIndex Makers { get; } = new(tree);

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
    public KnowledgeMisses Misses { get; } = new();

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

    /// <summary>Adds a slot.</summary>
    public int AddSlot(string name, int party, SlotKind kind, ValueKind value, Span span)
    {
        _slots.Add(new SlotInfo(name, party, kind, span));
        _kinds.Add(value);
        if (kind == SlotKind.Message)
            _heard.Add(_slots.Count - 1);
        return _slots.Count - 1;
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
