using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads the lines that open blocks; the bodies are filled in by <see cref="BlockParser"/>.</summary>
internal static class BlockHeaderParser
{
    public static Statement For(LineCursor cursor)
    {
        Span span = DeclarationParser.Start(cursor);
        Name counter = cursor.TakeName("a counter's name");
        cursor.ExpectWord("from", "`from` and the first value");
        Expression from = ExpressionParser.Parse(cursor);
        bool down = cursor.Is("down");
        if (down)
            cursor.Take();
        else
            cursor.ExpectWord("up", "an operator, or `up to` or `down to` and the last value,");
        cursor.ExpectWord("to", "`to` and the last value");
        return new ForStatement(span, counter, from, ExpressionParser.Parse(cursor), down, []);
    }

    public static Statement Round(LineCursor cursor) =>
        new RoundStatement(DeclarationParser.Start(cursor), cursor.TakeQuoted("the round's quoted name"), []);

    public static Statement Discussion(LineCursor cursor) =>
        new DiscussionStatement(DeclarationParser.Start(cursor), cursor.TakeQuoted("the discussion's quoted name"), []);

    public static Statement When(LineCursor cursor) =>
        new WhenStatement(DeclarationParser.Start(cursor), ExpressionParser.Parse(cursor), [], []);

    public static Statement Dishonest(LineCursor cursor)
    {
        Span span = DeclarationParser.Start(cursor);
        Quoted title = cursor.TakeQuoted("the case's quoted name");
        cursor.ExpectWord("by", "`by` and the parties that cheat");
        return new DishonestStatement(span, title, PartyParser.List(cursor), []);
    }

    public static Statement Instead(LineCursor cursor)
    {
        Span span = DeclarationParser.Start(cursor);
        cursor.ExpectWord("of", "`of` and a block's quoted name");
        return new ReplaceStatement(span, cursor.TakeQuoted("a block's quoted name"), false, []);
    }

    public static Statement Before(LineCursor cursor) =>
        new ReplaceStatement(DeclarationParser.Start(cursor), cursor.TakeQuoted("a block's quoted name"), true, []);

    /// <summary>The same block with its body.</summary>
    public static Statement WithBody(Statement header, IReadOnlyList<Statement> body, IReadOnlyList<Statement> otherwise) => header switch
    {
        ForStatement f => f with { Body = body },
        RoundStatement r => r with { Body = body },
        DiscussionStatement d => d with { Body = body },
        DishonestStatement d => d with { Body = body },
        ReplaceStatement r => r with { Body = body },
        WhenStatement w => w with { Then = body, Otherwise = otherwise },
        _ => header,
    };
}
