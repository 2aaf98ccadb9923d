using System.Runtime.CompilerServices;
using Xunit;

namespace ResourceCheck.Tests.Binding;

/// <summary>Every wrong script in Cases must give exactly the findings that stand beside it.</summary>
public sealed class CaseTests
{
    public static TheoryData<string> Names => [.. Directory.GetFiles(Folder(), "*.protocol").Select(f => Path.GetFileNameWithoutExtension(f)!).Order(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(Names))]
    public void The_findings_of_a_wrong_script_are_these(string name)
    {
        string text = File.ReadAllText(Path.Combine(Folder(), name + ".protocol"));
        string found = string.Join("\n\n", Bound.From(name + ".protocol", text).Findings) + "\n";
        string expected = Path.Combine(Folder(), name + ".expected");
        // With this variable set, new cases get a first expectation to be read and corrected by hand; the test still fails.
        if (!File.Exists(expected) && Environment.GetEnvironmentVariable("RESOURCECHECK_NEW_CASES") is not null)
            File.WriteAllText(expected + ".new", found);
        Assert.Equal(File.ReadAllText(expected).ReplaceLineEndings("\n"), found);
    }

    [Fact]
    public void There_are_at_least_twenty_cases() => Assert.True(Names.Count >= 20);

    private static string Folder([CallerFilePath] string here = "") => Path.Combine(Path.GetDirectoryName(here)!, "Cases");
}
