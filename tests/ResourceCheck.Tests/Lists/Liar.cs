using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using static ResourceCheck.Tests.Lists.Terms;

namespace ResourceCheck.Tests.Lists;

/// <summary>Liar detection as bound trees: A. Cabello, Phys. Rev. Lett. 89, 100402 (2002), with thresholds. C's verdict: 0 agreement, 1 A lied, 2 B lied.</summary>
internal static class Liar
{
    private const int A = 0, B = 1, C = 2, M = 3, BitB = 4, SetB = 5, BitC = 6, SetC = 7, KeptB = 8, Told = 9, Shown = 10, KeptC = 11, Evidence = 12, Verdict = 13, Slots = 14;

    public static ListTask Honest(int copies, IReadOnlyList<CopyType> law, int m = 0) => new()
    {
        Protocol = Protocol(copies, Slots, Same(Slot(Verdict), Of(0)), [.. Sending, .. Rest(copies, Forwarding)]),
        Copies = law,
        Inputs = [Value.Of(m)],
    };

    /// <summary>A sends 0 to B and 1 to C; choices n, k1, k2, o and the size of C's set.</summary>
    public static ListTask SenderLies(int copies, IReadOnlyList<CopyType> law, params int[] choices) =>
        Cheating(Honest(copies, law), 0, [.. Splitting, .. Rest(copies, Forwarding)], Same(Slot(Verdict), Of(2)), choices);

    /// <summary>B tells C the other bit with a forged set; choices: its size, and how many of its positions have b = m.</summary>
    public static ListTask ForwarderLies(int copies, IReadOnlyList<CopyType> law, params int[] choices) =>
        Cheating(Honest(copies, law), 1, [.. Sending, .. Rest(copies, Forging)], Same(Slot(Verdict), Of(1)), choices);

    private static ListTask Cheating(ListTask honest, int by, IReadOnlyList<Step> steps, BoundExpression harm, int[] choices) => honest with
    {
        Case = new DishonestCase("cheat", [by], [.. choices.Select((_, i) => new Choice($"c{i}", Of(0), Of(honest.Protocol.Lists!.Copies), true))], [], steps, harm),
        Choices = [.. choices.Select(Value.Of)],
        HoldsEnough = true,
    };

    private static Step[] Sending => [Send(0, BitB, Slot(M)), Send(0, BitC, Slot(M)), Send(0, SetB, Where(A, Slot(M))), Send(0, SetC, Where(A, Slot(M)))];

    private static Step[] Splitting =>
    [
        Send(0, BitB, Of(0)),
        Send(0, BitC, Of(1)),
        Send(0, SetB, Or(
            Some(Minus(Minus(Choice(0), Choice(1)), Choice(2)), Where(A, Of(0))), Some(Choice(1), Where(A, Of(1))), Some(Choice(2), Where(A, Of(2))))),
        Send(0, SetC, Or(
            Some(Choice(3), And(Slot(SetB), Where(A, Of(0)))), Some(Minus(Choice(4), Choice(3)), Without(Where(A, Of(1)), Slot(SetB))))),
    ];

    private static Step[] Forwarding => [Send(1, Told, Slot(KeptB)), Send(1, Shown, Slot(SetB))];

    private static Step[] Forging =>
    [
        Send(1, Told, Minus(Of(1), Slot(M))),
        Send(1, Shown, Or(
            Some(Choice(1), Without(Where(B, Slot(M)), Slot(SetB))),
            Some(Minus(Choice(0), Choice(1)), Without(Where(B, Minus(Of(1), Slot(M))), Slot(SetB))))),
    ];

    private static Step[] Rest(int copies, Step[] forwarding) =>
    [
        Set(1, KeptB, If(Accepted(copies, B, BitB, SetB), Slot(BitB), None)),
        .. forwarding,
        Set(2, KeptC, If(Accepted(copies, C, BitC, SetC), Slot(BitC), None)),
        Set(2, Evidence, Without(Slot(Shown), Slot(SetC))),
        Set(2, Verdict, If(
            Or(Same(Slot(Told), None), Same(Slot(KeptC), None)), Of(1), If(
            Same(Slot(Told), Slot(KeptC)), Of(0), If(Proved(copies), Of(1), Of(2))))),
    ];

    private static BoundExpression Accepted(int copies, int own, int bit, int set) => And(
        AtLeast(Size(Slot(set)), Times("0.25", copies)),
        AtMost(Size(Slot(set)), Times("0.42", copies)),
        AtMost(Share(Same(Slot(own), Slot(bit)), Slot(set)), Of("0.05")));

    private static BoundExpression Proved(int copies) => And(
        AtLeast(Size(Slot(Evidence)), Times("0.1", copies)),
        AtMost(Share(Same(Slot(C), Slot(Told)), Slot(Evidence)), Of("0.14")),
        AtLeast(Share(Same(Slot(C), Of(2)), Slot(Evidence)), Of("0.3")));

    private static BoundExpression Times(string share, int copies) => Binary(BinaryOperator.Times, Of(share), Of(copies));
}
