using System.Text;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Printing;

/// <summary>
/// Writes a script in its one shape: two blanks a level, single blanks between words, at most one blank line between lines
/// and none at the ends of a block, comments where they stand.
/// </summary>
internal sealed class ScriptPrinter
{
    private readonly ScriptTree _tree;
    private readonly Layout _layout;
    private readonly StringBuilder _text = new();
    private int _depth;
    private int _nextComment;

    // A block's first and last line take no blank one beside them.
    private bool _tight = true;

    private ScriptPrinter(ScriptTree tree)
    {
        _tree = tree;
        _layout = new Layout(tree.Source);
    }

    public static string Print(ScriptTree tree)
    {
        ScriptPrinter printer = new(tree);
        printer.Write(tree.Statements);
        printer.WriteCommentsBefore(int.MaxValue);
        return printer._text.ToString();
    }

    private void Write(IReadOnlyList<Statement> statements)
    {
        foreach (Statement statement in statements)
            Write(statement);
    }

    private void Write(Statement statement)
    {
        int line = _layout.LineOf(statement.Span);
        WriteCommentsBefore(line);
        WriteLine(StatementPrinter.PrintHeader(statement, _tree.Source), line);
        if (BodyOf(statement) is not { } body)
            return;
        WriteInside(body, statement is WhenStatement { Otherwise.Count: > 0 } ? _layout.TurnOf(line) : _layout.EndOf(line));
        if (statement is WhenStatement { Otherwise: { Count: > 0 } otherwise })
        {
            WriteEdge("otherwise", _layout.TurnOf(line));
            WriteInside(otherwise, _layout.EndOf(line));
        }

        WriteEdge("end", _layout.EndOf(line));
    }

    private static IReadOnlyList<Statement>? BodyOf(Statement statement) => statement switch
    {
        ForStatement s => s.Body,
        RoundStatement s => s.Body,
        DiscussionStatement s => s.Body,
        DishonestStatement s => s.Body,
        ReplaceStatement s => s.Body,
        WhenStatement s => s.Then,
        _ => null,
    };

    private void WriteInside(IReadOnlyList<Statement> body, int edge)
    {
        _depth++;
        _tight = true;
        Write(body);
        WriteCommentsBefore(edge);
        _depth--;
    }

    private void WriteEdge(string word, int line)
    {
        _tight = true;
        WriteLine(word, line);
        _tight = word == "otherwise";
    }

    private void WriteCommentsBefore(int line)
    {
        while (_nextComment < _tree.Comments.Count && _layout.LineOf(_tree.Comments[_nextComment].Span) < line)
        {
            Comment comment = _tree.Comments[_nextComment++];
            Indent(_layout.LineOf(comment.Span));
            _text.Append('#').Append(comment.Text).Append('\n');
        }
    }

    private void WriteLine(string content, int line)
    {
        Indent(line);
        _text.Append(content);
        if (_nextComment < _tree.Comments.Count && _tree.Comments[_nextComment] is { OwnLine: false } comment && _layout.LineOf(comment.Span) == line)
        {
            _text.Append(" #").Append(comment.Text);
            _nextComment++;
        }

        _text.Append('\n');
    }

    private void Indent(int line)
    {
        if (!_tight && _layout.IsSpaced(line))
            _text.Append('\n');
        _tight = false;
        _text.Append(' ', 2 * _depth);
    }
}
