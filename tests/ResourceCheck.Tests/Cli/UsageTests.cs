using System.Text.RegularExpressions;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;
using ResourceCheck.Reports;
using ResourceCheck.Tests.Reports;
using Xunit;

namespace ResourceCheck.Tests.Cli;

public sealed partial class UsageTests : IDisposable
{
    private readonly Tool _tool = new();

    public void Dispose() => _tool.Dispose();

    public static TheoryData<string> Cases() => [.. File.ReadAllText(Path.Combine(Golden.Root, "tests/ResourceCheck.Tests/Cli/wrong-command-lines.txt"))
        .Split("\n$ ", StringSplitOptions.RemoveEmptyEntries).Where(c => !c.StartsWith('#')).Select(c => c.Split('\n')[0].Trim())];

    [Theory]
    [MemberData(nameof(Cases))]
    public async Task Wrong_command_lines_are_told_with_place_and_cure(string line)
    {
        Said said = await _tool.Say([.. line.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(Real)]);
        Assert.Equal((2, ""), (said.Code, said.Output));
        string told = said.Error.Replace(_tool.Folder, "FOLDER", StringComparison.Ordinal);
        Golden.CompareEntry("tests/ResourceCheck.Tests/Cli/wrong-command-lines.txt", line, told);
        foreach (Match code in CodePattern().Matches(told))
            Assert.Contains(Catalogue.All, e => e.Code == code.Groups[1].Value);
    }

