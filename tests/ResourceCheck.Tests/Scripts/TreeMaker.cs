using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Tests.Scripts;

/// <summary>Makes random script trees that the parser could have made, every kind of node among them.</summary>
internal sealed class TreeMaker(Random random)
{
    private static readonly string[] Parties = ["Ada", "Ben", "Øyvind"];
    private static readonly string[] Values = ["k", "v", "J", "bit_2", "b"];
    private static readonly string[] Texts = ["a", "split the receivers", "after {m}", "# no comment", ""];
    private static readonly string[] Numbers = ["0", "1", "12", "0.25", "1e-6"];

    private readonly ExpressionMaker _expressions = new(random);

    public ScriptTree Script() => new(new SourceText("made", ""), [PickedBasis(), .. Many(1, 8, TopStatement)], []);

    /// <summary>The script must name b somewhere, or b as a basis would be a slip.</summary>
    private static RoundStatement PickedBasis()
    {
        PartyList all = new(default, [new CollectiveParty(default, false)]);
        PickStatement pick = new(default, all, new Name(default, "b"), [new BasisExpression(default, BasisKind.Level, null, null)]);
        return new RoundStatement(default, new Quoted(default, "bases"), [pick]);
    }

    private Statement TopStatement() => random.Next(20) switch
    {
        0 => new ProtocolStatement(default, Text()),
        1 => new AboutStatement(default, Text()),
        2 => new ParameterStatement(default, NewName(), Expression(), AnyDomain()),
        3 => new InputStatement(default, NewName(), _expressions.Party(), AnyDomain()),
        4 => new RequireStatement(default, Expression(), Text()),
        5 => new PartiesStatement(default, _expressions.PartyList()),
        6 => new OutsiderStatement(default, NewName()),
        7 => new ResourceStatement(default, _expressions.PartyList()),
        8 => new CopiesStatement(default, Expression()),
        9 => new ForStatement(default, NewName(), Expression(), Expression(), random.Next(2) == 0, Many(0, 3, TurnStatement)),
        10 => new SuccessStatement(default, Expression()),
        11 => new DishonestStatement(default, Text(), _expressions.PartyList(), Many(0, 4, DishonestLine)),
        12 => new GoalStatement(default, Comparison(BinaryOperator.LessOrEqual, BinaryOperator.GreaterOrEqual)),
        13 => new ClaimStatement(default, Comparison(BinaryOperator.LessOrEqual, BinaryOperator.GreaterOrEqual, BinaryOperator.Equal)),
        14 => new ReportStatement(default, Text(), Expression()),
        15 => new DiscussionStatement(default, Text(), Many(0, 5, () => TalkLine(2))),
        _ => TurnStatement(),
    };

    private Statement TurnStatement() => random.Next(4) == 0
        ? new CheckpointStatement(default, Text(), _expressions.PartyList())
        : new RoundStatement(default, Text(), Many(0, 6, () => RoundLine(2)));

    private Statement DishonestLine() => random.Next(4) switch
    {
        0 => new ChooseStatement(default, NewName(), AnyDomain()),
        3 => new PerfectStatement(default),
        1 => new HarmStatement(default, Expression()),
        _ => new ReplaceStatement(default, Text(), random.Next(2) == 0, Many(0, 3, () => RoundLine(1))),
    };

    private Statement RoundLine(int depth) => random.Next(9) switch
    {
        0 => new MeasureStatement(default, Actors(), _expressions.BasisPlace(), NewName()),
        1 => new ApplyStatement(default, Actors(), _expressions.Unitary()),
        2 => new WaitStatement(default, Actors(), One(Numbers), One("us", "µs", "ms"), default),
        3 => new InterceptStatement(default, Actors(), _expressions.Party(), _expressions.BasisPlace(), NewName()),
        4 => new KeepStatement(default, Expression()),
        5 when depth > 0 => new WhenStatement(default, Expression(), Many(0, 2, () => RoundLine(depth - 1)), Many(0, 2, () => RoundLine(depth - 1))),
        _ => TalkLine(0),
    };

    private Statement TalkLine(int depth) => random.Next(5) switch
    {
        0 => new PickStatement(default, Actors(), NewName(), Many(1, 3, Expression)),
        1 => new SendStatement(default, Actors(), Many(1, 3, Item), random.Next(2) == 0 ? null : _expressions.PartyList()),
        2 => new SetStatement(default, Actors(), NewName(), Expression()),
        3 when depth > 0 => new WhenStatement(default, Expression(), Many(0, 2, () => TalkLine(depth - 1)), Many(0, 2, () => TalkLine(depth - 1))),
        _ => new AbortStatement(default, Actors(), Expression()),
    };

    private MessageItem Item() => random.Next(2) == 0
        ? new MessageItem(default, new NameExpression(default, One(Values)), null)
        : new MessageItem(default, Expression(), NewName());

    private Domain AnyDomain() => random.Next(2) == 0
        ? new Domain(default, Many(1, 3, Expression), null, null, false)
        : new Domain(default, null, Expression(), Expression(), random.Next(2) == 0);

    private BinaryExpression Comparison(params BinaryOperator[] fitting) => new(default, fitting[random.Next(fitting.Length)], Expression(), Expression());

    private PartyList Actors() => _expressions.PartyList();

    private Expression Expression() => _expressions.Any(4);

    private Name NewName() => new(default, One([.. Parties, .. Values]));

    private Quoted Text() => new(default, One(Texts));

    private string One(params string[] choices) => choices[random.Next(choices.Length)];

    private List<T> Many<T>(int least, int most, Func<T> make) => [.. Enumerable.Range(0, random.Next(least, most + 1)).Select(_ => make())];
}
