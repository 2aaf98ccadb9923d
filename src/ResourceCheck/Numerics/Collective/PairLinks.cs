namespace ResourceCheck.Numerics.Collective;

/// <summary>All that feeds one pair of blocks.</summary>
/// <param name="Pair">The pair.</param>
/// <param name="Rows">No-photon generator of its rows.</param>
/// <param name="Columns">No-photon generator of its columns.</param>
/// <param name="Photons">Pairs from which a photon leads here.</param>
internal sealed record PairLinks(BlockPair Pair, SwapTable Rows, SwapTable Columns, PhotonLink[] Photons)
{
    /// <summary>Finds the links of a pair within its sector.</summary>
    public static PairLinks From(EmitterSpace space, BlockPair pair, Dictionary<ulong, BlockPair> byRow, bool photons) => new(
        pair, space.Table(pair.Row), space.Table(pair.Column), photons ? [.. Links(space, pair, byRow)] : []);

    private static IEnumerable<PhotonLink> Links(EmitterSpace space, BlockPair pair, Dictionary<ulong, BlockPair> byRow)
    {
        for (int level = 1; level < space.Levels; level++)
        {
            if (EmitterSpace.Count(pair.Row, level) > 0 && EmitterSpace.Count(pair.Column, level) > 0
                && byRow.TryGetValue(EmitterSpace.Before(pair.Row, level), out BlockPair? parent))
            {
                yield return new PhotonLink(
                    parent, space.Lift(pair.Row, level), space.Lift(pair.Column, level), space.Couplings.Decay[level - 1]);
            }
        }
    }
}

/// <summary>Entries that photons of one transition lead from a parent pair.</summary>
/// <param name="Parent">The pair before the photon.</param>
/// <param name="Rows">Excited words of each row.</param>
/// <param name="Columns">Excited words of each column.</param>
/// <param name="Gamma">γ of the transition.</param>
internal sealed record PhotonLink(BlockPair Parent, Lift Rows, Lift Columns, double[,] Gamma);
