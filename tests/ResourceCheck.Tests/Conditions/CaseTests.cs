using Xunit;

namespace ResourceCheck.Tests.Conditions;

public sealed class CaseTests
{
    public static TheoryData<string> Files => [.. Directory.GetFiles(ConditionsCase.Folder, "*.case").Select(f => Path.GetFileName(f)).Order(StringComparer.Ordinal)];

    [Fact]
    public void There_are_case_files() => Assert.True(Files.Count >= 25);

    [Theory]
    [MemberData(nameof(Files))]
    public void Wrong_conditions_give_exactly_the_findings_of_their_case_file(string file)
    {
        ConditionsCase @case = ConditionsCase.Load(file);
        Assert.NotEqual("", @case.Expected);
        Assert.Equal(@case.Expected, @case.Findings());
    }
}
