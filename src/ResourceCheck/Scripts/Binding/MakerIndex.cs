using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A line that gives a value a name.</summary>
/// <param name="Name">The name.</param>
/// <param name="Span">Where the name stands.</param>
/// <param name="Loop">Innermost loop around it, or null.</param>
internal sealed record Maker(string Name, Span Span, ForStatement? Loop);

/// <summary>All lines of a script that give names, whatever the parameters are: tells names made too late from names never made.</summary>
internal sealed class MakerIndex
{
    private readonly List<Maker> _makers = [];

    private readonly DishonestStatement? _case;

    /// <summary>Gathers the names of a script, with those of one cheating strategy if any.</summary>
    public MakerIndex(ScriptTree tree, DishonestStatement? strategy)
    {
        _case = strategy;
        Gather(tree.Statements, null);
    }

    /// <summary>All names made anywhere.</summary>
    public IEnumerable<string> Names => _makers.Select(m => m.Name);

    /// <summary>Lines that make a name, in the order written.</summary>
    public IReadOnlyList<Maker> Of(string name) => [.. _makers.Where(m => m.Name == name)];

    private void Gather(IEnumerable<Statement> statements, ForStatement? loop)
    {
        foreach (Statement statement in statements)
        {
            if (statement is DishonestStatement && statement != _case)
                continue;
            _makers.AddRange(TreeWalk.Makes(statement).Select(name => new Maker(name.Text, name.Span, loop)));
            Gather(TreeWalk.Body(statement), statement as ForStatement ?? loop);
        }
    }
}
