using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using Xunit;

namespace ResourceCheck.Tests.Binding.Lists;

/// <summary>What lists, discussions and sets of positions mean in right scripts.</summary>
public sealed class ListMeaningTests
{
    public static TheoryData<string> Scripts => ["detectable-broadcast", "liar-detection"];

    [Theory]
    [MemberData(nameof(Scripts))]
    public void A_list_protocol_has_its_rounds_values_first_and_its_thresholds_hold(string name)
    {
        Protocol protocol = Bound.Right(Text(name));
        ListProtocol lists = Assert.IsType<ListProtocol>(protocol.Lists);
        Assert.Equal(150, lists.Copies);
        Assert.Equal(3, lists.CopySlots);
        Assert.All(protocol.Slots.Take(3), s => Assert.Equal("v", s.Name));
        Assert.All(protocol.Requirements, r => Assert.True(r.Holds, r.Text));
        Assert.All(protocol.Inputs, i => Assert.Equal(SlotKind.Input, protocol.Slots[i.Slot].Kind));
        Assert.False(protocol.HandlesNone);
        Assert.Equal(2, protocol.Dishonest.Count);
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void A_list_protocol_is_in_its_one_shape(string name)
    {
        var (tree, findings) = Script.Parse(new SourceText(name, Text(name)));
        Assert.Empty(findings);
        Assert.Equal(Text(name), Script.Print(tree));
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Discussions_follow_one_another_without_a_gap(string name)
    {
        ListProtocol lists = Bound.Right(Text(name)).Lists!;
        Assert.Equal(0, lists.Blocks[0].First);
        Assert.All(lists.Blocks.Zip(lists.Blocks.Skip(1)), pair => Assert.Equal(pair.First.First + pair.First.Count, pair.Second.First));
        Assert.Equal(lists.Steps.Count, lists.Blocks[^1].First + lists.Blocks[^1].Count);
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Only_lines_of_the_cheat_differ_from_the_honest_steps(string name)
    {
        Protocol protocol = Bound.Right(Text(name));
        foreach (DishonestCase strategy in protocol.Dishonest)
        {
            Assert.Equal(protocol.Steps.Select(Written(protocol)), strategy.CopySteps.Select(Written(protocol)));
            Assert.Equal(Honest(protocol, protocol.Lists!.Steps, strategy), Honest(protocol, strategy.ListSteps!, strategy));
            Assert.NotEqual(protocol.Lists!.Steps.Select(Written(protocol)), strategy.ListSteps!.Select(Written(protocol)));
        }
    }

    [Theory]
    [InlineData("a", "0.34", "a < 1 / 3 and 1 / 3 < c")]
    [InlineData("b", "0.09", "b < a / 2 - t1 * (a + c)")]
    [InlineData("t2", "0.5", "t2 < 1 / 2")]
    [InlineData("t1", "0.2", "2 * t1 / (1 - 2 * t1 * c / a) < t2")]
    public void A_bad_threshold_breaks_the_requirement_it_belongs_to(string parameter, string value, string broken)
    {
        Assert.True(Rational.TryParse(value, out Rational number));
        Assert.Contains(broken, Bound.Right(Text("detectable-broadcast"), (parameter, number)).Requirements.Where(r => !r.Holds).Select(r => r.Text));
    }

    [Fact]
    public void A_predicate_reads_the_actors_own_list_and_its_single_values()
    {
        Protocol protocol = Bound.Right(Lists("discussion \"d\"\n  Ada sets bit to x\n  Ada sets J to where(v = bit)\nend\nsuccess when size(Ada.J) > 3"));
        BoundWhere where = Assert.IsType<BoundWhere>(Assert.IsType<SetStep>(protocol.Lists!.Steps[1]).Value);
        int[] read = [.. BoundWalk.Slots(where)];
        Assert.Equal([("v", true), ("bit", false)], read.Select(s => (protocol.Slots[s].Name, s < protocol.Lists.CopySlots)));
        Assert.Equal(0, protocol.Slots[read[0]].Party);
    }

    [Fact]
    public void A_list_announced_in_a_round_is_known_to_all()
    {
        Protocol protocol = Bound.Right(Lists("discussion \"d\"\n  Ben sets J to where(v = Cyd.v)\nend\nsuccess when size(Ben.J) = 0"));
        int[] read = [.. BoundWalk.Slots(Assert.IsType<SetStep>(protocol.Lists!.Steps[0]).Value)];
        Assert.Equal([SlotKind.Outcome, SlotKind.Message], read.Select(s => protocol.Slots[s].Kind));
        Assert.All(read, s => Assert.True(s < protocol.Lists.CopySlots));
    }

    [Fact]
    public void Sets_join_meet_and_lose_positions_and_truth_values_still_combine()
    {
        Protocol protocol = Bound.Right(Lists("discussion \"d\"\n  Ada sets J to where(v = 0 or v = 1) and where(v != 0) minus some(2 of where(true))\nend\nsuccess when size(Ada.J) > 3 and share(Ada.v = Ben.v in Ada.J) = 0"));
        BoundBinary meet = Assert.IsType<BoundBinary>(Assert.IsType<SetStep>(protocol.Lists!.Steps[0]).Value);
        Assert.Equal(BinaryOperator.And, meet.Operator);
        Assert.Equal(BinaryOperator.Without, Assert.IsType<BoundBinary>(meet.Right).Operator);
        BoundTally share = BoundWalk.Within(protocol.Success).OfType<BoundTally>().Single();
        Assert.True(share.IsShare);
        Assert.Equal([0, 1], BoundWalk.Slots(share.Predicate).Select(s => protocol.Slots[s].Party));
    }

    [Fact]
    public void The_referee_counts_over_parties_inside_a_condition_on_copies()
    {
        Protocol protocol = Bound.Right(Lists("success when count(count(v = 0 over all) = 1 in where(true)) = M\nreport \"zeros\" = mean(size(where(Ada.v = 0)))\nreport \"seen\" = information(size(where(Ada.v = 0)); size(where(Ben.v = 0)))"));
        Assert.Equal(3, BoundWalk.Within(protocol.Success).OfType<BoundCall>().Single().Arguments.Count);
        MeanFigure mean = Assert.IsType<MeanFigure>(protocol.Reports[0].Figure);
        Assert.Equal(0, protocol.Slots[BoundWalk.Slots(mean.Value).Single()].Party);
    }

    [Fact]
    public void None_in_a_single_value_says_nothing_about_clicks()
    {
        Assert.False(Bound.Right(Lists("discussion \"d\"\n  Ada sets y to if size(where(v = 0)) > 3 then x else none\nend\nsuccess when Ada.y != none")).HandlesNone);
        Assert.True(Bound.Right(Lists("success when size(where(Ada.v = none)) = 0")).HandlesNone);
        Assert.True(Bound.Right(Lists("discussion \"d\"\n  Ada sets y to size(where(v = none))\nend\nsuccess when Ada.y = 0")).HandlesNone);
    }

    [Fact]
    public void Copies_follow_a_parameter()
    {
        Assert.Equal(60, Bound.Right(Lists("success when true"), ("M", 60)).Lists!.Copies);
        Assert.Null(Bound.Right(Bound.Three("")).Lists);
    }

    [Fact]
    public void Knowledge_goes_on_into_the_discussions()
    {
        KnowledgeLine[] lines = [.. Knowledge.Of(Bound.Right(Text("liar-detection")))];
        Assert.Contains(lines, l => l.Statement == "A sends bit, J to B, C" && l.Learned == "B, C learn A.bit and A.J");
        Assert.Contains(lines, l => l.Statement == "B, C set accepted to size(J) >= a * M and size(J) <= c * M and count(v = bit in J) <= t1 * size(J)");
        Assert.Contains(lines, l => l.Statement == "B sends bit, J to C" && l.Learned == "C learns B.bit and B.J");
    }

    [Fact]
    public void A_discussion_may_stand_in_a_loop()
    {
        Protocol protocol = Bound.Right(Lists("for l from 0 up to 2\n  discussion \"level {l}\"\n    Ada sets J to where(v = l)\n    Ada sends J to Ben\n  end\nend\nsuccess when true"));
        Assert.Equal(["level 0", "level 1", "level 2"], protocol.Lists!.Blocks.Select(b => b.Title));
        Assert.Equal(6, protocol.Lists.Steps.Count);
        Assert.Empty(protocol.Steps.OfType<SetStep>());
    }

    internal static string Lists(string rest) =>
        "parameter M = 30 in 1..500\nparties Ada, Ben, Cyd\ninput x of Ada in {0, 1}\nresource antisymmetric on all\ncopies M\nround \"r\"\n  all measure level as v\n  Cyd announces v\nend\n" + rest + "\n";

    private static string Text(string name) => ProtocolLibrary.ProtocolLibraryTests.Text(name + ".protocol");

    private static Func<Step, string> Written(Protocol protocol) => s => $"{s.GetType().Name} {protocol.Source.LineOf(s.Span.Start)}";

    private static IEnumerable<string> Honest(Protocol protocol, IReadOnlyList<Step> steps, DishonestCase strategy) =>
        steps.Where(s => !strategy.By.Contains(s switch { SetStep set => set.Party, SendStep send => send.Party, AbortStep abort => abort.Party, _ => -1 })).Where(s => s is not WhenStep).Select(Written(protocol));
}
