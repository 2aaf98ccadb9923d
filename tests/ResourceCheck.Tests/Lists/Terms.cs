using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Tests.Lists;

/// <summary>Short ways to bound expressions and steps.</summary>
internal static class Terms
{
    public static BoundExpression Slot(int slot) => new BoundSlot(default, slot);

    public static BoundExpression Of(Value value) => new BoundLiteral(default, value);

    public static BoundExpression Of(int value) => Of(Value.Of(value));

    public static BoundExpression Of(string number) => Rational.TryParse(number, out Rational value) ? Of(new NumberValue(value)) : throw new FormatException(number);

    public static BoundExpression None => Of(Value.None);

    public static BoundExpression Choice(int choice) => new BoundChoice(default, choice);

    public static BoundExpression Binary(BinaryOperator op, BoundExpression left, BoundExpression right) => new BoundBinary(default, op, left, right);

    public static BoundExpression And(BoundExpression first, params BoundExpression[] rest) => rest.Aggregate(first, (l, r) => Binary(BinaryOperator.And, l, r));

    public static BoundExpression Or(BoundExpression first, params BoundExpression[] rest) => rest.Aggregate(first, (l, r) => Binary(BinaryOperator.Or, l, r));

    public static BoundExpression Without(BoundExpression left, BoundExpression right) => Binary(BinaryOperator.Without, left, right);

    public static BoundExpression Same(BoundExpression left, BoundExpression right) => Binary(BinaryOperator.Equal, left, right);

    public static BoundExpression Differ(BoundExpression left, BoundExpression right) => Binary(BinaryOperator.Unequal, left, right);

    public static BoundExpression AtLeast(BoundExpression left, BoundExpression right) => Binary(BinaryOperator.GreaterOrEqual, left, right);

    public static BoundExpression AtMost(BoundExpression left, BoundExpression right) => Binary(BinaryOperator.LessOrEqual, left, right);

    public static BoundExpression Minus(BoundExpression left, BoundExpression right) => Binary(BinaryOperator.Minus, left, right);

    public static BoundExpression If(BoundExpression condition, BoundExpression then, BoundExpression otherwise) => new BoundIf(default, condition, then, otherwise);

    public static BoundExpression Where(BoundExpression predicate) => new BoundWhere(default, predicate);

    public static BoundExpression Where(int slot, BoundExpression value) => Where(Same(Slot(slot), value));

    public static BoundExpression Some(BoundExpression count, BoundExpression set) => new BoundSome(default, count, set);

    public static BoundExpression Size(BoundExpression set) => new BoundSize(default, set);

    public static BoundExpression Count(BoundExpression predicate, BoundExpression set) => new BoundTally(default, predicate, set, false);

    public static BoundExpression Share(BoundExpression predicate, BoundExpression set) => new BoundTally(default, predicate, set, true);

    public static Step Set(int party, int slot, BoundExpression value) => new SetStep(default, party, slot, value);

    public static Step Send(int party, int slot, BoundExpression value) => new SendStep(default, party, slot, value, [0, 1, 2], false);

    public static Step Abort(int party, BoundExpression condition) => new AbortStep(default, party, condition);

    public static Step When(BoundExpression condition, Step[] then, Step[] otherwise) => new WhenStep(default, condition, then, otherwise);

    /// <summary>A protocol on three parties whose rounds fill slots 0, 1, 2; slot 3 is the first party's private input.</summary>
    public static Protocol Protocol(int copies, int slots, BoundExpression success, IReadOnlyList<Step> steps) => new()
    {
        Source = new SourceText("test.protocol", ""),
        Name = "test",
        About = "",
        Parties = ["S", "R0", "R1"],
        Holders = [0, 1, 2],
        Outsiders = [],
        Parameters = [],
        Inputs = [new InputValues("x", 0, 3, [Value.Of(0), Value.Of(1)])],
        Slots = [.. Enumerable.Range(0, slots).Select(s => new SlotInfo($"v{s}", s < 3 ? s : 0, SlotKind.Set, default))],
        Steps = [],
        Success = success,
        Reports = [],
        Claims = [],
        Goals = [],
        Requirements = [],
        HandlesNone = false,
        Lists = new ListProtocol(copies, 3, steps, []),
    };
}
