using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>
/// Reads one line. After a failure it stands at the line's end, where nothing matches any more, and says no more:
/// one slip, one error, and the next line starts afresh.
/// </summary>
internal sealed class LineCursor(TokenLine line, FindingList findings, IReadOnlySet<string> declared)
{
    // Deep enough for any formula a person reads; shallow enough for every recursive pass behind the parser.
    private const int DeepestNesting = 100;

    // A chain of operators is a tree as deep as the chain is long.
    private const int MostOperators = 1000;

    private int _next;
    private int _depth;
    private int _operators;
    private bool _told = line.Faulty;

    /// <summary>Whether the line could not be read to its end.</summary>
    public bool Failed { get; private set; }

    public TokenLine Line => line;

    public Token Peek => line.Tokens[_next];

    /// <summary>Whether the script gives this name to something, anywhere.</summary>
    public bool IsDeclared(string name) => declared.Contains(name);

    public Token Ahead(int count) => line.Tokens[Math.Min(_next + count, line.Tokens.Count - 1)];

    public bool Is(string text) => Peek.Is(text);

    public Token Take()
    {
        Token token = Peek;
        if (token.Kind != TokenKind.LineEnd)
            _next++;
        return token;
    }

    public bool TryTake(string text)
    {
        if (!Is(text))
            return false;
        _next++;
        return true;
    }

    /// <summary>Takes a sign, or fails saying what fits.</summary>
    public Token Expect(string text, string fitting)
    {
        if (!Is(text))
            FailHere(fitting);
        return Take();
    }

    /// <summary>Takes a word; a near miss is told and taken for it.</summary>
    public void ExpectWord(string word, string fitting)
    {
        if (TryTake(word))
            return;
        if (Peek.Kind == TokenKind.Word && !Vocabulary.IsReserved(Peek.Text) && NearWords.Find(Peek.Text, [word]) is not null)
        {
            Tell(Peek.Span, SyntaxMessages.Misfit(Peek, fitting, SyntaxMessages.DidYouMean(word)));
            Take();
            return;
        }

        FailHere(fitting);
    }

    /// <summary>A name for something new or a member.</summary>
    public Name TakeName(string fitting)
    {
        Token token = Peek;
        if (token.Kind != TokenKind.Word)
            FailHere(fitting);
        else if (Vocabulary.IsReserved(token.Text))
            Fail(token.Span, SyntaxMessages.ReservedWord(token.Text, fitting));
        else
            Take();
        return new Name(token.Span, token.Text);
    }

    public Quoted TakeQuoted(string fitting)
    {
        Token token = Peek;
        if (token.Kind == TokenKind.Quoted)
            Take();
        else if (token.Kind == TokenKind.Word)
            Fail(token.Span, SyntaxMessages.QuotesMissing(token, fitting));
        else
            FailHere(fitting);
        return new Quoted(token.Span, token.Kind == TokenKind.Quoted ? token.Text : "");
    }

    /// <summary>Nothing more may stand on the line.</summary>
    public void ExpectEnd(string complete)
    {
        if (Peek.Kind != TokenKind.LineEnd)
            FailAtComma(SyntaxMessages.RestOfLine(Peek, complete));
    }

    /// <summary>Fails at the next token, which does not fit.</summary>
    public void FailHere(string fitting) => FailAtComma(SyntaxMessages.Misfit(Peek, fitting, null));

    /// <summary>Fails at the next token, unless the slip is a comma for a decimal point.</summary>
    private void FailAtComma(SyntaxMessage otherwise)
    {
        if (FindDecimalComma() is { } comma)
            Fail(comma.Span, SyntaxMessages.DecimalComma(comma.Before, comma.After));
        else
            Fail(Peek.Span, otherwise);
    }

    public void Fail(Span span, SyntaxMessage message)
    {
        if (!Failed)
            Tell(span, message);
        Failed = true;
        _next = line.Tokens.Count - 1;
    }

    /// <summary>Reports and goes on; a line that was already reported stays silent.</summary>
    public void Tell(Span span, SyntaxMessage message)
    {
        if (!_told)
            findings.Add(span, message);
        _told = true;
    }

    /// <summary>One level deeper; false when that is too deep, which has then been told.</summary>
    public bool TryEnter(Span at)
    {
        if (++_depth <= DeepestNesting)
            return true;
        Fail(at, SyntaxMessages.TooDeep($"An expression nests more than {DeepestNesting} levels deep here"));
        return false;
    }

    public void Leave() => _depth--;

    /// <summary>Counts an operator; false when there are too many, which has then been told.</summary>
    public bool TryCountOperator(Span at)
    {
        if (++_operators <= MostOperators)
            return true;
        Fail(at, SyntaxMessages.TooDeep($"This line has more than {MostOperators} operators"));
        return false;
    }

    private (Span Span, string Before, string After)? FindDecimalComma()
    {
        if (_next >= 1 && Is(","))
            return CommaBetween(_next - 1);
        return _next >= 2 && Peek.Kind == TokenKind.Number ? CommaBetween(_next - 2) : null;
    }

    private (Span Span, string Before, string After)? CommaBetween(int first)
    {
        Token before = line.Tokens[first], comma = line.Tokens[first + 1], after = line.Tokens[first + 2];
        bool tight = before.Kind == TokenKind.Number && comma.Is(",") && after.Kind == TokenKind.Number
            && before.Span.End == comma.Span.Start && comma.Span.End == after.Span.Start;
        return tight ? (before.Span.Through(after.Span), before.Text, after.Text) : null;
    }
}
