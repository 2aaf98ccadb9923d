using System.Text.RegularExpressions;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using Xunit;

namespace ResourceCheck.Tests.Conditions;

public sealed class CatalogueTests
{
    [Fact]
    public void Codes_ascend_without_repeats() =>
        Assert.Equal(ConditionsCatalogue.All.Select(e => e.Code).Distinct().Order(StringComparer.Ordinal), ConditionsCatalogue.All.Select(e => e.Code));

    [Fact]
    public void Every_code_that_messages_use_is_explained_and_no_other()
    {
        string source = File.ReadAllText(Path.Combine(ConditionsCase.Folder, "..", "..", "..", "..", "src", "ResourceCheck", "Conditions", "ConditionsMessages.cs"));
        IEnumerable<string> used = Regex.Matches(source, "\"(C0[0-9]{2})\"").Select(m => m.Groups[1].Value).Distinct().Order(StringComparer.Ordinal);
        Assert.Equal(used, ConditionsCatalogue.All.Select(e => e.Code));
    }

    [Fact]
    public void Every_example_shows_its_own_mistake() => Assert.All(ConditionsCatalogue.All.Where(e => e.Example is not null), explanation =>
    {
        IReadOnlyList<Diagnostic> findings = ConditionsFile.Read("x.conditions.json", explanation.Example!, []).Findings;
        Assert.Equal([explanation.Code], findings.Select(f => f.Code));
    });
}
