using ResourceCheck.Scripts;

namespace ResourceCheck.Engines.Product;

/// <summary>A condition that reads more outcomes than can be listed and has no sum of its own. Thrown and caught within the engine's estimate only.</summary>
internal sealed class ProductRefusalException(Span span, int outcomes) : Exception($"a condition reads {outcomes} outcomes")
{
    /// <summary>Where the condition stands.</summary>
    public Span At { get; } = span;

    /// <summary>How many outcomes it reads.</summary>
    public int Outcomes { get; } = outcomes;
}
