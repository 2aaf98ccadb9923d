namespace ResourceCheck.Conditions.Json;

/// <summary>A JSON value that knows where it stands.</summary>
/// <param name="Spot">Where it stands.</param>
internal abstract record Node(Spot Spot)
{
    /// <summary>What it is, in words.</summary>
    public abstract string Kind { get; }
}

/// <summary>An object; names do not repeat.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Members">Members in the order written.</param>
internal sealed record ObjectNode(Spot Spot, IReadOnlyList<Member> Members) : Node(Spot)
{
    /// <inheritdoc/>
    public override string Kind => "an object";

    /// <summary>The value of a member; null when there is none.</summary>
    public Node? Find(string name) => Members.FirstOrDefault(m => m.Name == name)?.Value;
}

/// <summary>A member of an object.</summary>
/// <param name="Name">Its name.</param>
/// <param name="NameSpot">Where the name stands.</param>
/// <param name="Value">Its value.</param>
internal sealed record Member(string Name, Spot NameSpot, Node Value);

/// <summary>An array.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Items">Its items.</param>
internal sealed record ArrayNode(Spot Spot, IReadOnlyList<Node> Items) : Node(Spot)
{
    /// <inheritdoc/>
    public override string Kind => "a list";
}

/// <summary>A text.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Text">Its content.</param>
internal sealed record TextNode(Spot Spot, string Text) : Node(Spot)
{
    /// <inheritdoc/>
    public override string Kind => "a text";
}

/// <summary>A number.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Raw">As written.</param>
internal sealed record NumberNode(Spot Spot, string Raw) : Node(Spot)
{
    /// <inheritdoc/>
    public override string Kind => "a number";
}

/// <summary><c>true</c> or <c>false</c>.</summary>
/// <param name="Spot">Where it stands.</param>
/// <param name="Truth">Which.</param>
internal sealed record TruthNode(Spot Spot, bool Truth) : Node(Spot)
{
    /// <inheritdoc/>
    public override string Kind => Truth ? "true" : "false";
}

/// <summary><c>null</c>.</summary>
/// <param name="Spot">Where it stands.</param>
internal sealed record NullNode(Spot Spot) : Node(Spot)
{
    /// <inheritdoc/>
    public override string Kind => "null";
}