    [Fact]
    public async Task Without_a_command_the_commands_are_named()
    {
        Said said = await _tool.Say();
        Assert.Equal((2, ""), (said.Code, said.Output));
        Assert.StartsWith("A command is missing: run, verify,", said.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Every_word_and_option_reaches_the_request()
    {
        Said said = await _tool.Say(
            "run", _tool.Script, "--under", _tool.Conditions, "--set", "flight.Dov.length=5 km", "--set=a.b=c=d", "--parameter", "n=3..8",
            "--engine", "dense", "--memory", "2 GiB", "--seed", "42", "--threads", "2", "--format", "csv", "--quiet");
        Assert.Equal((0, ""), (said.Code, said.Error));
        Assert.Equal(GoldenReportTests.Write("run-full", ReportFormat.Csv), said.Output);
        Assert.Equal([new("flight.Dov.length", "5 km"), new("a.b", "c=d")], _tool.Asked!.Overrides);
        Assert.Equal([new("n", "3..8")], _tool.Asked.Parameters);
        Assert.Equal(("dense", 2.0 * (1 << 30), 42L, 2), (_tool.Asked.Engine, _tool.Asked.MemoryLimit, _tool.Asked.Seed, _tool.Asked.Threads));
        Assert.Equal(("protocol \"Party removal\"\n", "{}\n"), (_tool.Asked.Script.Text, _tool.Asked.Conditions!.Text));
        Assert.Equal("ca3d163bab055381827226140568f3bef7eaac187cebd76878e0b63e9e442356", _tool.Asked.Conditions.Sha256);
    }

    [Fact]
    public async Task Standard_input_stands_for_one_file()
    {
        _tool.Input = "\ufeffprotocol \"µ\"\n";
        Assert.Equal(0, (await _tool.Say("run", "-")).Code);
        Assert.Equal(("standard input", "protocol \"µ\"\n"), (_tool.Asked!.Script.Name, _tool.Asked.Script.Text));
    }

    [Fact]
    public async Task Warnings_go_to_standard_error_unless_quiet_or_already_on_the_terminal()
    {
        Assert.StartsWith("Warning: `P[7]`", (await _tool.Say("run", _tool.Script)).Error, StringComparison.Ordinal);
        Assert.Empty((await _tool.Say("run", _tool.Script, "--quiet")).Error);
        _tool.OutputIsTerminal = true;
        Assert.Empty((await _tool.Say("run", _tool.Script)).Error);
        Assert.NotEmpty((await _tool.Say("run", _tool.Script, "--format", "json")).Error);
    }

    [Fact]
    public async Task Colour_needs_a_terminal()
    {
        Assert.DoesNotContain('\u001b', (await _tool.Say("run", _tool.Script)).Output);
        _tool.OutputIsTerminal = true;
        Assert.Contains('\u001b', (await _tool.Say("run", _tool.Script)).Output);
        Assert.Equal(0, (await _tool.Say("run", _tool.Script, "--out", _tool.At("x.txt"))).Code);
        Assert.DoesNotContain('\u001b', File.ReadAllText(_tool.At("x.txt")));
    }

    [Theory]
    [InlineData("run", "--under --set --parameter --engine --memory --format --out --quiet --seed --threads --choose --drift --try-levels --uncertainty --draws --figure")]
    [InlineData("budget", "--under --set --parameter --engine --memory --format --out --quiet --seed --threads --uncertainty --figure")]
    [InlineData("copies", "--under --set --parameter --engine --memory --format --out --quiet --seed --threads --failure --harm --optimise --vary --figure")]
    [InlineData("tolerance", "--under --set --parameter --engine --memory --format --out --quiet --seed --threads --vary --until --uncertainty --figure")]
    [InlineData("sweep", "--under --set --parameter --engine --memory --format --out --quiet --seed --threads --vary --uncertainty --figure")]
    [InlineData("verify", "--parameter --memory --format --out --quiet --seed --threads")]
    [InlineData("inspect", "--under --set --parameter --engine --memory --format --out --quiet --seed --threads")]
    [InlineData("state", "--mend --format --out --quiet")]
    [InlineData("format", "--check --write --out --quiet")]
    [InlineData("explain", "--format --out")]
    [InlineData("schema", "--out")]
    [InlineData("new", "--force")]
    public async Task Every_option_is_in_the_help_and_in_the_docs(string command, string options)
    {
        Said said = await _tool.Say(command, "--help");
        Assert.Equal((0, ""), (said.Code, said.Error));
        string[] helped = [.. OptionPattern().Matches(said.Output).Select(m => m.Value.Trim())];
        Assert.Equal(options.Split(' ').Append("--help").Order(StringComparer.Ordinal), helped.Order(StringComparer.Ordinal));
        string docs = File.ReadAllText(Path.Combine(Golden.Root, "docs", "commands.md"));
        Assert.Contains($"`{command} ", docs, StringComparison.Ordinal);
        Assert.All(helped, o => Assert.Contains($"`{o}", docs, StringComparison.Ordinal));
    }

    [Fact]
    public async Task The_help_names_exit_codes_and_cautions()
    {
        string help = (await _tool.Say("--help")).Output;
        Assert.All(["130", "70", "no security proof", "secret keys", "infrared", "not met", "trusted source"], part => Assert.Contains(part, help, StringComparison.Ordinal));
        Assert.Equal(help, (await _tool.Say("-h")).Output);
        Assert.Matches(@"^resourcecheck \d+\.\d+\.\d+\S*\n$", (await _tool.Say("--version")).Output);
    }

    [Theory]
    [InlineData("B", null)]
    [InlineData("4 GB", 4e9)]
    [InlineData("1.5e3kB", 1.5e6)]
    [InlineData("-4 GB", null)]
    [InlineData("4 gb", null)]
    [InlineData("1e400 GB", null)]
    public void Memory_sizes_need_a_number_and_a_unit(string text, double? bytes) => Assert.Equal(bytes, MemorySize.Parse(text));

    [Theory]
    [InlineData("rnu", "run")]
    [InlineData("verfy", "verify")]
    [InlineData("x", null)]
    [InlineData("budget", null)]
    public void Only_near_words_are_suggested(string word, string? near) => Assert.Equal(near, NearWords.Find(word, ["run", "verify", "inspect"]));

    private string Real(string word) => word switch
    {
        "SCRIPT" => _tool.Script,
        "FOLDER" => _tool.Folder,
        _ => word.Replace("{}", _tool.Folder, StringComparison.Ordinal),
    };

    [GeneratedRegex(@"\((U\d\d\d)\)")]
    private static partial Regex CodePattern();

    [GeneratedRegex(@"(?m)(?<=^  (-h, )?)--[a-z]+(-[a-z]+)*")]
    private static partial Regex OptionPattern();
}
