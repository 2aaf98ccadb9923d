using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Ways through a script's tree.</summary>
internal static class TreeWalk
{
    /// <summary>All statements, blocks before their bodies, in the order written.</summary>
    public static IEnumerable<Statement> Statements(IEnumerable<Statement> statements)
    {
        foreach (Statement statement in statements)
        {
            yield return statement;
            foreach (Statement inner in Statements(Body(statement)))
                yield return inner;
        }
    }

    /// <summary>Statements directly inside a block.</summary>
    public static IEnumerable<Statement> Body(Statement statement) => statement switch
    {
        ForStatement block => block.Body,
        RoundStatement block => block.Body,
        DiscussionStatement block => block.Body,
        WhenStatement block => block.Then.Concat(block.Otherwise),
        DishonestStatement block => block.Body,
        ReplaceStatement block => block.Body,
        _ => [],
    };

    /// <summary>An expression and all within it.</summary>
    public static IEnumerable<Expression> Within(Expression? expression)
    {
        if (expression is null)
            yield break;
        yield return expression;
        foreach (Expression child in Children(expression).SelectMany(Within))
            yield return child;
    }

    /// <summary>All expressions directly in a statement's own line.</summary>
    public static IEnumerable<Expression?> Expressions(Statement statement) => statement switch
    {
        ParameterStatement s => [s.Default, .. Domain(s.Domain)],
        InputStatement s => [.. Party(s.Owner), .. Domain(s.Domain)],
        RequireStatement s => [s.Condition],
        PartiesStatement s => Parties(s.Parties),
        ResourceStatement s => Parties(s.Parties),
        CopiesStatement s => [s.Count],
        ForStatement s => [s.From, s.To],
        MeasureStatement s => [.. Parties(s.Actors), s.Basis],
        PickStatement s => [.. Parties(s.Actors), .. s.Options],
        SendStatement s => [.. Parties(s.Actors), .. s.Items.Select(i => i.Value), .. Parties(s.Recipients)],
        ApplyStatement s => [.. Parties(s.Actors), s.Unitary],
        WaitStatement s => Parties(s.Actors),
        InterceptStatement s => [.. Parties(s.Actors), .. Party(s.Victim), s.Basis],
        WhenStatement s => [s.Condition],
        KeepStatement s => [s.Condition],
        CheckpointStatement s => Parties(s.Parties),
        SetStatement s => [.. Parties(s.Actors), s.Value],
        AbortStatement s => [.. Parties(s.Actors), s.Condition],
        SuccessStatement s => [s.Condition],
        ReportStatement s => [s.Value],
        ClaimStatement s => [s.Comparison],
        GoalStatement s => [s.Comparison],
        DishonestStatement s => Parties(s.By),
        ChooseStatement s => Domain(s.Domain),
        HarmStatement s => [s.Condition],
        _ => [],
    };

    /// <summary>Names that a statement's own line gives to values.</summary>
    public static IEnumerable<Name> Makes(Statement statement) => statement switch
    {
        InputStatement s => [s.Name],
        MeasureStatement s => [s.Result],
        PickStatement s => [s.Result],
        SetStatement s => [s.Result],
        InterceptStatement s => [s.Result],
        ChooseStatement s => [s.Name],
        SendStatement s => s.Items.Where(i => i.Name is not null).Select(i => i.Name!),
        _ => [],
    };

    /// <summary>Whether an expression holds no name at all, so that its value can never vary.</summary>
    public static bool IsLiteral(Expression expression) =>
        Within(expression).All(e => e is NumberExpression or TruthExpression or NoneExpression or UnaryExpression or BinaryExpression or IfExpression);

    private static IEnumerable<Expression?> Children(Expression expression) => expression switch
    {
        PartyExpression e => Party(e.Party),
        MemberExpression e => Party(e.Party),
        OfExpression e => Parties(e.Parties),
        UnaryExpression e => [e.Operand],
        BinaryExpression e => [e.Left, e.Right],
        IfExpression e => [e.Condition, e.Then, e.Else],
        CallExpression e => [.. e.Arguments, .. e.Second, .. Parties(e.Over)],
        BasisExpression e => [e.Argument],
        UnitaryExpression e => [e.Basis, e.First, e.Second],
        _ => [],
    };

    private static IEnumerable<Expression?> Domain(Domain domain) => [.. domain.Values ?? [], domain.From, domain.To];

    private static IEnumerable<Expression?> Parties(PartyList? list) => list is null ? [] : list.Items.SelectMany(Party);

    private static IEnumerable<Expression?> Party(PartyRef party) => party is FamilyParty family ? [family.From, family.To] : [];
}
