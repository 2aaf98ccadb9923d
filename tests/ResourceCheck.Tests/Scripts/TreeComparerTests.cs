using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;
using Xunit;

namespace ResourceCheck.Tests.Scripts;

public sealed class TreeComparerTests
{
    [Theory]
    [InlineData("copies 1", "copies 2")]
    [InlineData("copies a + b", "copies a - b")]
    [InlineData("parties Ada", "parties Ada, Ben")]
    [InlineData("success when a = (b = c)", "success when (a = b) = c")]
    [InlineData("copies 1 # x", "copies 1 # y")]
    [InlineData("round \"a\"\n  Ada announces v\nend", "round \"a\"\n  Ada sends v to Ben\nend")]
    public void Trees_that_differ_are_told_apart(string first, string second) => Assert.NotNull(TreeComparer.Difference(Tree(first), Tree(second)));

    [Fact]
    public void Spans_do_not_count() => Assert.Null(TreeComparer.Difference(Tree("copies   (a)"), Tree("copies a")));

    private static ScriptTree Tree(string text) => Script.Parse(new SourceText("t.protocol", text)).Tree;
}
