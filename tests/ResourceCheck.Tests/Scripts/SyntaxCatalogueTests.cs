using System.Globalization;
using ResourceCheck.Scripts;
using Xunit;

namespace ResourceCheck.Tests.Scripts;

public sealed class SyntaxCatalogueTests
{
    public static TheoryData<string> Codes => [.. SyntaxCatalogue.All.Select(e => e.Code)];

    [Theory]
    [MemberData(nameof(Codes))]
    public void The_example_of_a_code_is_told_with_that_code_alone(string code)
    {
        var (_, findings) = Script.Parse(new SourceText("example.protocol", SyntaxCatalogue.All.Single(e => e.Code == code).Example!));
        Assert.Equal(code, Assert.Single(findings).Code);
    }

    [Fact]
    public void Codes_run_from_1_to_29() =>
        Assert.Equal(Enumerable.Range(1, 29).Select(i => $"S{i.ToString("000", CultureInfo.InvariantCulture)}"), SyntaxCatalogue.All.Select(e => e.Code));

    [Fact]
    public void Every_message_is_one_sentence_that_ends_with_a_point()
    {
        foreach (string message in ScriptCases.All.SelectMany(c => Script.Parse(new SourceText("t", c.Source)).Findings).Select(f => f.Message))
            Assert.True(message.EndsWith('.') && !message.Contains('\n', StringComparison.Ordinal), message);
    }
}
