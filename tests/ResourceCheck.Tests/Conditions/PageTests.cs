using System.Text.RegularExpressions;
using ResourceCheck.Conditions;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary>docs/conditions.md says what the program does.</summary>
public sealed class PageTests
{
    private static readonly string Page = File.ReadAllText(Path.Combine(ConditionsCase.Folder, "..", "..", "..", "..", "docs", "conditions.md"));

    [Fact]
    public void The_key_tables_are_those_of_the_reader() => Assert.Contains(KeyTableMarkdown.Write(), Page, StringComparison.Ordinal);

    [Fact]
    public void The_unit_table_is_that_of_the_reader() => Assert.Contains(KeyTableMarkdown.WriteUnits(), Page, StringComparison.Ordinal);

    [Fact]
    public void Every_example_is_read_and_bound()
    {
        MatchCollection examples = Regex.Matches(Page, "```json\n(.*?)```", RegexOptions.Singleline);
        Assert.NotEmpty(examples);
        Assert.All(examples, e => ValleyWorld.Of(e.Groups[1].Value, TestProtocol.Of(["Ada", "Ben", "Cyd", "Dov"])));
    }
}
