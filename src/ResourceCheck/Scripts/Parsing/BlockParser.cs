using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads lines into statements and blocks, each line by itself, so that a slip stays where it is.</summary>
internal sealed class BlockParser
{
    // Protocols nest two or three deep; the limit guards the recursive passes behind the parser.
    private const int DeepestBlock = 50;

    private readonly IReadOnlyList<TokenLine> _lines;
    private readonly FindingList _findings;
    private readonly IReadOnlySet<string> _declared;
    private readonly EndBalance _balance;
    private readonly List<TokenLine> _open = [];
    private int _next;

    private BlockParser(IReadOnlyList<TokenLine> lines, FindingList findings)
    {
        _lines = lines;
        _findings = findings;
        _declared = DeclaredNames.In(lines);
        _balance = new EndBalance(lines);
    }

    /// <summary>The statements of a whole script.</summary>
    public static IReadOnlyList<Statement> Run(IReadOnlyList<TokenLine> lines, FindingList findings)
    {
        BlockParser parser = new(lines, findings);
        if (lines.Count == 0)
            findings.Add(default, SyntaxMessages.EmptyScript());
        List<Statement> statements = [];
        while (parser._next < lines.Count)
            parser.ReadLine(Places.Script, statements);
        return statements;
    }

    private void ReadLine(Places place, List<Statement> into)
    {
        TokenLine line = _lines[_next++];
        Token first = line.Tokens[0];
        if (first.Is("end"))
            _findings.Add(first.Span, SyntaxMessages.StrayEnd());
        else if (first.Is("otherwise"))
            _findings.Add(first.Span, SyntaxMessages.StrayOtherwise(false));
        else
            into.Add(ReadStatement(new LineCursor(line, _findings, _declared), place));
    }

    private Statement ReadStatement(LineCursor cursor, Places place)
    {
        (Statement header, StatementWord? word) = StatementParser.Parse(cursor, place);
        if (word?.Opens is not { } opens)
            return header;
        if (_open.Count >= DeepestBlock)
            return SkipBlock(cursor);
        _open.Add(cursor.Line);
        List<Statement> body = [], otherwise = [];
        Places inside = opens == Places.Anywhere ? WithinWhen(word, place) : opens;
        if (ReadBody(inside, body, word.Word == "when"))
            ReadBody(inside, otherwise, false);
        _open.RemoveAt(_open.Count - 1);
        return BlockHeaderParser.WithBody(header, body, otherwise);
    }

    /// <summary>The lines of a misplaced <c>when</c> are read leniently: its own place has been told.</summary>
    private static Places WithinWhen(StatementWord word, Places place) => (word.Places & place) == 0 ? Places.Replacement : place;

    /// <summary>Reads to the block's end; true when it stopped behind an <c>otherwise</c>.</summary>
    private bool ReadBody(Places place, List<Statement> into, bool mayTurn)
    {
        TokenLine header = _open[^1];
        while (_next < _lines.Count && !_balance.IsLeftOpen(_open, _lines[_next]))
        {
            TokenLine line = _lines[_next];
            if (line.Tokens[0].Is("end") && !_balance.IsSurplus(header, line))
            {
                _next++;
                CheckAlone(line, "`end` closes the block");
                return false;
            }

            if (mayTurn && line.Tokens[0].Is("otherwise"))
            {
                _next++;
                CheckAlone(line, "`otherwise` stands alone");
                return true;
            }

            ReadInner(place, into);
        }

        _balance.TellLeftOpen();
        // A block guessed from a misspelt word has been told already, and may have been none.
        if (StatementTable.Find(header.Tokens[0].Text) is not null)
            _findings.Add(header.Span, SyntaxMessages.Unclosed(header.Tokens[0].Text));
        return false;
    }

    private void ReadInner(Places place, List<Statement> into)
    {
        TokenLine line = _lines[_next];
        if (!line.Tokens[0].Is("otherwise") || !_open[^1].Tokens[0].Is("when"))
        {
            ReadLine(place, into);
            return;
        }

        _next++;
        _findings.Add(line.Tokens[0].Span, SyntaxMessages.StrayOtherwise(true));
    }

    private void CheckAlone(TokenLine line, string complete)
    {
        LineCursor cursor = new(line, _findings, _declared);
        cursor.Take();
        cursor.ExpectEnd(complete);
    }

    /// <summary>Passes over a block that nests too deep, without recursion.</summary>
    private BrokenStatement SkipBlock(LineCursor cursor)
    {
        cursor.Fail(cursor.Line.Span, SyntaxMessages.TooDeep($"Blocks nest more than {DeepestBlock} levels deep here"));
        for (int depth = 1; depth > 0 && _next < _lines.Count; _next++)
        {
            Token first = _lines[_next].Tokens[0];
            depth += first.Is("end") ? -1 : EndBalance.Opens(_lines[_next]) ? 1 : 0;
        }

        return new BrokenStatement(cursor.Line.Span);
    }
}
