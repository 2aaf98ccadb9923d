namespace ResourceCheck.Engines.Lists;

/// <summary>Where the literal protocol takes its random events from.</summary>
internal interface IChance
{
    /// <summary>One of several alternatives, with probabilities proportional to the weights.</summary>
    public int Pick(ReadOnlySpan<double> weights);
}
