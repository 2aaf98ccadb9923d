using System.Numerics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Lists;

/// <summary>What is known of the slots at an operation still to come: single values, or that they are open; signatures of sets.</summary>
internal sealed class Prospect
{
    private readonly bool[] _open;
    private ulong _mayAbort;

    private Prospect(Value[] single, bool[] open, int[][]?[] sets, ulong mayAbort)
    {
        Single = single;
        _open = open;
        Sets = sets;
        _mayAbort = mayAbort;
    }

    public Value[] Single { get; }

    public int[][]?[] Sets { get; }

    public static Prospect Of(ListContext context, ListStructure structure, int open, int abortOpen)
    {
        Prospect prospect = new([.. structure.Single], new bool[structure.Single.Length], new int[][]?[structure.Sets.Length], structure.Aborted);
        for (int slot = 0; slot < structure.Sets.Length; slot++)
        {
            if (structure.Sets[slot] is { } masks)
                prospect.Sets[slot] = [.. masks.Select(m => Members(m, context.Types))];
        }

        for (int slot = 0; slot < prospect._open.Length; slot++)
            prospect._open[slot] = slot == open || context.IsOutside(slot);
        if (abortOpen >= 0)
            prospect.Abort(abortOpen);
        return prospect;
    }

    public bool IsKnown(int slot) => !_open[slot];

    public bool MayAbort(int party) => party >= 0 && (_mayAbort & (1UL << party)) != 0;

    public void Abort(int party) => _mayAbort |= 1UL << party;

    /// <summary>Puts a value, or null for an open one, into a slot.</summary>
    public void Assign(int slot, Value? value)
    {
        _open[slot] = value is null;
        Single[slot] = value ?? Value.None;
    }

    public void AssignSet(int slot, int[][]? set) => Sets[slot] = set;

    public Prospect Copy() => new([.. Single], [.. _open], [.. Sets], _mayAbort);

    /// <summary>What is known when either of two ways may have been taken.</summary>
    public Prospect Joined(Prospect other, Signatures signatures)
    {
        Prospect joined = new([.. Single], [.. _open], [.. Sets], _mayAbort | other._mayAbort);
        for (int slot = 0; slot < Single.Length; slot++)
        {
            if (_open[slot] || other._open[slot] || !Single[slot].Equals(other.Single[slot]))
                joined.Assign(slot, null);
            joined.Sets[slot] = Joined(Sets[slot], other.Sets[slot], signatures);
        }

        return joined;
    }

    private static int[][]? Joined(int[][]? one, int[][]? other, Signatures signatures)
    {
        if (one is null || other is null || ReferenceEquals(one, other))
            return one ?? other;
        return [.. one.Zip(other, (a, b) => a.Zip(b, signatures.Either).ToArray())];
    }

    private static int[] Members(BigInteger mask, int types) => [.. Enumerable.Range(0, types).Select(t => ListContext.Has(mask, t) ? Signatures.Yes : Signatures.No)];
}
