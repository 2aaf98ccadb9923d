using ResourceCheck.Numerics.Antisymmetric;

namespace ResourceCheck.Engines.Product;

/// <summary>What has been read out of a party's qudit: one settled operator, or outcomes that are still open because nothing later depends on them.</summary>
/// <param name="Slot">Where an open outcome goes; -1 when it is settled.</param>
/// <param name="Operators">Operator of each outcome 0 … d-1 and, where missing clicks are handled, last of none; a single one when settled.</param>
internal sealed record Reading(int Slot, IReadOnlyList<LocalOperator> Operators)
{
    private LocalOperator? _sum;

    public bool IsOpen => Slot >= 0;

    /// <summary>Whatever the outcome.</summary>
    public LocalOperator Sum => _sum ??= LocalOperator.Sum(Operators);

    public static Reading Settled(LocalOperator one) => new(-1, [one]);
}
