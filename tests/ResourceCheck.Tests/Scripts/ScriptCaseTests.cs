using ResourceCheck.Scripts;
using Xunit;

namespace ResourceCheck.Tests.Scripts;

public sealed class ScriptCaseTests
{
    public static TheoryData<string> Titles => [.. ScriptCases.All.Select(c => c.ToString())];

    [Theory]
    [MemberData(nameof(Titles))]
    public void A_case_comes_out_as_written_down(string title)
    {
        ScriptCase single = ScriptCases.All.Single(c => c.ToString() == title);
        var (tree, findings) = Script.Parse(new SourceText("case.protocol", single.Source));
        string told = string.Concat(findings.Select(f => f + "\n"));
        if (single.Kind == "findings")
        {
            Assert.Equal(single.Expected, told);
            return;
        }

        Assert.Equal("", told);
        Assert.Equal(single.Expected, Script.Print(tree));
    }

    [Theory]
    [MemberData(nameof(Titles))]
    public void A_readable_case_parses_from_its_print_to_the_same_tree(string title)
    {
        ScriptCase single = ScriptCases.All.Single(c => c.ToString() == title);
        var (tree, findings) = Script.Parse(new SourceText("case.protocol", single.Source));
        string printed = Script.Print(tree);
        if (findings.Count > 0)
            return;
        var (again, told) = Script.Parse(new SourceText("case.protocol", printed));
        Assert.Empty(told);
        Assert.Null(TreeComparer.Difference(tree, again));
        Assert.Equal(printed, Script.Print(again));
    }

    [Fact]
    public void Line_ends_and_a_byte_order_mark_change_nothing()
    {
        foreach (ScriptCase single in ScriptCases.All)
        {
            var (plain, told) = Script.Parse(new SourceText("case.protocol", single.Source));
            var (windows, toldToo) = Script.Parse(new SourceText("case.protocol", "\uFEFF" + single.Source.Replace("\n", "\r\n", StringComparison.Ordinal)));
            Assert.Null(TreeComparer.Difference(plain, windows));
            Assert.Equal(told.Select(f => f.ToString()), toldToo.Select(f => f.ToString()));
        }
    }

    [Fact]
    public void Every_case_file_is_read() =>
        Assert.Equal(["layout.txt", "rejected.txt", "statements.txt"], ScriptCases.All.Select(c => c.File).Distinct());
}
