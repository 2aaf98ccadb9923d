using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Binding.Lists;

/// <summary>What cheating strategies mean in right scripts.</summary>
public sealed class DishonestMeaningTests
{
    private const string Removal = """
        parties Ada, Ben, Cyd
        resource antisymmetric on all
        round "Cyd leaves"
          Cyd measures fourier as k
          Cyd announces k
          Ada, Ben apply complement(fourier, k)
        end
        checkpoint "after": fidelity with antisymmetric on Ada, Ben
        round "look"
          Ada, Ben measure level as v
        end
        success when distinct(Ada.v, Ben.v)

        """;

    [Fact]
    public void A_leaver_may_announce_another_outcome_and_the_others_act_on_it()
    {
        DishonestCase strategy = Only(Removal + "dishonest \"wrong\" by Cyd\n  choose o in 1..2\n  instead of \"Cyd leaves\"\n    Cyd measures fourier as k\n    Cyd announces (k + o) mod 3 as k\n  end\n  harm when Ada.v = Ben.v\nend\n", out Protocol protocol);
        Assert.Null(strategy.ListSteps);
        Assert.Equal(["MeasureStep", "SendStep", "ApplyStep", "ApplyStep", "CheckpointStep", "MeasureStep", "MeasureStep"], strategy.CopySteps.Select(s => s.GetType().Name));
        SendStep lie = Assert.Single(strategy.CopySteps.OfType<SendStep>());
        Assert.Contains(BoundWalk.Within(lie.Value), e => e is BoundChoice { Choice: 0 });
        Assert.All(strategy.CopySteps.OfType<ApplyStep>(), a => Assert.Equal(lie.Slot, Assert.IsType<BoundSlot>(a.Unitary.First).Slot));
        Assert.Equal(protocol.Steps.OfType<MeasureStep>().Skip(1).Select(m => m.Slot), strategy.CopySteps.OfType<MeasureStep>().Skip(1).Select(m => m.Slot));
    }

    [Fact]
    public void A_party_may_hide_its_outcome()
    {
        const string Draw = "parties Ada, Ben, Cyd\nresource antisymmetric on all\nround \"draw\"\n  all measure level as v\n  all announce v\nend\nsuccess when count(v = 0 over all) = 1\n";
        DishonestCase strategy = Only(Draw + "dishonest \"no click\" by Ben\n  instead of \"draw\"\n    Ben measures level as seen\n    Ben sets v to if seen = 0 then none else seen\n    Ben announces v\n  end\n  harm when Ben.seen = 0 and Ada.v != 0\nend\n", out Protocol protocol);
        Assert.False(protocol.HandlesNone);
        Assert.Equal([1, 0, 2], strategy.CopySteps.OfType<MeasureStep>().Select(m => m.Party));
    }

    [Fact]
    public void Lines_of_others_and_their_own_lines_elsewhere_stay()
    {
        DishonestCase strategy = Only(Removal + "dishonest \"late\" by Ada\n  instead of \"look\"\n    Ada measures fourier as v\n  end\n  harm when Ada.v = Ben.v\nend\n", out Protocol protocol);
        Assert.Equal(protocol.Steps.Count, strategy.CopySteps.Count);
        Assert.Equal(protocol.Steps.Where((_, i) => i != 5).Select(Written), strategy.CopySteps.Where((_, i) => i != 5).Select(Written));
        Assert.NotEqual(Written(protocol.Steps[5]), Written(strategy.CopySteps[5]));
    }

    [Fact]
    public void Lines_before_a_block_are_added_to_it()
    {
        DishonestCase strategy = Only(Removal + "dishonest \"turn\" by Cyd\n  before \"Cyd leaves\"\n    Cyd applies shift(1)\n  end\n  harm when Ada.v = Ben.v\nend\n", out Protocol protocol);
        Assert.IsType<ApplyStep>(strategy.CopySteps[0]);
        Assert.Equal(protocol.Steps.Select(Written), strategy.CopySteps.Skip(1).Select(Written));
    }

    [Fact]
    public void Parties_that_cheat_together_know_what_either_knows()
    {
        const string Rest = "discussion \"d\"\n  Ada sets J to where(v = 0)\n  Ada sends J to Ben\nend\nsuccess when size(Ben.J) > 0\n";
        const string Lines = "  before \"d\"\n    Ben sets K to where(v = 0 and Ada.v = x)\n  end\n  harm when size(Ben.K) > 0\nend\n";
        DishonestCase strategy = Only(ListMeaningTests.Lists(Rest + "dishonest \"both\" by Ada, Ben\n" + Lines), out Protocol protocol);
        int[] read = [.. BoundWalk.Slots(Assert.IsType<SetStep>(strategy.ListSteps![0]).Value)];
        Assert.Equal([1, 0, 0], read.Select(s => protocol.Slots[s].Party));
        Assert.Equal(["S031", "S031"], Bound.Codes(ListMeaningTests.Lists(Rest + "dishonest \"alone\" by Ben\n" + Lines)));
    }

