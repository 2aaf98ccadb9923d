using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads what follows the verb of an actor's line.</summary>
internal static class ActionParser
{
    public static Statement Measure(LineCursor cursor, PartyList actors)
    {
        Expression basis = BasisParser.Place(cursor);
        return new MeasureStatement(cursor.Line.Span, actors, basis, ResultName(cursor, "`as` and a name for the outcome"));
    }

    public static Statement Pick(LineCursor cursor, PartyList actors)
    {
        Name result = cursor.TakeName("a name for the choice");
        cursor.ExpectWord("from", "`from` and the values to pick from");
        List<Expression> options = [];
        do
            options.Add(BasisParser.Option(cursor));
        while (cursor.TryTake(","));
        return new PickStatement(cursor.Line.Span, actors, result, options);
    }

    public static Statement Announce(LineCursor cursor, PartyList actors)
    {
        List<MessageItem> items = Items(cursor);
        if (cursor.Is("to"))
            cursor.Fail(cursor.Peek.Span, SyntaxMessages.AnnounceTo());
        return new SendStatement(cursor.Line.Span, actors, items, null);
    }

    public static Statement Send(LineCursor cursor, PartyList actors)
    {
        List<MessageItem> items = Items(cursor);
        cursor.ExpectWord("to", "a comma, or `to` and the parties that receive it,");
        return new SendStatement(cursor.Line.Span, actors, items, PartyParser.List(cursor));
    }

    public static Statement Apply(LineCursor cursor, PartyList actors) => new ApplyStatement(cursor.Line.Span, actors, UnitaryParser.Parse(cursor));

    public static Statement Wait(LineCursor cursor, PartyList actors)
    {
        Token number = cursor.Peek;
        if (number.Kind != TokenKind.Number)
            cursor.FailHere("a time such as 3 us");
        cursor.Take();
        Token unit = cursor.Peek;
        if (unit.Kind != TokenKind.Word)
            cursor.FailHere("a unit of time such as us");
        cursor.Take();
        return new WaitStatement(cursor.Line.Span, actors, number.Text, unit.Text, number.Span.Through(unit.Span));
    }

    public static Statement Set(LineCursor cursor, PartyList actors)
    {
        Name result = cursor.TakeName("a name for the value");
        cursor.ExpectWord("to", "`to` and a value");
        return new SetStatement(cursor.Line.Span, actors, result, ExpressionParser.Parse(cursor));
    }

    public static Statement Abort(LineCursor cursor, PartyList actors) =>
        new AbortStatement(cursor.Line.Span, actors, FigureParser.Condition(cursor));

    public static Statement Intercept(LineCursor cursor, PartyList actors)
    {
        PartyRef victim = PartyParser.One(cursor);
        cursor.ExpectWord("in", "`in` and a basis");
        Expression basis = BasisParser.Place(cursor);
        return new InterceptStatement(cursor.Line.Span, actors, victim, basis, ResultName(cursor, "`as` and a name for the outcome"));
    }

    private static List<MessageItem> Items(LineCursor cursor)
    {
        List<MessageItem> items = [];
        do
            items.Add(Item(cursor));
        while (cursor.TryTake(","));
        return items;
    }

    private static MessageItem Item(LineCursor cursor)
    {
        Expression value = ExpressionParser.Parse(cursor);
        if (cursor.Is("as"))
        {
            Name name = ResultName(cursor, "`as` and a name");
            return new MessageItem(value.Span.Through(name.Span), value, name);
        }

        if (value is not NameExpression && (cursor.Is(",") || cursor.Is("to") || cursor.Peek.Kind == TokenKind.LineEnd))
            cursor.Fail(value.Span, SyntaxMessages.UnnamedValue());
        return new MessageItem(value.Span, value, null);
    }

    private static Name ResultName(LineCursor cursor, string fitting)
    {
        cursor.ExpectWord("as", fitting);
        return cursor.TakeName("a name");
    }
}
