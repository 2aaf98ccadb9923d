using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads the statements that say what there is: names, parties, values, the resource.</summary>
internal static class DeclarationParser
{
    public static Statement Protocol(LineCursor cursor) =>
        new ProtocolStatement(Start(cursor), cursor.TakeQuoted("the quoted name of the protocol"));

    public static Statement About(LineCursor cursor) =>
        new AboutStatement(Start(cursor), cursor.TakeQuoted("a quoted description"));

    public static Statement Parameter(LineCursor cursor)
    {
        Span span = Start(cursor);
        Name name = cursor.TakeName("a parameter's name");
        cursor.Expect("=", "`=` and a value");
        Expression value = ExpressionParser.Parse(cursor);
        cursor.ExpectWord("in", "an operator, or `in` and the values that may be set,");
        return new ParameterStatement(span, name, value, Domain(cursor));
    }

    public static Statement Input(LineCursor cursor)
    {
        Span span = Start(cursor);
        Name name = cursor.TakeName("an input's name");
        cursor.ExpectWord("of", "`of` and the party that knows it");
        PartyRef owner = PartyParser.One(cursor);
        cursor.ExpectWord("in", "`in` and the values it may have");
        return new InputStatement(span, name, owner, Domain(cursor));
    }

    public static Statement Choose(LineCursor cursor)
    {
        Span span = Start(cursor);
        Name name = cursor.TakeName("a name for the choice");
        cursor.ExpectWord("in", "`in` and the values to choose from");
        return new ChooseStatement(span, name, Domain(cursor));
    }

    public static Statement Perfect(LineCursor cursor)
    {
        Span span = Start(cursor);
        cursor.ExpectWord("hardware", "`hardware`");
        return new PerfectStatement(span);
    }

    public static Statement Require(LineCursor cursor)
    {
        Span span = Start(cursor);
        Expression condition = ExpressionParser.Parse(cursor);
        cursor.Expect(",", "an operator, or a comma and a quoted reason,");
        return new RequireStatement(span, condition, cursor.TakeQuoted("a quoted reason"));
    }

    public static Statement Parties(LineCursor cursor) => new PartiesStatement(Start(cursor), PartyParser.List(cursor));

    public static Statement Outsider(LineCursor cursor) => new OutsiderStatement(Start(cursor), cursor.TakeName("an outsider's name"));

    public static Statement Resource(LineCursor cursor)
    {
        Span span = Start(cursor);
        cursor.ExpectWord("antisymmetric", "`antisymmetric on` and the parties that hold it");
        cursor.ExpectWord("on", "`on` and the parties that hold it");
        return new ResourceStatement(span, PartyParser.List(cursor));
    }

    public static Statement Copies(LineCursor cursor) => new CopiesStatement(Start(cursor), ExpressionParser.Parse(cursor));

    /// <summary>Takes the statement's word; its span is the whole line.</summary>
    internal static Span Start(LineCursor cursor)
    {
        cursor.Take();
        return cursor.Line.Span;
    }

    private static Domain Domain(LineCursor cursor)
    {
        Span start = cursor.Peek.Span;
        if (cursor.TryTake("{"))
            return Listed(cursor, start);
        Expression from = ExpressionParser.ParseSum(cursor);
        bool whole = cursor.Is("..");
        if (!whole && !cursor.Is("to"))
            cursor.FailHere("a range such as 2..12 or 0 to 1, or a list such as {0, 1},");
        cursor.Take();
        Expression to = ExpressionParser.ParseSum(cursor);
        return new Domain(start.Through(to.Span), null, from, to, whole);
    }

    private static Domain Listed(LineCursor cursor, Span opening)
    {
        List<Expression> values = [];
        if (cursor.Is("}"))
            cursor.Fail(opening.Through(cursor.Peek.Span), SyntaxMessages.EmptyDomain());
        do
            values.Add(ExpressionParser.Parse(cursor));
        while (cursor.TryTake(","));
        if (cursor.Peek.Kind == TokenKind.LineEnd)
            cursor.Fail(opening, SyntaxMessages.UnclosedBracket("{", "}", cursor.Peek));
        Token closing = cursor.Expect("}", "a comma or `}`");
        return new Domain(opening.Through(closing.Span), values, null, null, false);
    }
}
