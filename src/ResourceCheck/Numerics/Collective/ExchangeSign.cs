namespace ResourceCheck.Numerics.Collective;

/// <summary>What a letter that occurs several times stands for.</summary>
internal enum ExchangeSign
{
    /// <summary>The level itself, or several levels in the sum with all signs + : swaps carry no sign.</summary>
    Even,

    /// <summary>Several levels in their antisymmetric combination: moving one past another changes the sign.</summary>
    Odd,
}
