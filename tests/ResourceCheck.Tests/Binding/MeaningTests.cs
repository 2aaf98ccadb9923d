using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using Xunit;

namespace ResourceCheck.Tests.Binding;

/// <summary>What names mean in right scripts.</summary>
public sealed class MeaningTests
{
    [Fact]
    public void A_bare_name_is_ones_own_value_before_a_received_one()
    {
        Protocol protocol = Bound.Right(Bound.Three("round \"r\"\n  Ada, Ben pick v from 0, 1\n  Ada announces v\n  Ben set own to v\n  Ben set hers to Ada.v\n  Cyd set got to v\nend"));
        SlotInfo[] read = [.. protocol.Steps.OfType<SetStep>().Select(s => protocol.Slots[Assert.IsType<BoundSlot>(s.Value).Slot])];
        Assert.Equal([(1, SlotKind.Pick), (0, SlotKind.Message), (0, SlotKind.Message)], read.Select(r => (r.Party, r.Kind)));
    }

    [Fact]
    public void A_name_made_in_either_branch_is_one_slot()
    {
        Protocol protocol = Bound.Right(Bound.Three(
            "round \"r\"\n  Ada measures level as a\n  Ada announces a\n  when Ada.a = 0\n    Ben measures level as b\n  otherwise\n    Ben measures fourier as b\n  end\n  Ben announces b\n  Cyd apply shift(b)\nend"));
        WhenStep when = Assert.Single(protocol.Steps.OfType<WhenStep>());
        Assert.Equal(Assert.IsType<MeasureStep>(Assert.Single(when.Then)).Slot, Assert.IsType<MeasureStep>(Assert.Single(when.Otherwise)).Slot);
    }

    [Fact]
    public void Messages_to_different_parties_in_two_branches_stay_apart()
    {
        Protocol protocol = Bound.Right(Bound.Three(
            "round \"r\"\n  Ada pick a from 0, 1\n  when a = 0\n    Ada send 1 as w to Ben\n  otherwise\n    Ada send 2 as w to Ben, Cyd\n  end\n  Ben set got to Ada.w\n  Cyd set got to Ada.w\nend"));
        WhenStep when = Assert.Single(protocol.Steps.OfType<WhenStep>());
        int toBen = Assert.IsType<SendStep>(when.Then[0]).Slot, toBoth = Assert.IsType<SendStep>(when.Otherwise[0]).Slot;
        Value[] slots = [.. Enumerable.Repeat(Value.None, protocol.Slots.Count)];
        slots[toBen] = Value.Of(1);
        Assert.NotEqual(toBen, toBoth);
        Assert.Equal(["1", "none"], protocol.Steps.OfType<SetStep>().Select(s => ValueEvaluator.Evaluate(s.Value, slots, 3).ToString()));
    }

    [Fact]
    public void A_condition_on_parameters_alone_is_decided_here()
    {
        const string Text = "parameter x = 0 in {0, 1}\nparties Ada, Ben\nresource antisymmetric on all\nround \"r\"\n  when x = 1\n    Ada measures level as v\n  otherwise\n    Ada measures fourier as v\n  end\nend\nsuccess when Ada.v = 0\n";
        Assert.Equal(BasisKind.Level, Basis(Bound.Right(Text, ("x", 1))));
        Assert.Equal(BasisKind.Fourier, Basis(Bound.Right(Text)));

        static BasisKind Basis(Protocol p) => Assert.IsType<BasisValue>(Assert.IsType<BoundLiteral>(Assert.IsType<MeasureStep>(Assert.Single(p.Steps)).Basis).Value).Kind;
    }

    [Fact]
    public void Keep_may_use_what_all_announce()
    {
        Protocol protocol = Bound.Right(Bound.Three("round \"r\"\n  all pick b from level, fourier\n  all announce b\n  keep when same(b of all)\nend"));
        Assert.Single(protocol.Steps.OfType<KeepStep>());
        Assert.Equal(["S036"], Bound.Codes(Bound.Three("round \"r\"\n  all pick b from level, fourier\n  Ada, Ben announce b\n  keep when same(b of all)\nend")));
    }

    [Fact]
    public void Over_reads_the_condition_as_each_party_sees_it()
    {
        Protocol protocol = Bound.Right("parties Ada, Ben, Cyd\nresource antisymmetric on all\nround \"r\"\n  all measure level as v\n  Ada pick g from 0, 1\n  Ada announces g\nend\nsuccess when count(v = g over all) = 1\n");
        BoundCall count = Assert.IsType<BoundCall>(Assert.IsType<BoundBinary>(protocol.Success).Left);
        Assert.Equal([0, 1, 2], count.Arguments.Select(a => protocol.Slots[Assert.IsType<BoundSlot>(Assert.IsType<BoundBinary>(a).Left).Slot].Party));
    }

    [Fact]
    public void A_broken_requirement_is_told_with_its_figures_and_is_no_error()
    {
        Requirement requirement = Assert.Single(Bound.Right("parameter a = 0.25 in 0 to 1\nparties Ada, Ben\nresource antisymmetric on all\nrequire a > 1/3 and a < 0.5, \"too small\"\nsuccess when true\n").Requirements);
        Assert.False(requirement.Holds);
        Assert.Equal("0.25 > 1/3 and 0.25 < 0.5", requirement.Figures);
        Assert.Equal("a > 1/3 and a < 0.5", requirement.Text);
    }

