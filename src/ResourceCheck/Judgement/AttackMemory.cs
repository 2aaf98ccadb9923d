using System.Collections.Concurrent;
using System.Globalization;
using ResourceCheck.Engines.Lists;

namespace ResourceCheck.Judgement;

/// <summary>Searches that were made already: assignments of levels and worse conditions often come to the same law of a copy.</summary>
internal sealed class AttackMemory
{
    private readonly ConcurrentDictionary<string, AttackOutcome> _known = [];

    /// <summary>What a search finds, from memory where the law of a copy, the strategy and all values are the same.</summary>
    public AttackOutcome Of(ListTask task, Func<AttackOutcome> find) => _known.GetOrAdd(Key(task), _ => find());

    private static string Key(ListTask task)
    {
        IEnumerable<string> parameters = task.Protocol.Parameters.Select(p => $"{p.Name}={p.Value}");
        IEnumerable<string> law = task.Copies.Select(c => string.Create(CultureInfo.InvariantCulture, $"{string.Join(',', c.Slots)}:{c.Probability:E12}"));
        return $"{task.Case?.Name}|{string.Join(',', task.Inputs)}|{string.Join(',', task.Choices)}|{string.Join(';', parameters)}|{string.Join(';', law)}";
    }
}
