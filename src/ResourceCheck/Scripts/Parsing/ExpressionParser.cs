using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Parsing;

/// <summary>Reads expressions by climbing precedences: one loop over <see cref="OperatorTable"/>.</summary>
internal sealed class ExpressionParser(LineCursor cursor)
{
    private const string Fitting = "an expression";

    // In some(k of SET) the word parts the arguments, so a bare k takes no parties.
    private bool _ofParts;

    public static Expression Parse(LineCursor cursor) => new ExpressionParser(cursor).Climb(OperatorTable.Conditional);

    /// <summary>A sum or what binds tighter, as in the ends of a range.</summary>
    public static Expression ParseSum(LineCursor cursor) => new ExpressionParser(cursor).Sum();

    /// <summary>A sum or what binds tighter, one level deeper.</summary>
    public Expression Sum()
    {
        if (!cursor.TryEnter(cursor.Peek.Span))
            return Missing();
        Expression sum = Climb(OperatorTable.Sum);
        cursor.Leave();
        return sum;
    }

    /// <summary>A whole expression one level deeper, inside brackets of any kind.</summary>
    public Expression Nested(Span opening)
    {
        if (!cursor.TryEnter(opening))
            return Missing();
        bool outer = _ofParts;
        _ofParts = false;
        Expression inner = Climb(OperatorTable.Conditional);
        _ofParts = outer;
        cursor.Leave();
        return inner;
    }

    private Expression Climb(int least)
    {
        Expression left = Operand();
        while (OperatorTable.Find(cursor.Peek) is { } entry && entry.Precedence >= least && cursor.TryCountOperator(cursor.Peek.Span))
        {
            cursor.Take();
            Expression right = Climb(entry.Precedence + 1);
            left = new BinaryExpression(left.Span.Through(right.Span), entry.Operator, left, right);
            if (entry.IsComparison && OperatorTable.Find(cursor.Peek) is { IsComparison: true } second)
                cursor.Fail(cursor.Peek.Span, SyntaxMessages.ChainedComparison(second.Text));
        }

        return left;
    }

    private Expression Operand()
    {
        Token token = cursor.Peek;
        return token.Kind switch
        {
            TokenKind.Number => Number(),
            TokenKind.Quoted => new LabelExpression(token.Span, cursor.TakeQuoted("a label")),
            TokenKind.Sign when token.Text == "-" => Prefix(UnaryOperator.Minus, OperatorTable.Negation),
            TokenKind.Sign when token.Text == "(" => Brackets(),
            TokenKind.Word => Word(),
            _ => Misfit(),
        };
    }

    private NumberExpression Number()
    {
        Token token = cursor.Take();
        _ = Rational.TryParse(token.Text, out Rational value);
        return new NumberExpression(token.Span, value, token.Text);
    }

    private Expression Prefix(UnaryOperator unary, int precedence)
    {
        Token sign = cursor.Take();
        if (!cursor.TryEnter(sign.Span))
            return Missing();
        Expression operand = Climb(precedence);
        cursor.Leave();
        return new UnaryExpression(sign.Span.Through(operand.Span), unary, operand);
    }

    private Expression Brackets()
    {
        Token opening = cursor.Take();
        Expression inner = Nested(opening.Span);
        return inner with { Span = opening.Span.Through(Close(opening).Span) }; // quoted in messages and results as written
    }

    private Token Close(Token opening)
    {
        if (cursor.Peek.Kind == TokenKind.LineEnd || OpensNext())
            cursor.Fail(opening.Span, SyntaxMessages.UnclosedBracket("(", ")", cursor.Peek));
        return cursor.Expect(")", "an operator or `)`");
    }

    private bool OpensNext() => cursor.Is("]") || cursor.Is("}") || cursor.Is("as") || cursor.Is("then") || cursor.Is("else") || cursor.Is("to");

    private Expression Word()
    {
        Token token = cursor.Peek;
        switch (token.Text)
        {
            case "not":
                return Prefix(UnaryOperator.Not, OperatorTable.Not);
            case "if":
                return If();
            case "true" or "false":
                return new TruthExpression(cursor.Take().Span, token.Text == "true");
            case "none":
                return new NoneExpression(cursor.Take().Span);
            case "level" or "fourier" or "phased" or "matrix":
                return BasisParser.Basis(cursor, this);
            case "harm" when cursor.Ahead(1).Kind == TokenKind.Quoted:
                return Harm();
            default:
                return Vocabulary.IsReserved(token.Text) && !Vocabulary.Metrics.Contains(token.Text) ? Misfit() : Named();
        }
    }

