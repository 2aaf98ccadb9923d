using ResourceCheck.Conditions.Checks;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Builds distances and delays between parties: by way of the common source unless a distance is given.</summary>
internal sealed class MessageBuilder(Protocol protocol, PartyNames names)
{
    /// <summary>The model; outsiders hear everything at once and are nowhere.</summary>
    public MessageModel Build(GroupSetting? messages, IReadOnlyList<PartyWorld> parties)
    {
        int count = parties.Count;
        double[,] distance = new double[count, count];
        foreach ((int a, int b) in Pairs(count))
            distance[a, b] = parties[a].Flight.Length.Metres + parties[b].Flight.Length.Metres;
        foreach (Entry entry in (messages?.Find("distances") as GroupSetting)?.Entries ?? [])
            SetDistance(entry, distance);

        double[,] delay = new double[count, count];
        double secondsPerMetre = messages?.NumberOf("speed") is { } speed ? 1 / speed.Value : 0;
        foreach ((int a, int b) in Pairs(count))
            delay[a, b] = (distance[a, b] * secondsPerMetre) + (messages?.Number("processing", 0) ?? 0);
        return new MessageModel(delay, distance);
    }

    private IEnumerable<(int A, int B)> Pairs(int count) =>
        from a in Enumerable.Range(0, count)
        from b in Enumerable.Range(0, count)
        where a != b && !protocol.Outsiders.Contains(a) && !protocol.Outsiders.Contains(b)
        select (a, b);

    private void SetDistance(Entry entry, double[,] distance)
    {
        int?[] pair = [.. MapKeys.Parties(entry.Name)!.Select(n => names.IndexOf(n, entry, "messages.distances"))];
        if (pair is [{ } a, { } b])
            distance[a, b] = distance[b, a] = ((NumberSetting)entry.Value).Value;
    }
}
