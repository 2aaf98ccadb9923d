using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads who acts or is meant: <c>Ada, P[1..n]</c>, <c>all</c>, <c>others</c>.</summary>
internal static class PartyParser
{
    // What may follow a plain party; an operator or a point would make it a value.
    private static readonly string[] Behind = [",", ";", ")", "]", "}", ".."];

    /// <summary>A list as long as commas go on.</summary>
    public static PartyList List(LineCursor cursor)
    {
        List<PartyRef> items = [];
        do
            items.Add(One(cursor));
        while (cursor.TryTake(","));
        return ListOf(items);
    }

    /// <summary>A list inside an expression: it ends where the next piece after a comma is no plain party.</summary>
    public static PartyList ListWithin(LineCursor cursor)
    {
        List<PartyRef> items = [One(cursor)];
        while (cursor.Is(",") && IsPlainParty(cursor))
        {
            cursor.Take();
            items.Add(One(cursor));
        }

        return ListOf(items);
    }

    public static PartyRef One(LineCursor cursor)
    {
        if (cursor.Is("all") || cursor.Is("others"))
        {
            Token word = cursor.Take();
            return new CollectiveParty(word.Span, word.Text == "others");
        }

        Name name = cursor.TakeName("a party");
        return cursor.Is("[") ? Member(cursor, name) : new NamedParty(name.Span, name.Text);
    }

    /// <summary>The brackets behind a family's name.</summary>
    public static FamilyParty Member(LineCursor cursor, Name family)
    {
        Token opening = cursor.Take();
        Expression from = new ExpressionParser(cursor).Nested(opening.Span);
        Expression? to = cursor.TryTake("..") ? new ExpressionParser(cursor).Nested(opening.Span) : null;
        if (!cursor.Is("]"))
            cursor.Fail(opening.Span, SyntaxMessages.UnclosedBracket("[", "]", cursor.Peek));
        Token closing = cursor.Take();
        return new FamilyParty(family.Span.Through(closing.Span), family.Text, from, to);
    }

    private static PartyList ListOf(List<PartyRef> items) => new(items[0].Span.Through(items[^1].Span), items);

    private static bool IsPlainParty(LineCursor cursor)
    {
        Token first = cursor.Ahead(1);
        if (first.Kind != TokenKind.Word || (Vocabulary.IsReserved(first.Text) && !first.Is("all") && !first.Is("others")))
            return false;
        Token behind = cursor.Ahead(2).Is("[") ? BehindBrackets(cursor, 2) : cursor.Ahead(2);
        return behind.Kind is TokenKind.Word or TokenKind.LineEnd || Array.Exists(Behind, behind.Is);
    }

    private static Token BehindBrackets(LineCursor cursor, int opening)
    {
        int depth = 0, i = opening;
        do
        {
            Token token = cursor.Ahead(i++);
            depth += token.Is("[") ? 1 : token.Is("]") ? -1 : 0;
            if (token.Kind == TokenKind.LineEnd)
                return token;
        }
        while (depth > 0);
        return cursor.Ahead(i);
    }
}
