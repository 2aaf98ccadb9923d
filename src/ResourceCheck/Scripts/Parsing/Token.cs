namespace ResourceCheck.Scripts.Parsing;

/// <summary>Kinds of tokens.</summary>
internal enum TokenKind
{
    Word,
    Number,
    Quoted,
    Sign,
    LineEnd,
}

/// <summary>The smallest meaningful piece of a line; the text of a quoted one is its content.</summary>
internal sealed record Token(TokenKind Kind, Span Span, string Text)
{
    /// <summary>Whether this is the given word or sign; a quoted text never is.</summary>
    public bool Is(string text) => Kind is TokenKind.Word or TokenKind.Sign && Text == text;
}

/// <summary>A line that holds more than blanks and comments.</summary>
/// <param name="Indent">Blanks before the first token.</param>
/// <param name="Tokens">Its tokens; the last is always a line end.</param>
/// <param name="Faulty">Whether the lexer has already complained about it.</param>
internal sealed record TokenLine(int Indent, IReadOnlyList<Token> Tokens, bool Faulty)
{
    /// <summary>From the first word to the last.</summary>
    public Span Span => Tokens.Count == 1 ? Tokens[0].Span : Tokens[0].Span.Through(Tokens[^2].Span);
}