    private Expression If()
    {
        Token word = cursor.Take();
        if (!cursor.TryEnter(word.Span))
            return Missing();
        Expression condition = Climb(OperatorTable.Conditional);
        cursor.ExpectWord("then", "an operator, or `then` and a value,");
        Expression then = Climb(OperatorTable.Conditional);
        cursor.ExpectWord("else", "an operator, or `else` and a value,");
        Expression other = Climb(OperatorTable.Conditional);
        cursor.Leave();
        return new IfExpression(word.Span.Through(other.Span), condition, then, other);
    }

    /// <summary>The metric <c>harm "case"</c> is kept as a call of <c>harm</c> with the label as its one argument.</summary>
    private CallExpression Harm()
    {
        Token word = cursor.Take();
        LabelExpression label = new(cursor.Peek.Span, cursor.TakeQuoted("a label"));
        return new CallExpression(word.Span.Through(label.Span), new Name(word.Span, word.Text), [label], null, [], null);
    }

    private Expression Named()
    {
        Token token = cursor.Take();
        Name name = new(token.Span, token.Text);
        if (cursor.Is("("))
            return Call(name);
        if (cursor.Is("["))
            return FamilyValue(PartyParser.Member(cursor, name));
        if (cursor.Is("."))
            return Member(new NamedParty(name.Span, name.Text));
        return !_ofParts && cursor.TryTake("of") ? Of(name) : new NameExpression(name.Span, name.Text);
    }

    private OfExpression Of(Name name)
    {
        PartyList parties = PartyParser.ListWithin(cursor);
        return new OfExpression(name.Span.Through(parties.Span), name, parties);
    }

    private Expression FamilyValue(FamilyParty party)
    {
        if (party.To is not null)
            cursor.Fail(party.Span, SyntaxMessages.RangeAsValue());
        return cursor.Is(".") ? Member(party) : new PartyExpression(party.Span, party);
    }

    private MemberExpression Member(PartyRef party)
    {
        cursor.Take();
        Name member = cursor.TakeName("the name of a value");
        return new MemberExpression(party.Span.Through(member.Span), party, member);
    }

    private Expression Call(Name function)
    {
        Name known = Known(function);
        Token opening = cursor.Take();
        if (!cursor.TryEnter(opening.Span))
            return Missing();
        bool outer = _ofParts;
        _ofParts = known.Text == "some";
        IReadOnlyList<Expression> first = cursor.Is(")") ? [] : Arguments();
        _ofParts = false;
        string? separator = Separator(known.Text);
        PartyList? over = separator == "over" ? PartyParser.List(cursor) : null;
        IReadOnlyList<Expression> second = separator is null or "over" ? [] : Arguments();
        _ofParts = outer;
        Token closing = Close(opening);
        cursor.Leave();
        return new CallExpression(function.Span.Through(closing.Span), known, first, separator, second, over);
    }

    private List<Expression> Arguments()
    {
        List<Expression> items = [];
        do
            items.Add(Climb(OperatorTable.Conditional));
        while (cursor.TryTake(","));
        return items;
    }

    private string? Separator(string function)
    {
        string? found = Vocabulary.Separators.FirstOrDefault(cursor.Is);
        if (found is null)
            return null;
        if (!Vocabulary.Functions[function].Contains(found))
            cursor.Fail(cursor.Peek.Span, SyntaxMessages.WrongSeparator(function, found));
        cursor.Take();
        return cursor.Failed ? null : found;
    }

    /// <summary>The function as meant: a near miss is told and taken for it.</summary>
    private Name Known(Name function)
    {
        if (Vocabulary.Functions.ContainsKey(function.Text))
            return function;
        string? near = NearWords.Find(function.Text, Vocabulary.Functions.Keys);
        SyntaxMessage message = Vocabulary.Unitaries.ContainsKey(function.Text)
            ? SyntaxMessages.UnitaryAsValue(function.Text)
            : SyntaxMessages.UnknownFunction(function.Text, near);
        if (near is null)
            cursor.Fail(function.Span, message);
        else
            cursor.Tell(function.Span, message);
        return function with { Text = near ?? "same" };
    }

    private NoneExpression Misfit()
    {
        cursor.FailHere(Fitting);
        return Missing();
    }

    private NoneExpression Missing() => new(cursor.Peek.Span);
}
