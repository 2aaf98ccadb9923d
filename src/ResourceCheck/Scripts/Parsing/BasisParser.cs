using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads bases, as values and where only a basis fits.</summary>
internal static class BasisParser
{
    /// <summary>A place where nothing but a basis fits: a word that is neither basis nor variable is told and taken for one.</summary>
    public static Expression Place(LineCursor cursor)
    {
        Token token = cursor.Peek;
        Token next = cursor.Ahead(1);
        bool isCall = next.Is("(") && !Vocabulary.Functions.ContainsKey(token.Text);
        bool isBare = !next.Is("(") && !next.Is(".") && !next.Is("[") && !cursor.IsDeclared(token.Text);
        return token.Kind == TokenKind.Word && !Vocabulary.IsReserved(token.Text) && (isCall || isBare)
            ? Unknown(cursor)
            : ExpressionParser.ParseSum(cursor);
    }

    /// <summary>An option of <c>pick</c>: any value fits, so only a near miss of a basis is told.</summary>
    public static Expression Option(LineCursor cursor)
    {
        Token token = cursor.Peek;
        bool slip = token.Kind == TokenKind.Word && !Vocabulary.IsReserved(token.Text) && !cursor.IsDeclared(token.Text)
            && NearWords.Find(token.Text, Vocabulary.Bases) is not null;
        return slip ? Place(cursor) : ExpressionParser.Parse(cursor);
    }

    /// <summary>One of the words for bases with what belongs to it.</summary>
    public static BasisExpression Basis(LineCursor cursor, ExpressionParser parser) => Tail(cursor, parser, cursor.Take());

    private static BasisExpression Unknown(LineCursor cursor)
    {
        Token token = cursor.Take();
        string? near = NearWords.Find(token.Text, Vocabulary.Bases);
        cursor.Tell(token.Span, SyntaxMessages.UnknownBasis(token.Text, near));
        return Tail(cursor, new ExpressionParser(cursor), token with { Text = near ?? "level" });
    }

    private static BasisExpression Tail(LineCursor cursor, ExpressionParser parser, Token word)
    {
        switch (word.Text)
        {
            case "fourier" when cursor.TryTake("on"):
                Expression size = parser.Sum();
                return new BasisExpression(word.Span.Through(size.Span), BasisKind.Fourier, size, null);
            case "fourier":
                return new BasisExpression(word.Span, BasisKind.Fourier, null, null);
            case "phased":
                Token opening = cursor.Expect("(", "the number of the phased basis, as in phased(1),");
                Expression number = parser.Nested(opening.Span);
                Token closing = cursor.Expect(")", "`)`");
                return new BasisExpression(word.Span.Through(closing.Span), BasisKind.Phased, number, null);
            case "matrix":
                Quoted file = cursor.TakeQuoted("the quoted name of a file");
                return new BasisExpression(word.Span.Through(file.Span), BasisKind.Matrix, null, file);
            default:
                return new BasisExpression(word.Span, BasisKind.Level, null, null);
        }
    }
}
