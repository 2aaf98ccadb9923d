using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads the statements that judge: sifting, checkpoints, success, reports, claims, goals, harm.</summary>
internal static class FigureParser
{
    private static readonly BinaryOperator[] GoalSigns = [BinaryOperator.LessOrEqual, BinaryOperator.GreaterOrEqual];
    private static readonly BinaryOperator[] ClaimSigns = [BinaryOperator.Equal, .. GoalSigns];

    public static Statement Keep(LineCursor cursor) => new KeepStatement(DeclarationParser.Start(cursor), Condition(cursor));

    public static Statement Success(LineCursor cursor) => new SuccessStatement(DeclarationParser.Start(cursor), Condition(cursor));

    public static Statement Harm(LineCursor cursor) => new HarmStatement(DeclarationParser.Start(cursor), Condition(cursor));

    public static Statement Checkpoint(LineCursor cursor)
    {
        Span span = DeclarationParser.Start(cursor);
        Quoted label = cursor.TakeQuoted("the checkpoint's quoted name");
        cursor.Expect(":", "`: fidelity with antisymmetric on` and the parties");
        cursor.ExpectWord("fidelity", "`fidelity with antisymmetric on` and the parties");
        cursor.ExpectWord("with", "`with antisymmetric on` and the parties");
        cursor.ExpectWord("antisymmetric", "`antisymmetric on` and the parties");
        cursor.ExpectWord("on", "`on` and the parties");
        return new CheckpointStatement(span, label, PartyParser.List(cursor));
    }

    public static Statement Report(LineCursor cursor)
    {
        Span span = DeclarationParser.Start(cursor);
        Quoted label = cursor.TakeQuoted("the figure's quoted name");
        cursor.Expect("=", "`=` and a figure");
        return new ReportStatement(span, label, ExpressionParser.Parse(cursor));
    }

    public static Statement Claim(LineCursor cursor) =>
        new ClaimStatement(DeclarationParser.Start(cursor), Comparison(cursor, "claim", ClaimSigns));

    public static Statement Goal(LineCursor cursor) =>
        new GoalStatement(DeclarationParser.Start(cursor), Comparison(cursor, "goal", GoalSigns));

    /// <summary>The condition behind <c>when</c>.</summary>
    internal static Expression Condition(LineCursor cursor)
    {
        cursor.ExpectWord("when", "`when` and a condition");
        return ExpressionParser.Parse(cursor);
    }

    private static Expression Comparison(LineCursor cursor, string statement, BinaryOperator[] fitting)
    {
        Expression comparison = ExpressionParser.Parse(cursor);
        bool fits = comparison is BinaryExpression binary && fitting.Contains(binary.Operator);
        string signs = SyntaxMessages.Words(fitting.Select(o => OperatorTable.Of(o).Text));
        if (!fits && cursor.Peek.Kind == TokenKind.LineEnd)
            cursor.Fail(comparison.Span, SyntaxMessages.NoComparison(statement, signs));
        return comparison;
    }
}
