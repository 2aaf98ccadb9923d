namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Where a photon of transition j can have come from: for each word of a block and each place that holds level j, the word with that
/// place excited.
/// </summary>
/// <param name="PerWord">Places with level j, the same number for each word.</param>
/// <param name="Places">Emitters, word after word.</param>
/// <param name="Parents">Number of the excited word in its own block.</param>
internal sealed record Lift(int PerWord, byte[] Places, int[] Parents)
{
    public static Lift From(WordBlock block, WordBlock parent, int level)
    {
        int perWord = block.Counts[level], next = 0;
        byte[] places = new byte[block.Size * perWord];
        int[] parents = new int[places.Length];
        foreach (ulong code in block.Codes)
        {
            for (int i = 0; i < block.Emitters; i++)
            {
                if (WordBlock.Letter(code, i) != level)
                    continue;
                places[next] = (byte)i;
                parents[next++] = parent.Rank(WordBlock.With(code, i, 0));
            }
        }

        return new Lift(perWord, places, parents);
    }
}
