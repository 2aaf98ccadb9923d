using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts;
using Xunit;

namespace ResourceCheck.Tests.Scripts;

public sealed class HostileScriptTests
{
    private const int Many = 20_000;

    public static TheoryData<string> DeepLines =>
    [
        "copies " + new string('(', Many) + "1" + new string(')', Many),
        "copies " + new string('(', Many),
        "success when " + Repeat("not ") + "true",
        "copies " + Repeat("- ") + "1",
        "copies " + Repeat("if a then b else ") + "c",
        "copies " + Repeat("if ") + "c",
        "copies " + Repeat("abs(") + "1",
        "copies " + Repeat("P[") + "1",
        "copies " + Repeat("fourier on ") + "1",
        "copies " + Repeat("phased(") + "1",
        "copies " + Repeat("1 + ") + "1",
        "copies " + Repeat("a or b and c = d + e * ") + "1",
        "parties " + Repeat("P["),
        "parties " + Repeat("P[1..Q["),
    ];

    [Theory]
    [MemberData(nameof(DeepLines))]
    public void Too_deep_is_told_once(string line) => Assert.Equal("S018", Assert.Single(Findings(line)).Code);

    [Fact]
    public void Depth_within_the_limit_is_read_and_printed()
    {
        string script = $"copies {new string('(', 99)}1{new string(')', 99)}\nsuccess when {string.Concat(Enumerable.Repeat("not ", 99))}true\n"
            + $"copies {string.Concat(Enumerable.Repeat("1 + ", 1000))}1\n";
        var (tree, findings) = Script.Parse(new SourceText("t", script));
        Assert.Empty(findings);
        Assert.Empty(Findings(Script.Print(tree)));
    }

    [Fact]
    public void Blocks_too_deep_are_told_once()
    {
        string script = "round \"a\"\n" + Repeat("when true\n") + Repeat("end\n") + "end\ncopies *\n";
        Assert.Equal(["S018", "S012"], Findings(script).Select(f => f.Code));
    }

    [Fact]
    public void Blocks_without_ends_are_each_told_up_to_the_limit()
    {
        IReadOnlyList<Diagnostic> findings = Findings("round \"a\"\n" + Repeat("when true\n"));
        Assert.Equal(50, findings.Count(f => f.Code == "S009"));
        Assert.Single(findings, f => f.Code == "S018");
    }

    [Theory]
    [InlineData("")]
    [InlineData("\uFEFF")]
    [InlineData("\n\n")]
    [InlineData("  \t\r\n# only a comment")]
    public void An_empty_script_is_told(string script) => Assert.Equal("S024", Assert.Single(Findings(script)).Code);

    [Theory]
    [InlineData("copies \0 3")]
    [InlineData("copies \0\0\0 3")]
    [InlineData("protocol \"a\u001b[31mb\"")]
    [InlineData("copies \r 3")]
    [InlineData("copies \ufffd 3")]
    [InlineData("copies \u2028\u0007 3")]
    public void Unreadable_characters_are_told_and_shown_by_harmless_ones(string script)
    {
        Diagnostic finding = Assert.Single(Findings(script));
        Assert.Equal("S005", finding.Code);
        Assert.DoesNotContain(finding.ToString(), c => char.IsControl(c) && c != '\n');
    }

    [Fact]
    public void Half_a_surrogate_pair_is_unreadable() => Assert.Equal("S005", Assert.Single(Findings("copies " + '\ud800' + " 3")).Code);

    [Fact]
    public void Blanks_of_other_widths_are_blanks() => Assert.Empty(Findings("copies\u00a0\t\u20033\n"));

    [Fact]
    public void A_very_long_line_is_quoted_in_part()
    {
        Diagnostic finding = Assert.Single(Findings("parties " + Repeat("Ada, ") + "$ " + Repeat(", Ada")));
        Assert.Equal((8 + (5 * Many)) + 1, finding.Place!.Column);
        Assert.InRange(finding.Place.LineText!.Length, 100, 170);
        Assert.Equal("$", finding.Place.LineText.Substring(finding.Place.MarkStart, finding.Place.MarkLength));
    }

    [Fact]
    public void A_very_long_word_is_cut_in_the_message() => Assert.InRange(Assert.Single(Findings(new string('x', 1_000_000))).Message.Length, 50, 400);

    [Fact]
    public void A_million_digits_are_told_at_once() => Assert.Equal("S004", Assert.Single(Findings("copies " + new string('7', 1_000_000))).Code);

    [Fact]
    public void Many_wrong_lines_are_all_told() => Assert.Equal(Many, Findings(Repeat("copies *\n")).Count);

    private static string Repeat(string piece) => string.Concat(Enumerable.Repeat(piece, Many));

    private static IReadOnlyList<Diagnostic> Findings(string script) => Script.Parse(new SourceText("t", script)).Findings;
}
