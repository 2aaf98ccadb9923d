namespace ResourceCheck.Scripts.Syntax;

/// <summary>Who acts or is meant, as written.</summary>
/// <param name="Span">Where it stands.</param>
public abstract record PartyRef(Span Span);

/// <summary>One party by its name: <c>Ada</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Name">The party's name.</param>
public sealed record NamedParty(Span Span, string Name) : PartyRef(Span);

/// <summary>A member or range of a family: <c>P[3]</c>, <c>P[1..m-1]</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Family">The family's name.</param>
/// <param name="From">First index.</param>
/// <param name="To">Last index; null for a single member.</param>
public sealed record FamilyParty(Span Span, string Family, Expression From, Expression? To) : PartyRef(Span);

/// <summary>The words <c>all</c> or <c>others</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Others">True for <c>others</c>.</param>
public sealed record CollectiveParty(Span Span, bool Others) : PartyRef(Span);

/// <summary>A list of party references: <c>Ada, Ben</c>, <c>all</c>, <c>P[1..m-1], Dov</c>.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Items">The references in the order written; never empty in a tree without errors.</param>
public sealed record PartyList(Span Span, IReadOnlyList<PartyRef> Items);