    [Fact]
    public void Given_parameters_are_held_to_name_and_domain()
    {
        const string Text = "parameter number = 4 in 3..12\nparties P[1..number]\nresource antisymmetric on all\nsuccess when true\n";
        Assert.Equal(7, Bound.Right(Text, ("number", 7)).Parties.Count);
        Assert.Equal(["S060"], Bound.Codes(Text, ("number", 13)));
        Assert.Equal(["S060"], Bound.Codes(Text, ("number", Rational.From(7, 2))));
        Assert.Contains("did you mean number?", Assert.Single(Bound.From("x", Text, ("numbr", 4)).Findings).Cure);
    }

    [Fact]
    public void Figures_claims_and_goals_are_resolved()
    {
        Protocol protocol = Bound.Right(
            "parameter n = 3 in 2..5\nparties P[1..n]\nresource antisymmetric on all\ncheckpoint \"start\": fidelity with antisymmetric on all\nround \"r\"\n  all measure level as v\nend\nsuccess when distinct(v of all)\n"
            + "report \"one\" = guess(P[1].v from v of P[2..n])\nreport \"two\" = 1 - entropy(\"one\") + mean(P[1].v given P[2].v = 0)\nclaim \"one\" = 1/n\nclaim \"start\" >= 1\ngoal \"arrived\" >= 1 - 0.1\n");
        Assert.Equal(2, Assert.IsType<GuessFigure>(protocol.Reports[0].Figure).Known.Count);
        Assert.Equal(1.0 / 3, Assert.IsType<NumberFigure>(protocol.Claims[0].Right).Value);
        Assert.Equal("\"one\" = 1/n", protocol.Claims[0].Text);
        Assert.Equal((MetricKind.Checkpoint, 0.9), (protocol.Goals[0].Metric.Kind, protocol.Goals[0].Threshold));
    }

    [Fact]
    public void Mentioning_none_anywhere_means_the_script_handles_it()
    {
        Assert.False(Bound.Right(Bound.Three("")).HandlesNone);
        Assert.True(Bound.Right("parties Ada, Ben\nresource antisymmetric on all\nround \"r\"\n  all measure level as v\nend\nsuccess when Ada.v != none\n").HandlesNone);
    }

    [Fact]
    public void Knowledge_tells_line_by_line_who_learns_what()
    {
        KnowledgeLine[] lines = [.. Knowledge.Of(Bound.Right(Bound.Three("input x of Ben in {0, 1}\nround \"r\"\n  Cyd measures fourier as k # leaves\n  Cyd announces k\n  all set w to 1\nend")))];
        Assert.Equal(
            [(3, "input x of Ben in {0, 1}", "Ben knows x"), (5, "Cyd measures fourier as k", "Cyd knows k"), (6, "Cyd announces k", "Ada, Ben learn Cyd.k"), (7, "all set w to 1", "Ada, Ben, Cyd each know their own w")],
            lines.Select(l => (l.Line, l.Statement, l.Learned)));
    }

    [Fact]
    public void Sending_the_same_value_again_is_no_second_meaning() =>
        Assert.Empty(Bound.Codes(Bound.Three("round \"r\"\n  Cyd measures fourier as k\n  Cyd sends k to Ada\n  Cyd announces k\n  Ada, Ben apply complement(fourier, k)\nend")));

    [Fact]
    public void A_requirement_that_divides_by_zero_at_these_values_is_broken_not_wrong()
    {
        Requirement requirement = Assert.Single(Bound.Right("parameter a = 1 in 0 to 1\nparties Ada, Ben\nresource antisymmetric on all\nrequire 1/(a - 1) < 3, \"no room\"\nsuccess when true\n").Requirements);
        Assert.False(requirement.Holds);
        Assert.Equal("none < 3", requirement.Figures);
        Assert.Equal(["S055"], Bound.Codes("parameter n = 2 in 2..3\nparties P[1..n]\nresource antisymmetric on all\nsuccess when true\nclaim success >= 1/(n - 2)\n"));
    }

    [Fact]
    public void What_parameters_switch_off_need_not_exist()
    {
        const string Text = "parameter n = 3 in 3..4\nparties P[1..n]\nresource antisymmetric on all\nround \"r\"\n  all measure level as v\n  when n > 3\n    P[4] set w to 1\n  end\nend\nsuccess when (if n > 3 then P[4].v else P[3].v) = 0\n";
        Assert.Equal(2, Assert.IsType<BoundSlot>(Assert.IsType<BoundBinary>(Bound.Right(Text).Success).Left).Slot);
        Assert.Equal(3, Assert.IsType<BoundSlot>(Assert.IsType<BoundBinary>(Bound.Right(Text, ("n", 4)).Success).Left).Slot);
    }

    [Fact]
    public void A_message_in_one_branch_is_known_only_as_that_message_afterwards()
    {
        Protocol protocol = Bound.Right(Bound.Three(
            "round \"r\"\n  Ada pick a from 0, 1\n  Ada pick c from 0, 1\n  Ada announces c\n  when Ada.c = 0\n    Ada announces a\n  end\n  Ben set got to Ada.a\nend"));
        int read = Assert.IsType<BoundSlot>(Assert.Single(protocol.Steps.OfType<SetStep>()).Value).Slot;
        Assert.Equal(SlotKind.Message, protocol.Slots[read].Kind);
        Assert.Equal(["S036"], Bound.Codes(Bound.Three(
            "round \"r\"\n  Ada pick a from 0, 1\n  Ada pick c from 0, 1\n  Ada announces c\n  when Ada.c = 0\n    Ada announces a\n  end\n  keep when Ada.a = 0\nend")));
    }
}
