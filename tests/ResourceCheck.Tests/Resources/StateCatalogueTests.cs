using System.Reflection;
using System.Text.RegularExpressions;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Resources;
using Xunit;

namespace ResourceCheck.Tests.Resources;

/// <summary>Every code has one explanation, and every message its own code.</summary>
public sealed class StateCatalogueTests
{
    [Fact]
    public void Codes_are_unique_ordered_and_ours()
    {
        string[] codes = [.. StateCatalogue.All.Select(e => e.Code)];
        Assert.Equal(codes.Distinct().Order(StringComparer.Ordinal), codes);
        Assert.All(codes, code => Assert.Matches("^D0[0-4][0-9]$", code));
    }

    [Fact]
    public void Every_message_is_explained()
    {
        string texts = File.ReadAllText(Path.Combine(Fixture.PathOf(""), "..", "..", "..", "..", "src", "ResourceCheck", "Resources", "StateMessages.cs"));
        string[] used = [.. Regex.Matches(texts, "\"(D0\\d\\d)\"").Select(m => m.Groups[1].Value)];
        Assert.Equal(StateCatalogue.All.Select(e => e.Code), used);
        int messages = typeof(StateMessages).GetMethods(BindingFlags.Public | BindingFlags.Static).Count(m => m.ReturnType == typeof(Diagnostic));
        Assert.Equal(messages, used.Length);
    }

    [Fact]
    public void Examples_of_the_page_on_states_are_states()
    {
        string page = File.ReadAllText(Path.Combine(Fixture.PathOf(""), "..", "..", "..", "..", "docs", "states.md"));
        (string Ending, string Text)[] examples = [.. Regex.Matches(page, "```(json|mtx)\n(.*?)```", RegexOptions.Singleline).Select(m => ($".{m.Groups[1].Value}", m.Groups[2].Value))];
        Assert.Equal(4, examples.Length);
        Assert.All(examples, example => Assert.Empty(Fixture.With(example.Ending, example.Text, path => StateFile.Read(path, mend: false)).Findings));
    }

    [Fact]
    public void A_file_of_another_size_than_the_protocol_is_refused()
    {
        ResourceModel model = new(new FilePreparation(Fixture.PathOf("vector-c16.npy"), Mend: false), 0);
        Assert.NotNull(Resource.Prepare(model, 3).Value!.Ket);
        Assert.Equal(["D044"], Resource.Prepare(model, 4).Findings.Select(f => f.Code));
    }
}
