namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>How an overlap with the antisymmetric state is summed.</summary>
internal enum FidelityMethod
{
    /// <summary>Channels that move populations and damp coherences.</summary>
    Incoherent,

    /// <summary>Strings of few Kraus operators, of which unitaries make one.</summary>
    FewKraus,

    /// <summary>Any channels.</summary>
    Any,
}
