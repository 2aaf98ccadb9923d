using System.Runtime.CompilerServices;
using ResourceCheck.Cli;
using Xunit;

namespace ResourceCheck.Tests.Cli;

public sealed class ReadmeTests
{
    /// <summary>The README shows a run; this holds what it shows to what the tool prints, provenance lines left out.</summary>
    [Fact]
    public async Task Readme_shows_what_its_first_command_prints()
    {
        string readme = (await File.ReadAllTextAsync(Path.Combine(Root(), "README.md"), TestContext.Current.CancellationToken)).ReplaceLineEndings("\n");
        string command = readme.Split('\n').First(l => l.StartsWith("dotnet run", StringComparison.Ordinal));
        string[] words = command[(command.IndexOf(" -- ", StringComparison.Ordinal) + 4)..].Split(' ');
        using StringWriter output = new(), error = new();
        int code = await CommandLineTool.RunAsync([.. words.Select(w => w.StartsWith("protocols/", StringComparison.Ordinal) ? Path.Combine(Root(), w) : w)], output, error, TestContext.Current.CancellationToken);
        Assert.Equal(0, code);
        string printed = output.ToString().ReplaceLineEndings("\n").Split("\nResourceCheck ")[0].TrimEnd();
        Assert.Contains($"```\n{printed}\n```", readme, StringComparison.Ordinal);
    }

    private static string Root([CallerFilePath] string file = "") => Path.GetFullPath(Path.Combine(Path.GetDirectoryName(file)!, "..", "..", ".."));
}
