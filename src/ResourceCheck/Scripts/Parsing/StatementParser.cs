using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Tells from its first words what a line is, and has it read.</summary>
internal static class StatementParser
{
    /// <summary>The statement of a line, and its word when it starts with one. A line that cannot be read is a broken statement.</summary>
    public static (Statement Statement, StatementWord? Word) Parse(LineCursor cursor, Places place)
    {
        Token first = cursor.Peek;
        if (WordOf(cursor.Line) is not { } word)
            return (Finish(cursor, ActorLine(cursor, place)), null);
        if (StatementTable.Find(first.Text) is null)
            cursor.Tell(first.Span, SyntaxMessages.UnknownStatement(first.Text, Fitting(place), word.Word));
        if ((word.Places & place) == 0)
            cursor.Tell(first.Span, SyntaxMessages.Misplaced(first.Text, PlaceNames.Inside(place), PlaceNames.Home(word.Places)));
        return (Finish(cursor, word.Parse(cursor)), word);
    }

    /// <summary>The statement word that a line starts with, or very likely was meant to; null for an actor's line.</summary>
    public static StatementWord? WordOf(TokenLine line)
    {
        Token first = line.Tokens[0], second = line.Tokens[Math.Min(1, line.Tokens.Count - 1)];
        if (first.Kind != TokenKind.Word)
            return null;
        if (StatementTable.Find(first.Text) is { } word)
            return word;
        bool actorLine = first.Is("all") || first.Is("others") || second.Is(",") || second.Is("[")
            || IsNearlyVerb(second);
        return actorLine || first.Is("end") || first.Is("otherwise") ? null : StatementTable.Near(first.Text);
    }

    private static Statement Finish(LineCursor cursor, Statement statement)
    {
        cursor.ExpectEnd("nothing more belongs to it");
        // A round whose name is unreadable still holds a body worth checking.
        return cursor.Failed && statement is not (RoundStatement or DiscussionStatement) ? new BrokenStatement(cursor.Line.Span) : statement;
    }

    private static Statement ActorLine(LineCursor cursor, Places place)
    {
        if (!CanBeActors(cursor))
        {
            Unknown(cursor, place);
            return new BrokenStatement(cursor.Line.Span);
        }

        PartyList actors = PartyParser.List(cursor);
        Token word = cursor.Peek;
        if (FindVerb(cursor, word) is not { } verb)
            return new BrokenStatement(cursor.Line.Span);
        cursor.Take();
        if ((verb.Places & place) == 0)
            cursor.Tell(word.Span, SyntaxMessages.Misplaced(word.Text, PlaceNames.Inside(place), PlaceNames.Home(verb.Places)));
        return verb.Parse(cursor, actors);
    }

    /// <summary>A lone word with no verb in sight is a statement of unknown name rather than an actor without a verb.</summary>
    private static bool CanBeActors(LineCursor cursor)
    {
        Token first = cursor.Peek, second = cursor.Ahead(1);
        bool isParty = first.Is("all") || first.Is("others") || (first.Kind == TokenKind.Word && !Vocabulary.IsReserved(first.Text));
        return isParty
            && (second.Is(",") || second.Is("[") || cursor.IsDeclared(first.Text) || IsNearlyVerb(second) || first.Text is "all" or "others");
    }

    private static bool IsNearlyVerb(Token token) =>
        token.Kind == TokenKind.Word && (VerbTable.Find(token.Text) is not null || VerbTable.Near(token.Text) is not null);

    private static void Unknown(LineCursor cursor, Places place)
    {
        Token first = cursor.Peek;
        string text = first.Kind == TokenKind.Quoted ? $"\"{first.Text}\"" : first.Text;
        bool verb = first.Kind == TokenKind.Word && VerbTable.Find(first.Text) is not null;
        cursor.Fail(first.Span, verb ? SyntaxMessages.NoActor(first.Text) : SyntaxMessages.UnknownStatement(text, Fitting(place), null));
    }

    private static Verb? FindVerb(LineCursor cursor, Token word)
    {
        if (cursor.Failed || VerbTable.Find(word.Text) is { } && word.Kind == TokenKind.Word)
            return cursor.Failed ? null : VerbTable.Find(word.Text);
        string? near = word.Kind == TokenKind.Word ? VerbTable.Near(word.Text) : null;
        if (near is null)
            cursor.Fail(word.Span, SyntaxMessages.UnknownVerb(word, null));
        else
            cursor.Tell(word.Span, SyntaxMessages.UnknownVerb(word, near));
        return near is null ? null : VerbTable.Find(near);
    }

    private static string Fitting(Places place)
    {
        IEnumerable<string> words = StatementTable.Fitting(place);
        bool acting = (place & (Places.Round | Places.Discussion | Places.Replacement)) != 0;
        return SyntaxMessages.Words(acting ? words.Prepend("a party and its verb") : words);
    }
}
