using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using static ResourceCheck.Tests.Lists.Terms;

namespace ResourceCheck.Tests.Lists;

/// <summary>Detectable broadcast as bound trees: M. Fitzi, N. Gisin and U. Maurer, Phys. Rev. Lett. 87, 217901 (2001), with thresholds.</summary>
internal static class Broadcast
{
    // Slots: s, r0, r1 of the copies; then single values and sets.
    private const int S = 0, R0 = 1, R1 = 2, X = 3, Bit0 = 4, Set0 = 5, Bit1 = 6, Set1 = 7, Kept0 = 8, Sent0 = 9, Evidence = 10, Kept1 = 11, Sent1 = 12,
        Clean = 13, Out0 = 14, Out1 = 15, Slots = 16;

    private static readonly BoundExpression One = Of(1);

    /// <summary>Nobody cheats. Success is that both receivers accept S's list, or, in the looser reading, that both end with S's bit.</summary>
    public static ListTask Honest(int copies, IReadOnlyList<CopyType> law, int x = 0, bool bothAccept = true) => new()
    {
        Protocol = Protocol(
            copies,
            Slots,
            bothAccept ? And(Same(Slot(Kept0), Slot(X)), Same(Slot(Kept1), Slot(X))) : And(Same(Slot(Out0), Slot(X)), Same(Slot(Out1), Slot(X))),
            [.. HonestSender, .. Receivers(copies, HonestForwarding)]),
        Copies = law,
        Inputs = [Value.Of(x)],
    };

    /// <summary>R0 claims the other bit with a forged set; choice: its size.</summary>
    public static ListTask Forger(int copies, IReadOnlyList<CopyType> law, int size, bool enough = true) => Cheating(
        Honest(copies, law), 1, [.. HonestSender, .. Receivers(copies, Forging)], Differ(Slot(Out1), Slot(X)), enough, size);

    /// <summary>S sends 0 to R0 and 1 to R1; choices n, k1, k2, o and the size of the second set.</summary>
    public static ListTask Splitter(int copies, IReadOnlyList<CopyType> law, bool enough, params int[] choices) => Cheating(
        Honest(copies, law), 0, [.. Splitting, .. Receivers(copies, HonestForwarding)], Differ(Slot(Out0), Slot(Out1)), enough, choices);

    /// <summary>The splitter where receivers accept sets of any size.</summary>
    public static ListTask SplitterWithoutCap(int copies, IReadOnlyList<CopyType> law, params int[] choices) => Cheating(
        Honest(copies, law), 0, [.. Splitting, .. Receivers(copies, HonestForwarding, "1000")], Differ(Slot(Out0), Slot(Out1)), true, choices);

    /// <summary>R0 shows positions of S's own set as evidence for the other bit; R1 removes its set from the evidence or not.</summary>
    public static ListTask ForgerFromTheSet(int copies, IReadOnlyList<CopyType> law, bool removes)
    {
        Step[] forging = [Send(1, Sent0, Minus(One, Slot(X))), Send(1, Evidence, And(Slot(Set0), Where(R0, Minus(One, Slot(X)))))];
        return Cheating(Honest(copies, law), 1, [.. HonestSender, .. Receivers(copies, forging, removes: removes)], Differ(Slot(Out1), Slot(X)), false);
    }

    private static ListTask Cheating(ListTask honest, int by, IReadOnlyList<Step> steps, BoundExpression harm, bool enough, params int[] choices) => honest with
    {
        Case = new DishonestCase("cheat", [by], [.. choices.Select((_, i) => new Choice($"c{i}", Of(0), Of(honest.Protocol.Lists!.Copies), true))], [], steps, harm),
        Choices = [.. choices.Select(Value.Of)],
        HoldsEnough = enough,
    };

    private static Step[] HonestSender =>
        [Send(0, Bit0, Slot(X)), Send(0, Bit1, Slot(X)), Send(0, Set0, Where(S, Slot(X))), Send(0, Set1, Where(S, Slot(X)))];

    private static Step[] Splitting =>
    [
        Send(0, Bit0, Of(0)),
        Send(0, Bit1, One),
        Send(0, Set0, Or(
            Some(Minus(Choice(0), Binary(BinaryOperator.Plus, Choice(1), Choice(2))), Where(S, Of(0))),
            Some(Choice(1), Where(S, One)),
            Some(Choice(2), Where(S, Of(2))))),
        Send(0, Set1, Or(
            Some(Choice(3), And(Slot(Set0), Where(S, Of(0)))),
            Some(Minus(Choice(4), Choice(3)), Without(Where(S, One), Slot(Set0))))),
    ];

    private static Step[] HonestForwarding => [Send(1, Sent0, Slot(Kept0)), Send(1, Evidence, And(Slot(Set0), Where(R0, Minus(One, Slot(Sent0)))))];

    private static Step[] Forging =>
        [Send(1, Sent0, Minus(One, Slot(X))), Send(1, Evidence, Some(Choice(0), Without(Where(R0, Slot(X)), Slot(Set0))))];

    private static Step[] Receivers(int copies, Step[] forwarding, string cap = "0.42", bool removes = true) =>
    [
        Set(1, Kept0, If(Accepted(copies, R0, Bit0, Set0, cap), Slot(Bit0), None)),
        .. forwarding,
        Set(2, Kept1, If(Accepted(copies, R1, Bit1, Set1, cap), Slot(Bit1), None)),
        Send(2, Sent1, Slot(Kept1)),
        Abort(1, And(Same(Slot(Kept0), None), Same(Slot(Sent1), None))),
        Abort(2, And(Same(Slot(Sent0), None), Same(Slot(Kept1), None))),
        Set(1, Out0, If(Same(Slot(Kept0), None), Slot(Sent1), Slot(Kept0))),
        Set(2, Clean, removes ? Without(Slot(Evidence), Slot(Set1)) : Slot(Evidence)),
        Set(2, Out1, If(Same(Slot(Kept1), None), Slot(Sent0), If(
            And(Differ(Slot(Sent0), None), Differ(Slot(Sent0), Slot(Kept1)), Believed(copies)), Slot(Sent0), Slot(Kept1)))),
    ];

    private static BoundExpression Accepted(int copies, int own, int bit, int set, string cap) => And(
        AtLeast(Size(Slot(set)), Times("0.25", copies)),
        AtMost(Size(Slot(set)), Times(cap, copies)),
        AtMost(Share(Same(Slot(own), Slot(bit)), Slot(set)), Of("0.06")));

    private static BoundExpression Believed(int copies) => And(
        AtLeast(Size(Slot(Clean)), Times("0.075", copies)),
        AtMost(Share(Differ(Slot(R1), Of(2)), Slot(Clean)), Of("0.25")));

    private static BoundExpression Times(string share, int copies) => Binary(BinaryOperator.Times, Of(share), Of(copies));
}
