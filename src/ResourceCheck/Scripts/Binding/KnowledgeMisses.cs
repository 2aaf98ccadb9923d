namespace ResourceCheck.Scripts.Binding;

/// <summary>A value used by parties that do not know it.</summary>
/// <param name="Span">Where the name stands.</param>
/// <param name="Label">The name as users see it.</param>
/// <param name="Name">The name without its party.</param>
/// <param name="Makers">Parties that made or sent it.</param>
/// <param name="Knowers">All who know it.</param>
internal sealed record Miss(Span Span, string Label, string Name, IReadOnlyList<(int Party, Holding Value)> Makers, IReadOnlyList<int> Knowers);

/// <summary>Gathers over the actors of a statement who uses what without knowing it, so that one finding names them all.</summary>
internal sealed class KnowledgeMisses
{
    private readonly List<(Miss Miss, SortedSet<int> Actors)> _pending = [];
    private readonly HashSet<(int Actor, string Identity)> _told = [];

    /// <summary>Notes that an actor does not know a value; each actor and value count once in a script.</summary>
    public void Add(int actor, string identity, Miss miss)
    {
        if (!_told.Add((actor, identity)))
            return;
        int at = _pending.FindIndex(p => p.Miss.Span == miss.Span);
        if (at < 0)
            _pending.Add((miss, [actor]));
        else
            _pending[at].Actors.Add(actor);
    }

    /// <summary>All that was noted since the last call, with the actors concerned.</summary>
    public IReadOnlyList<(Miss Miss, IReadOnlyCollection<int> Actors)> Take()
    {
        (Miss, IReadOnlyCollection<int>)[] taken = [.. _pending.Select(p => (p.Miss, (IReadOnlyCollection<int>)p.Actors))];
        _pending.Clear();
        return taken;
    }
}
