using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Parsing;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Tests.Scripts;

/// <summary>Makes random expressions that the parser could have made.</summary>
internal sealed class ExpressionMaker(Random random)
{
    private static readonly string[] Names = ["k", "v", "J", "b", "Ada", "success", "up"];
    private static readonly string[] Members = ["k", "v", "J"];
    private static readonly string[] Families = ["P", "Q"];
    private static readonly string[] Numbers = ["0", "1", "12", "0.25", "1e-6"];

    public Expression Any(int depth) => depth <= 0 ? Leaf() : random.Next(10) switch
    {
        0 => new UnaryExpression(default, random.Next(2) == 0 ? UnaryOperator.Minus : UnaryOperator.Not, Any(depth - 1)),
        1 or 2 or 3 => new BinaryExpression(default, (BinaryOperator)random.Next(14), Any(depth - 1), Any(depth - 1)),
        4 => new IfExpression(default, Any(depth - 1), Any(depth - 1), Any(depth - 1)),
        5 or 6 => Call(depth - 1),
        7 => Basis(depth - 1),
        _ => Leaf(),
    };

    /// <summary>A basis, or a variable or choice that may hold one.</summary>
    public Expression BasisPlace() => random.Next(4) switch
    {
        0 => new NameExpression(default, "b"),
        1 => new IfExpression(default, Any(1), Basis(1), Basis(1)),
        2 => new MemberExpression(default, Single(1), new Name(default, "b")),
        _ => Basis(2),
    };

    public UnitaryExpression Unitary()
    {
        UnitaryKind kind = (UnitaryKind)random.Next(7);
        bool argument = kind is UnitaryKind.Shift or UnitaryKind.Clock or UnitaryKind.Complement or UnitaryKind.LevelSwap;
        bool sized = kind is UnitaryKind.Fourier or UnitaryKind.InverseFourier && random.Next(2) == 0;
        return new UnitaryExpression(
            default,
            kind,
            kind == UnitaryKind.Complement ? BasisPlace() : null,
            argument || sized ? Any(3) : null,
            kind == UnitaryKind.LevelSwap ? Any(3) : null,
            kind == UnitaryKind.Matrix ? new Quoted(default, "u.txt") : null);
    }

    public PartyList PartyList() => new(default, [.. Enumerable.Range(0, random.Next(1, 4)).Select(_ => Party())]);

    public PartyRef Party() => random.Next(6) switch
    {
        0 => new CollectiveParty(default, random.Next(2) == 0),
        1 => new FamilyParty(default, One(Families), Any(1), Any(1)),
        _ => Single(1),
    };

    private PartyRef Single(int depth) =>
        random.Next(3) == 0 ? Member(depth) : new NamedParty(default, random.Next(2) == 0 ? "Ada" : "Ben");

    private FamilyParty Member(int depth) => new(default, One(Families), Any(depth), null);

    private Expression Leaf() => random.Next(9) switch
    {
        0 => Number(),
        1 => new TruthExpression(default, random.Next(2) == 0),
        2 => new NoneExpression(default),
        3 => new LabelExpression(default, new Quoted(default, "after")),
        4 => new PartyExpression(default, Member(0)),
        5 => new MemberExpression(default, Single(0), new Name(default, One(Members))),
        6 => new OfExpression(default, new Name(default, One(Members)), PartyList()),
        _ => new NameExpression(default, One(Names)),
    };

    private NumberExpression Number()
    {
        string text = One(Numbers);
        return Rational.TryParse(text, out Rational value) ? new NumberExpression(default, value, text) : throw new InvalidOperationException(text);
    }

    private BasisExpression Basis(int depth) => random.Next(5) switch
    {
        0 => new BasisExpression(default, BasisKind.Level, null, null),
        1 => new BasisExpression(default, BasisKind.Fourier, null, null),
        2 => new BasisExpression(default, BasisKind.Fourier, Any(depth), null),
        3 => new BasisExpression(default, BasisKind.Phased, Any(depth), null),
        _ => new BasisExpression(default, BasisKind.Matrix, null, new Quoted(default, "m.txt")),
    };

    private CallExpression Call(int depth)
    {
        if (random.Next(8) == 0)
            return new CallExpression(default, new Name(default, "harm"), [new LabelExpression(default, new Quoted(default, "case"))], null, [], null);
        (string function, IReadOnlyList<string> separators) = Vocabulary.Functions.ElementAt(random.Next(Vocabulary.Functions.Count));
        string? separator = separators.Count > 0 && random.Next(3) > 0 ? separators[random.Next(separators.Count)] : null;
        List<Expression> first = Some(separator is null ? 0 : 1, depth);
        List<Expression> second = separator is null or "over" ? [] : Some(1, depth);
        return new CallExpression(default, new Name(default, function), first, separator, second, separator == "over" ? PartyList() : null);
    }

    private List<Expression> Some(int least, int depth) => [.. Enumerable.Range(0, random.Next(least, 4)).Select(_ => Any(depth))];

    private string One(string[] choices) => choices[random.Next(choices.Length)];
}
