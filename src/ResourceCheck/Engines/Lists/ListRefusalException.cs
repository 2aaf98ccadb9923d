namespace ResourceCheck.Engines.Lists;

/// <summary>Leaves an evaluation that cannot be done exactly; caught at the engine's edge and returned as a text.</summary>
internal sealed class ListRefusalException(string message) : Exception(message)
{
    /// <summary>Whether a coarser evaluation might still be possible.</summary>
    public bool TooMuchWork { get; init; }
}
