using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using Xunit;

namespace ResourceCheck.Tests.Binding;

/// <summary>Loops, families and collective words unroll to the steps that the script says.</summary>
public sealed class UnrollingTests
{
    private const string Chain = """
        protocol "Removal down to a pair"
        parameter n = 4 in 3..12
        parties P[1..n]
        resource antisymmetric on all
        for m from n down to 3
          round "one leaves"
            P[m] measures fourier on m as k
            P[m] announces k
            P[1..m-1] apply complement(fourier on m, k)
          end
          checkpoint "after {m}": fidelity with antisymmetric on P[1..m-1]
        end
        checkpoint "pair": fidelity with antisymmetric on P[1], P[2]
        success when true
        claim "pair" = 1
        goal "after 3" >= 0.9
        """;

    [Property]
    public Property A_chain_of_n_parties_unrolls_to_one_turn_per_leaver() => Prop.ForAll(Gen.Choose(3, 12).ToArbitrary(), n =>
    {
        Protocol protocol = Bound.Right(Chain, ("n", n));
        int turns = n - 2;
        Assert.Equal(n, protocol.Levels);
        Assert.Equal(Enumerable.Range(3, turns).Reverse().Select(m => m - 1), protocol.Steps.OfType<MeasureStep>().Select(s => s.Party));
        Assert.Equal(turns, protocol.Steps.OfType<SendStep>().Count(s => s.Announced && s.Recipients.Count == n - 1));
        Assert.Equal(Enumerable.Range(3, turns).Sum(m => m - 1), protocol.Steps.OfType<ApplyStep>().Count());
        Assert.Equal(turns + 1, protocol.Steps.OfType<CheckpointStep>().Count());
        Assert.Equal(2 * turns, protocol.Slots.Count);
    });

    [Fact]
    public void Everyone_who_stays_acts_on_the_message_of_this_turn()
    {
        Protocol protocol = Bound.Right(Chain, ("n", 4));
        foreach (ApplyStep apply in protocol.Steps.OfType<ApplyStep>())
        {
            int message = Assert.IsType<BoundSlot>(apply.Unitary.First).Slot;
            Assert.Equal(SlotKind.Message, protocol.Slots[message].Kind);
            Assert.Equal(protocol.Slots[message].Party, protocol.Steps.OfType<MeasureStep>().Last(m => protocol.Steps.ToList().IndexOf(m) < protocol.Steps.ToList().IndexOf(apply)).Party);
        }
    }

    [Fact]
    public void A_passed_range_runs_no_turn_and_an_empty_family_does_nothing()
    {
        Protocol protocol = Bound.Right("parties P[1..3]\nresource antisymmetric on all\nfor m from 1 down to 2\n  round \"never\"\n    P[9] wait 1 us\n  end\nend\n"
            + "round \"empty\"\n  P[1..0] apply shift(1)\nend\nsuccess when true\n");
        Assert.Empty(protocol.Steps);
    }

    [Fact]
    public void Others_are_those_not_named_in_the_round_who_still_hold_a_qudit()
    {
        Protocol protocol = Bound.Right(Bound.Three(
            "round \"one\"\n  Ada measures level as a\n  others apply shift(1)\nend\nround \"two\"\n  Ben apply shift(1)\n  others apply clock(1)\n  others apply clock(2)\nend"));
        Assert.Equal([1, 2, 1, 2, 2], protocol.Steps.OfType<ApplyStep>().Select(s => s.Party));
    }

    [Fact]
    public void All_means_holders_for_quantum_lines_and_insiders_for_classical_ones()
    {
        Protocol protocol = Bound.Right(
            "parties Ada, Ben, Cyd, Ref\noutsider Eve\nresource antisymmetric on Ada, Ben, Cyd\nround \"one\"\n  Ada measures level as a\n  all measure level as v\n  all set w to 1\n  Ada announces a\nend\nsuccess when true\n");
        Assert.Equal([0, 1, 2], protocol.Steps.OfType<MeasureStep>().Select(s => s.Party));
        Assert.Equal([0, 1, 2, 3], protocol.Steps.OfType<SetStep>().Select(s => s.Party));
        Assert.Equal([1, 2, 3, 4], Assert.Single(protocol.Steps.OfType<SendStep>()).Recipients);
        Assert.Equal([4], protocol.Outsiders);
    }

    [Fact]
    public void Too_many_turns_are_refused_before_any_is_made() =>
        Assert.Equal(["S064"], Bound.Codes(Bound.Three("for m from 1 up to 2000000000\n  round \"r\"\n    Ada wait 1 us\n  end\nend")));
}