    [Fact]
    public void A_range_may_depend_on_what_the_cheat_holds_and_chose_before()
    {
        DishonestCase strategy = Only(ListMeaningTests.Lists(
            "discussion \"d\"\n  Ada sets J to where(v = 0)\n  Ada sends J to Ben\nend\nsuccess when size(Ben.J) > 0\n"
            + "dishonest \"part\" by Ada\n  choose k in 0..size(where(v = 0))\n  choose l in k..M/3\n  choose r in 0 to 1\n  instead of \"d\"\n    Ada sends some(k of where(v = 0)) or some(l + r of where(v = 1)) as J to Ben\n  end\n  harm when size(Ben.J) > k\nend\n"), out _);
        Assert.Equal(["k", "l", "r"], strategy.Choices.Select(c => c.Name));
        Assert.IsType<BoundSize>(strategy.Choices[0].To);
        Assert.Equal(0, Assert.IsType<BoundChoice>(strategy.Choices[1].From).Choice);
        Assert.Equal([true, true, false], strategy.Choices.Select(c => c.Whole));
        Assert.Contains(BoundWalk.Within(strategy.Harm), e => e is BoundChoice { Choice: 0 });
    }

    [Fact]
    public void A_lie_to_each_party_is_a_message_of_its_own()
    {
        DishonestCase strategy = Only(ListMeaningTests.Lists(
            "discussion \"d\"\n  Ada sends x to Ben, Cyd\n  Ben, Cyd set got to Ada.x\nend\nsuccess when Ben.got = Cyd.got\n"
            + "dishonest \"split\" by Ada\n  instead of \"d\"\n    Ada sends 0 as x to Ben\n    Ada sends 1 as x to Cyd\n  end\n  harm when Ben.got != Cyd.got\nend\n"), out Protocol protocol);
        Assert.Equal(
            strategy.ListSteps!.OfType<SendStep>().Select(s => s.Slot),
            strategy.ListSteps!.OfType<SetStep>().Select(s => Assert.IsType<BoundSlot>(s.Value).Slot));
        Assert.All(strategy.ListSteps!.OfType<SendStep>(), s => Assert.True(s.Slot >= protocol.Lists!.CopySlots));
    }

    [Fact]
    public void A_when_in_which_only_the_cheat_acted_is_gone_and_its_lines_stand_in_front()
    {
        DishonestCase strategy = Only(ListMeaningTests.Lists(
            "discussion \"d\"\n  Ada sends x to Ben\n  when size(where(Cyd.v = 0)) > 3\n    Ben sets got to Ada.x\n  end\nend\nsuccess when Ben.got = x\n"
            + "dishonest \"liar\" by Ben\n  instead of \"d\"\n    Ben sets got to 1 - x\n  end\n  harm when Ben.got != x\nend\n"), out Protocol protocol);
        Assert.Equal(["SendStep", "WhenStep"], protocol.Lists!.Steps.Select(s => s.GetType().Name));
        Assert.Equal(["SendStep", "SetStep"], strategy.ListSteps!.Select(s => s.GetType().Name));
    }

    [Fact]
    public void Every_turn_of_a_loop_is_replaced_when_its_title_is_named_as_written()
    {
        const string Loop = "parties P[1..4]\nresource antisymmetric on all\nfor m from 4 down to 3\n  round \"P[{m}] leaves\"\n    P[m] measures fourier on m as k\n    P[m] announces k\n    P[1..m-1] apply complement(fourier on m, k)\n  end\nend\nsuccess when true\n";
        DishonestCase one = Only(Loop + "dishonest \"one\" by P[4]\n  instead of \"P[4] leaves\"\n    P[4] measures level as k\n    P[4] announces k\n  end\n  harm when true\nend\n", out _);
        DishonestCase all = Only(Loop + "dishonest \"all\" by P[3], P[4]\n  instead of \"P[{m}] leaves\"\n    P[m] measures level as k\n    P[m] announces k\n  end\n  harm when true\nend\n", out _);
        Assert.Equal(1, Levels(one));
        Assert.Equal(2, Levels(all));

        static int Levels(DishonestCase c) => c.CopySteps.OfType<MeasureStep>().Count(m => m.Basis is BoundLiteral { Value: BasisValue { Kind: ResourceCheck.Scripts.Syntax.BasisKind.Level } });
    }

    [Fact]
    public void Harms_are_metrics_of_goals_and_claims_and_hardware_may_be_perfect()
    {
        Protocol protocol = Bound.Right(Removal + "dishonest \"late\" by Ada\n  perfect hardware\n  instead of \"look\"\n    Ada measures fourier as v\n  end\n  harm when Ada.v = Ben.v\nend\ngoal harm \"late\" <= 0.1\nclaim harm \"late\" >= 0\n");
        Assert.True(Assert.Single(protocol.Dishonest).PerfectHardware);
        Assert.Equal(new MetricName(MetricKind.Harm, "late"), Assert.Single(protocol.Goals).Metric);
        Assert.Equal(new MetricName(MetricKind.Harm, "late"), Assert.IsType<MetricFigure>(Assert.Single(protocol.Claims).Left).Metric);
    }

    [Fact]
    public void The_honest_case_does_not_change_when_a_cheat_is_added()
    {
        Protocol without = Bound.Right(Removal), with = Bound.Right(Removal + "dishonest \"x\" by Cyd\n  instead of \"Cyd leaves\"\n    Cyd measures level as k\n    Cyd announces none as k\n  end\n  harm when Ada.v = Ben.v\nend\n");
        Assert.Equal(without.Steps.Count, with.Steps.Count);
        Assert.Equal(without.Slots, with.Slots.Take(without.Slots.Count));
        Assert.Equal(without.HandlesNone, with.HandlesNone);
    }

    private static (Type, ResourceCheck.Scripts.Span, int?) Written(Step step) => (step.GetType(), step.Span, step switch { MeasureStep s => s.Slot, SendStep s => s.Slot, _ => null });

    private static DishonestCase Only(string text, out Protocol protocol)
    {
        protocol = Bound.Right(text);
        return Assert.Single(protocol.Dishonest);
    }
}
