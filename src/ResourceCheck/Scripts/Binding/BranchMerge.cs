using System.Collections.Immutable;

namespace ResourceCheck.Scripts.Binding;

/// <summary>The state behind a <c>when</c>: a name made in either branch is one name; a qudit measured in one branch only must not be used.</summary>
internal static class BranchMerge
{
    /// <summary>Joins the states at the ends of two branches.</summary>
    /// <param name="first">End of the first branch.</param>
    /// <param name="second">End of the second branch.</param>
    /// <param name="firstSlot">First slot made inside either branch.</param>
    /// <param name="shared">Slots that both branches fill.</param>
    public static NameState Merge(NameState first, NameState second, int firstSlot, IReadOnlySet<int> shared) => new()
    {
        Own = Union(first.Own, second.Own, Join),
        Received = Union(first.Received, second.Received, (a, b) => Union(a, b)),
        Sent = Union(first.Sent, second.Sent, (a, b) => [.. a.Union(b)]),
        Origins = CommonOrigins(first, second, firstSlot, shared),
        Qudits = [.. first.Qudits.Zip(second.Qudits, (a, b) => a is null || b is null ? null : Join(a, b))],
    };

    /// <summary>The state when it is known which branch is taken; names of the other exist and are none.</summary>
    public static NameState Take(NameState taken, NameState other, int firstSlot, IReadOnlySet<int> shared) =>
        Merge(taken, other, firstSlot, shared) with { Qudits = taken.Qudits };

    private static ImmutableDictionary<TKey, TValue> Union<TKey, TValue>(
        ImmutableDictionary<TKey, TValue> first, ImmutableDictionary<TKey, TValue> second, Func<TValue, TValue, TValue> join)
        where TKey : notnull
    {
        ImmutableDictionary<TKey, TValue>.Builder union = first.ToBuilder();
        foreach ((TKey key, TValue value) in second)
            union[key] = union.TryGetValue(key, out TValue? present) ? join(present, value) : value;
        return union.ToImmutable();
    }

    private static ImmutableList<Receipt> Union(ImmutableList<Receipt> first, ImmutableList<Receipt> second)
    {
        foreach (Receipt receipt in second)
            first = NameState.With(first, first.Find(r => r.Sender == receipt.Sender) is { } present ? receipt with { Value = Join(present.Value, receipt.Value) } : receipt);
        return first;
    }

    private static Holding Join(Holding first, Holding second) => ReferenceEquals(first, second)
        ? first
        : new Holding([.. first.Slots.Union(second.Slots)], ValueKinds.Join(first.Kind, second.Kind), first.Span);

    // Inside a branch a message equals what it passes on; behind the block it may be none while the value is not,
    // unless both were made in that branch.
    private static ImmutableDictionary<int, int> CommonOrigins(NameState first, NameState second, int firstSlot, IReadOnlySet<int> shared)
    {
        bool Lasts(int message, int origin) =>
            message < firstSlot
            || (origin >= firstSlot && ((!shared.Contains(message) && !shared.Contains(origin)) || first.Origin(message) == second.Origin(message)));
        return first.Origins.Concat(second.Origins).Where(o => Lasts(o.Key, o.Value)).DistinctBy(o => o.Key).ToImmutableDictionary();
    }

    private static QuditState Join(QuditState first, QuditState second)
    {
        if (first.Phase == second.Phase)
            return first;
        if (first.IsHeld && second.IsHeld)
            return first.Phase == QuditPhase.Touched ? first : second;
        return new QuditState(QuditPhase.Uncertain, first.IsHeld ? second.By : first.By);
    }
}
