using System.Runtime.CompilerServices;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using Xunit;

namespace ResourceCheck.Tests.Binding;

/// <summary>Binding answers every text with a protocol or findings, and knows the library's scripts.</summary>
public sealed class RobustnessTests
{
    private static readonly string[] Library = Directory.GetFiles(Path.Combine(Root(), "protocols"), "*.protocol");
    private static readonly string[] Texts = [.. Library.Concat(Directory.GetFiles(Path.Combine(Root(), "tests/ResourceCheck.Tests/Binding"), "*.protocol", SearchOption.AllDirectories)).Select(File.ReadAllText)];

    public static TheoryData<string> LibraryScripts => [.. Library.Select(f => Path.GetFileName(f)!).Order(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(LibraryScripts))]
    public void A_script_of_the_library_binds_at_all_its_sizes(string name)
    {
        var (tree, _) = Script.Parse(new SourceText(name, File.ReadAllText(Path.Combine(Root(), "protocols", name))));
        foreach (ParameterInfo parameter in Script.ParametersOf(tree).DefaultIfEmpty(new ParameterInfo("", 0, [0], 0, 0)))
        {
            foreach (Rational value in parameter.Values is { Count: <= 20 } all ? all : [parameter.From, parameter.To])
            {
                var outcome = Script.Bind(tree, parameter.Name.Length == 0 ? new Dictionary<string, Rational>() : new() { [parameter.Name] = value });
                Assert.True(outcome.Succeeded, string.Join("\n", outcome.Findings));
            }
        }
    }

    [Property(MaxTest = 300)]
    public Property A_mangled_script_gives_findings_not_exceptions() =>
        Prop.ForAll(Gen.Choose(0, Texts.Length - 1).ToArbitrary(), Gen.Choose(0, 10_000).ToArbitrary(), Gen.Choose(0, 10_000).ToArbitrary(), (text, at, other) =>
        {
            string[] lines = Texts[text].Split('\n');
            (int i, int k) = (at % lines.Length, other % lines.Length);
            Bound.From("mangled", string.Join('\n', lines.Where((_, n) => n != i)));
            (lines[i], lines[k]) = (lines[k], lines[i]);
            Bound.From("mangled", string.Join('\n', lines));
            string line = lines[k];
            lines[k] = line.Length == 0 ? "end" : line.Remove(at % line.Length, 1);
            var (protocol, findings) = Bound.From("mangled", string.Join('\n', lines));
            Assert.True(protocol is not null || findings.Count > 0);
        });

    [Fact]
    public void Every_code_said_in_the_cases_is_explained()
    {
        string[] said = [.. Directory.GetFiles(Path.Combine(Root(), "tests/ResourceCheck.Tests/Binding/Cases"), "*.protocol")
            .SelectMany(f => Bound.From(f, File.ReadAllText(f)).Findings).Select(f => f.Code).Where(c => string.CompareOrdinal(c, "S030") >= 0).Distinct()];
        Assert.True(said.Length > 25);
        Assert.Empty(said.Except(BindingCatalogue.All.Select(e => e.Code)));
    }

    [Fact]
    public void Explanations_have_codes_of_their_own_in_order() =>
        Assert.Equal(BindingCatalogue.All.Select(e => e.Code).Distinct().Order(StringComparer.Ordinal), BindingCatalogue.All.Select(e => e.Code));

    private static string Root([CallerFilePath] string here = "") => Path.GetFullPath(Path.Combine(Path.GetDirectoryName(here)!, "..", "..", ".."));
}
