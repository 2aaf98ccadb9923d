using ResourceCheck.Numerics.Antisymmetric;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines.Product;

/// <summary>One classical history with open outcomes left open. Never changed after it is built.</summary>
internal sealed record ProductBranch
{
    /// <summary>State of each party's qudit; null for parties without one.</summary>
    public required SiteState?[] Sites { get; init; }

    /// <summary>What was read out of each party's qudit; null while it is held.</summary>
    public required Reading?[] Readings { get; init; }

    /// <summary>Values that are settled; <see cref="Value.None"/> stands where one depends on open outcomes.</summary>
    public required Value[] Slots { get; init; }

    /// <summary>Values that depend on open outcomes, in terms of their slots; null where a value is settled.</summary>
    public required BoundExpression?[] Symbols { get; init; }

    /// <summary>Kept copies must satisfy these, in terms of open slots.</summary>
    public IReadOnlyList<BoundExpression> Conditions { get; init; } = [];

    /// <summary>Probability of the picks made.</summary>
    public double Factor { get; init; } = 1;

    /// <summary>How many histories of the same kind this one stands for, when costs are estimated.</summary>
    public double Copies { get; init; } = 1;

    /// <summary>Parties that gave up, as bits.</summary>
    public ulong Aborted { get; init; }

    public bool HasAborted(int party) => (Aborted & (1UL << party)) != 0;

    public ProductBranch With(int slot, Value value)
    {
        Value[] slots = [.. Slots];
        slots[slot] = value;
        return this with { Slots = slots };
    }

    public ProductBranch WithSymbol(int slot, BoundExpression expression)
    {
        BoundExpression?[] symbols = [.. Symbols];
        symbols[slot] = expression;
        return this with { Symbols = symbols };
    }

    public ProductBranch WithSite(int party, SiteState site)
    {
        SiteState?[] sites = [.. Sites];
        sites[party] = site;
        return this with { Sites = sites };
    }

    public ProductBranch Read(int party, Reading reading)
    {
        Reading?[] readings = [.. Readings];
        readings[party] = reading;
        return this with { Readings = readings };
    }

    /// <summary>The readings of all holders, those who still hold their qudit traced out.</summary>
    public Reading[] AllReadings(IReadOnlyList<int> holders, double[] trace) =>
        [.. holders.Select(p => Readings[p] ?? Reading.Settled(Sites[p]!.Pull(trace)))];
}
