using System.Collections.Immutable;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A line that the referee judges at the end: success, report, claim or goal.</summary>
/// <param name="statement">The line.</param>
/// <param name="counters">Counters where it stands.</param>
/// <param name="loops">Loops around it.</param>
internal sealed class RefereeLine(Statement statement, ImmutableDictionary<string, int> counters, ImmutableStack<ForStatement> loops)
{
    /// <summary>The line.</summary>
    public Statement Statement => statement;

    /// <summary>Counters where it stands.</summary>
    public ImmutableDictionary<string, int> Counters => counters;

    /// <summary>Loops around it.</summary>
    public ImmutableStack<ForStatement> Loops => loops;

    /// <summary>Who holds what at the end of its block.</summary>
    public NameState State { get; set; } = new();

    /// <summary>Label of a report; empty otherwise.</summary>
    public string Label { get; set; } = "";
}
