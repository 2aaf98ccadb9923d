using ResourceCheck.Scripts.Parsing;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Printing;

/// <summary>What the tree does not hold: on which lines blocks turn and end, and before which lines a blank one stands.</summary>
internal sealed class Layout
{
    private readonly SourceText _source;
    private readonly Dictionary<int, int> _ends = [];
    private readonly Dictionary<int, int> _turns = [];

    public Layout(SourceText source)
    {
        _source = source;
        Stack<int> open = [];
        foreach (TokenLine line in Lexer.Run(source, new FindingList(source)).Lines)
        {
            int number = source.LineOf(line.Span.Start);
            if (EndBalance.Opens(line))
                open.Push(number);
            else if (line.Tokens[0].Is("otherwise") && open.Count > 0)
                _turns.TryAdd(open.Peek(), number);
            else if (line.Tokens[0].Is("end") && open.Count > 0)
                _ends[open.Pop()] = number;
        }
    }

    public int LineOf(Span span) => _source.LineOf(span.Start);

    /// <summary>The line of the <c>otherwise</c> of a block that opens on a line; 0 when there is none.</summary>
    public int TurnOf(int header) => _turns.GetValueOrDefault(header);

    /// <summary>The line of the <c>end</c> of a block that opens on a line; 0 when there is none.</summary>
    public int EndOf(int header) => _ends.GetValueOrDefault(header);

    /// <summary>Whether a blank line stands before a line.</summary>
    public bool IsSpaced(int line) => line > 1 && _source.IsBlank(line - 1);
}
