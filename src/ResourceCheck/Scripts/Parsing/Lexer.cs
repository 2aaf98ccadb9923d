using System.Text;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Cuts a script into lines of tokens. Whatever it meets it reads on: a faulty piece becomes the token that was most likely meant.</summary>
internal sealed class Lexer
{
    // Longer literals are slips, and exact arithmetic on them would only cost time.
    private const int LongestNumber = 400;

    private readonly string _text;
    private readonly FindingList _findings;
    private readonly List<TokenLine> _lines = [];
    private readonly List<Comment> _comments = [];
    private List<Token> _tokens = [];
    private int _lineStart;
    private int _position;
    private int _lineEnd;
    private bool _faulty;
    private bool _strayTold;

    private Lexer(string text, FindingList findings)
    {
        _text = text;
        _findings = findings;
    }

    /// <summary>All lines with content, and all comments.</summary>
    public static (IReadOnlyList<TokenLine> Lines, IReadOnlyList<Comment> Comments) Run(SourceText source, FindingList findings)
    {
        Lexer lexer = new(source.Text, findings);
        int start = source.Text.StartsWith('\uFEFF') ? 1 : 0;
        while (start <= source.Text.Length)
            start = lexer.ReadLine(start);
        return (lexer._lines, lexer._comments);
    }

    private int ReadLine(int start)
    {
        int feed = _text.IndexOf('\n', start);
        int next = feed < 0 ? _text.Length : feed;
        _lineEnd = next;
        while (_lineEnd > start && _text[_lineEnd - 1] == '\r')
            _lineEnd--;
        (_tokens, _faulty, _strayTold, _lineStart, _position) = ([], false, false, start, start);
        while (_position < _lineEnd)
            ReadPiece();
        if (_tokens.Count > 0)
            FinishLine();
        return next + 1;
    }

    private void FinishLine()
    {
        _tokens.Add(new Token(TokenKind.LineEnd, new Span(_tokens[^1].Span.End, 0), ""));
        _lines.Add(new TokenLine(_tokens[0].Span.Start - _lineStart, _tokens, _faulty));
    }

    private void ReadPiece()
    {
        char c = _text[_position];
        if (IsBlank(c))
            _position++;
        else if (c == '#')
            ReadComment();
        else if (QuoteScanner.ClosingOf(c) is { } closing)
            ReadQuoted(c, closing);
        else if (char.IsAsciiDigit(c) || (c == '.' && char.IsAsciiDigit(CharAt(_position + 1))))
            ReadNumber();
        else if (c == '_' || NameScanner.StartsAt(_text, _position))
            ReadWord();
        else
            ReadSign();
    }

    private void ReadComment()
    {
        bool ownLine = _tokens.Count == 0 && string.IsNullOrWhiteSpace(_text[_lineStart.._position]);
        string text = _text[(_position + 1).._lineEnd].TrimEnd();
        _comments.Add(new Comment(new Span(_position, text.Length + 1), text, ownLine));
        _position = _lineEnd;
    }

    private void ReadQuoted(char opening, char closing)
    {
        int start = _position;
        int end = _text.IndexOf(closing, start + 1, _lineEnd - start - 1);
        bool closed = end >= 0;
        string content = closed ? _text[(start + 1)..end] : _text[(start + 1).._lineEnd].TrimEnd();
        Add(TokenKind.Quoted, closed ? end + 1 : start + 1 + content.Length, content);
        Span span = _tokens[^1].Span;
        if (!closed)
            Report(span, SyntaxMessages.UnclosedQuote(opening));
        else if (opening != '"')
            Report(span, SyntaxMessages.ForeignQuotes(opening, closing));
        else if (QuoteScanner.FirstUnreadable(content) is { } at)
            Report(new Span(start + 1 + at, 1), SyntaxMessages.ControlCharacter(content[at]));
    }

    private void ReadNumber()
    {
        int end = NumberScanner.EndOf(_text, _position, _lineEnd);
        string text = _text[_position..end];
        bool wellFormed = NumberScanner.IsWellFormed(text);
        bool inRange = wellFormed && text.Length <= LongestNumber && Rational.TryParse(text, out _);
        Add(TokenKind.Number, end, inRange ? text : "0");
        if (!wellFormed)
            Report(_tokens[^1].Span, SyntaxMessages.NoNumber(text));
        else if (!inRange)
            Report(_tokens[^1].Span, SyntaxMessages.NumberTooLong(text));
    }

    private void ReadWord()
    {
        int end = NameScanner.EndOf(_text, _position, _lineEnd);
        bool startsWell = _text[_position] != '_';
        Add(TokenKind.Word, end, _text[_position..end]);
        if (!startsWell)
            Report(_tokens[^1].Span, SyntaxMessages.NameStart(_tokens[^1].Text));
    }

    private void ReadSign()
    {
        if (SignTable.Find(_text.AsSpan(_position, _lineEnd - _position)) is not { } sign)
        {
            ReadStray();
            return;
        }

        Span span = new(_position, sign.Text.Length);
        if (sign.Replacement is { } own)
            Add(char.IsLetter(own[0]) ? TokenKind.Word : TokenKind.Sign, span.End, own);
        if (sign.IsForeign)
            Report(span, SyntaxMessages.ForeignSign(sign));
        _position = span.End;
    }

    /// <summary>A binary file has thousands of strays a line: the first of a line is told.</summary>
    private void ReadStray()
    {
        bool valid = Rune.DecodeFromUtf16(_text.AsSpan(_position), out Rune rune, out int length) == System.Buffers.OperationStatus.Done;
        Span span = new(_position, length);
        if (valid && Rune.IsDigit(rune))
        {
            Add(TokenKind.Number, span.End, "0");
            Report(span, SyntaxMessages.ForeignDigit(rune));
            return;
        }

        _position += length;
        bool told = _strayTold;
        _strayTold = _faulty = true;
        bool readable = valid && !Rune.IsControl(rune) && rune != Rune.ReplacementChar;
        if (!told)
            _findings.Add(span, readable ? SyntaxMessages.StrayCharacter(rune) : SyntaxMessages.ControlCharacter(_text[span.Start]));
    }

    private void Add(TokenKind kind, int end, string text)
    {
        _tokens.Add(new Token(kind, new Span(_position, end - _position), text));
        _position = end;
    }

    private void Report(Span span, SyntaxMessage message)
    {
        _faulty = true;
        _findings.Add(span, message);
    }

    private char CharAt(int index) => index < _lineEnd ? _text[index] : '\0';

    private static bool IsBlank(char c) => char.IsWhiteSpace(c) && !(char.IsControl(c) && c != '\t');
}
