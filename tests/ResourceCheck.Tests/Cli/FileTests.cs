using ResourceCheck.Reports;
using ResourceCheck.Tests.Reports;
using Xunit;

namespace ResourceCheck.Tests.Cli;

public sealed class FileTests : IDisposable
{
    private readonly Tool _tool = new();

    public void Dispose() => _tool.Dispose();

    [Fact]
    public async Task Out_writes_the_whole_document_and_leaves_nothing_else()
    {
        string file = _tool.Write("result.json", "old");
        int before = Directory.GetFiles(_tool.Folder).Length;
        Said said = await _tool.Say("run", _tool.Script, "--format", "json", "--out", file, "--quiet");
        Assert.Equal((0, "", ""), (said.Code, said.Output, said.Error));
        Assert.StartsWith("{\n  \"kind\": \"result\"", File.ReadAllText(file), StringComparison.Ordinal);
        Assert.Equal(before, Directory.GetFiles(_tool.Folder).Length);
    }

    [Fact]
    public async Task A_failed_run_leaves_the_old_file_alone()
    {
        string file = _tool.Write("result.json", "old");
        _tool.BeforeRun = () => throw new InvalidOperationException();
        Assert.Equal(70, (await _tool.Say("run", _tool.Script, "--out", file)).Code);
        Assert.Equal("old", File.ReadAllText(file));
    }

    [Fact]
    public async Task An_output_that_cannot_be_is_told_before_anything_is_computed()
    {
        bool computed = false;
        _tool.BeforeRun = () => computed = true;
        Said said = await _tool.Say("run", _tool.Script, "--out", _tool.At("none/result.json"));
        Assert.Equal((2, true), (said.Code, said.Error.Contains("U030", StringComparison.Ordinal)));
        Assert.Equal(2, (await _tool.Say("run", _tool.Script, "--out", _tool.Folder)).Code);
        Assert.False(computed);
    }

    [Fact]
    public async Task A_link_keeps_pointing_where_it_did()
    {
        string file = _tool.Write("real.txt", "old");
        File.CreateSymbolicLink(_tool.At("link.txt"), file);
        Assert.Equal(0, (await _tool.Say("schema", "state", "--out", _tool.At("link.txt"))).Code);
        Assert.Equal(Schemas.Find("state"), File.ReadAllText(file));
        Assert.Equal(file, new FileInfo(_tool.At("link.txt")).LinkTarget);
    }

    [Fact]
    public async Task Bytes_that_are_no_text_are_told_with_their_line()
    {
        File.WriteAllBytes(_tool.At("bad.protocol"), [(byte)'a', (byte)'\n', 0xFF]);
        Said said = await _tool.Say("run", _tool.At("bad.protocol"));
        Assert.Equal(2, said.Code);
        Assert.Contains("bad.protocol:2:1 (U023)", said.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_file_far_too_large_is_refused()
    {
        using (FileStream large = File.Create(_tool.At("large.protocol")))
            large.SetLength(17_000_000);
        Assert.Contains("U024", (await _tool.Say("run", _tool.At("large.protocol"))).Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task New_writes_both_files_or_none()
    {
        string study = _tool.At("study");
        Said first = await _tool.Say("new", study);
        Assert.Equal((0, ""), (first.Code, first.Error));
        Assert.Contains("resourcecheck run", first.Output, StringComparison.Ordinal);
        File.WriteAllText(study + ".protocol", "mine");
        File.Delete(study + ".conditions.json");
        Assert.Equal(2, (await _tool.Say("new", study)).Code);
        Assert.Equal(("mine", false), (File.ReadAllText(study + ".protocol"), File.Exists(study + ".conditions.json")));
        Assert.Equal(0, (await _tool.Say("new", study + ".protocol", "--force")).Code);
        Assert.StartsWith("#", File.ReadAllText(study + ".protocol"), StringComparison.Ordinal);
        Assert.True(File.Exists(study + ".conditions.json"));
    }

    [Fact]
    public async Task Format_prints_writes_or_leaves_alone()
    {
        _tool.Printed = "shaped\n";
        Assert.Equal("shaped\n", (await _tool.Say("format", _tool.Script)).Output);
        Assert.NotEqual("shaped\n", File.ReadAllText(_tool.Script));
        Assert.Equal(0, (await _tool.Say("format", _tool.Script, "--write")).Code);
        Assert.Equal("shaped\n", File.ReadAllText(_tool.Script));
        _tool.Printed = "broken\n";
        _tool.ParseFindings = [new("S001", Diagnostics.Severity.Error, "No.", null, null)];
        Said said = await _tool.Say("format", _tool.Script, "--write");
        Assert.Equal((2, "No.\n  at the input (S001)\n\n1 mistake; nothing was formatted.\n"), (said.Code, said.Error));
        Assert.Equal("shaped\n", File.ReadAllText(_tool.Script));
    }

    [Fact]
    public async Task Explain_tells_every_code()
    {
        string list = (await _tool.Say("explain")).Output;
        Assert.Equal(Catalogue.All.Count, list.Count(c => c == '\n'));
        foreach (string code in Catalogue.All.Select(e => e.Code))
            Assert.Contains("Cure:", (await _tool.Say("explain", code)).Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Codes_are_unique() => Assert.Equal(Catalogue.All.Count, Catalogue.All.Select(e => e.Code).Distinct().Count());

    [Fact]
    public async Task The_page_of_messages_is_the_catalogue() => Golden.Compare("docs/messages.md", (await _tool.Say("explain", "--format", "markdown")).Output);
}
