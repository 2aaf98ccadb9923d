using System.Text.RegularExpressions;
using ResourceCheck.Conditions;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

/// <summary>docs/conditions.md says what the program does.</summary>
public sealed class PageTests
{
    private static readonly string Page = File.ReadAllText(Path.Combine(ConditionsCase.Folder, "..", "..", "..", "..", "docs", "conditions.md"));

    /// <summary>RESOURCECHECK_UPDATE_GOLDEN=1 writes the tables and the schema anew.</summary>
    [Fact]
    public void The_page_and_the_schema_can_be_made_anew()
    {
        string docs = Path.GetFullPath(Path.Combine(ConditionsCase.Folder, "..", "..", "..", "..", "docs"));
        string made = Regex.Replace(Page, @"### The file\n.*?\n## ", KeyTableMarkdown.Write().Replace("$", "$$", StringComparison.Ordinal) + "\n## ", RegexOptions.Singleline);
        made = Regex.Replace(made, @"\| what \| units \| held in \|\n(\|.*\n)*", KeyTableMarkdown.WriteUnits().Replace("$", "$$", StringComparison.Ordinal));
        if (Environment.GetEnvironmentVariable("RESOURCECHECK_UPDATE_GOLDEN") == "1")
        {
            File.WriteAllText(Path.Combine(docs, "conditions.md"), made);
            File.WriteAllText(Path.Combine(docs, "schema", "conditions.schema.json"), ConditionsFile.Schema);
        }

        Assert.Equal(made, File.ReadAllText(Path.Combine(docs, "conditions.md")));
    }

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
