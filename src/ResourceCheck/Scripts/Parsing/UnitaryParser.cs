using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads what stands behind <c>apply</c>.</summary>
internal static class UnitaryParser
{
    public static UnitaryExpression Parse(LineCursor cursor)
    {
        Token word = cursor.Peek;
        if (word.Kind != TokenKind.Word || !Vocabulary.Unitaries.ContainsKey(word.Text))
            word = word with { Text = Unknown(cursor, word) };
        cursor.Take();
        UnitaryExpression unitary = Tail(cursor, word.Text);
        return unitary with { Span = word.Span.Through(unitary.Span) };
    }

    private static string Unknown(LineCursor cursor, Token word)
    {
        string? near = word.Kind == TokenKind.Word ? NearWords.Find(word.Text, Vocabulary.Unitaries.Keys) : null;
        SyntaxMessage message = SyntaxMessages.UnknownUnitary(word, near);
        if (near is null)
            cursor.Fail(word.Span, message);
        else
            cursor.Tell(word.Span, message);
        return near ?? "";
    }

    private static UnitaryExpression Tail(LineCursor cursor, string word) => word switch
    {
        "shift" => OneNumber(cursor, UnitaryKind.Shift),
        "clock" => OneNumber(cursor, UnitaryKind.Clock),
        "levelswap" => TwoNumbers(cursor),
        "complement" => Complement(cursor),
        "matrix" => Matrix(cursor),
        "inverse" => Inverse(cursor),
        _ => FourierOn(cursor, UnitaryKind.Fourier),
    };

    private static UnitaryExpression Inverse(LineCursor cursor)
    {
        cursor.ExpectWord("fourier", "`fourier`");
        return FourierOn(cursor, UnitaryKind.InverseFourier);
    }

    private static UnitaryExpression FourierOn(LineCursor cursor, UnitaryKind kind)
    {
        Span start = cursor.Peek.Span with { Length = 0 };
        Expression? size = cursor.TryTake("on") ? ExpressionParser.ParseSum(cursor) : null;
        return new UnitaryExpression(size?.Span ?? start, kind, null, size, null, null);
    }

    private static UnitaryExpression OneNumber(LineCursor cursor, UnitaryKind kind)
    {
        Token opening = cursor.Expect("(", "`(` and the number k");
        Expression number = new ExpressionParser(cursor).Nested(opening.Span);
        Token closing = cursor.Expect(")", "`)`");
        return new UnitaryExpression(closing.Span, kind, null, number, null, null);
    }

    private static UnitaryExpression TwoNumbers(LineCursor cursor)
    {
        Token opening = cursor.Expect("(", "`(` and the levels i and j");
        Expression first = new ExpressionParser(cursor).Nested(opening.Span);
        cursor.Expect(",", "a comma and the second level j");
        Expression second = new ExpressionParser(cursor).Nested(opening.Span);
        Token closing = cursor.Expect(")", "`)`");
        return new UnitaryExpression(closing.Span, UnitaryKind.LevelSwap, null, first, second, null);
    }

    private static UnitaryExpression Complement(LineCursor cursor)
    {
        Token opening = cursor.Expect("(", "`(`, a basis and the number k");
        Expression basis = BasisParser.Place(cursor);
        cursor.Expect(",", "a comma and the number k of a basis vector");
        Expression number = new ExpressionParser(cursor).Nested(opening.Span);
        Token closing = cursor.Expect(")", "`)`");
        return new UnitaryExpression(closing.Span, UnitaryKind.Complement, basis, number, null, null);
    }

    private static UnitaryExpression Matrix(LineCursor cursor)
    {
        Quoted file = cursor.TakeQuoted("the quoted name of a file");
        return new UnitaryExpression(file.Span, UnitaryKind.Matrix, null, null, null, file);
    }
}
