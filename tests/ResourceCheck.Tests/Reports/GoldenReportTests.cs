using System.Globalization;
using ResourceCheck.Judgement;
using ResourceCheck.Reports;
using Xunit;

namespace ResourceCheck.Tests.Reports;

public sealed class GoldenReportTests
{
    private static readonly Dictionary<ReportFormat, string> Endings = new()
    {
        [ReportFormat.Text] = "txt",
        [ReportFormat.Json] = "json",
        [ReportFormat.Csv] = "csv",
        [ReportFormat.Markdown] = "md",
        [ReportFormat.Latex] = "tex",
    };

    private static readonly string[] Names = ["run-full", "run-bare", "run-odd", "run-uncertain", "verification", "inspection", "state", "storage", "relaxation", "budget", "sweep", "tolerance", "copies", "copies-table"];

    public static TheoryData<string, ReportFormat> All()
    {
        TheoryData<string, ReportFormat> data = [];
        foreach (string name in Names)
        {
            foreach (ReportFormat format in Endings.Keys)
                data.Add(name, format);
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(All))]
    public void Report_is_the_reviewed_one(string name, ReportFormat format) =>
        Golden.Compare($"tests/ResourceCheck.Tests/Reports/Golden/{name}.{Endings[format]}", Write(name, format));

    [Theory]
    [MemberData(nameof(All))]
    public void A_culture_with_comma_decimals_changes_no_byte(string name, ReportFormat format)
    {
        string expected = Write(name, format);
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CommaCulture();
            Assert.Equal("0,5", $"{0.5}");
            Assert.Equal(expected, Write(name, format));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [MemberData(nameof(All))]
    public void No_control_character_reaches_a_document(string name, ReportFormat format) =>
        Assert.DoesNotContain(Write(name, format), c => char.IsControl(c) && c is not '\n' && !(format == ReportFormat.Csv && c is '\r' or '\u001b'));

    [Fact]
    public void Colour_is_used_only_when_asked_for()
    {
        using StringWriter writer = new();
        ReportWriter.Write(Samples.Full, ReportFormat.Text, writer, colour: true);
        Assert.StartsWith("\u001b[1;31mGoal not met", writer.ToString(), StringComparison.Ordinal);
        Assert.DoesNotContain('\u001b', Write("run-full", ReportFormat.Text));
    }

    internal static CultureInfo CommaCulture()
    {
        CultureInfo culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NumberGroupSeparator = ".";
        culture.NumberFormat.NegativeSign = "~";
        return culture;
    }

    internal static string Write(string name, ReportFormat format)
    {
        using StringWriter writer = new();
        switch (name)
        {
            case "verification":
                ReportWriter.Write(Samples.Verification, format, writer);
                break;
            case "inspection":
                ReportWriter.Write(Samples.Inspection, format, writer);
                break;
            case "storage":
                ReportWriter.Write(Samples.Storage, format, writer);
                break;
            case "relaxation":
                ReportWriter.Write(Samples.Relaxation, format, writer);
                break;
            case "budget":
                ReportWriter.Write(Samples.Budget, format, writer);
                break;
            case "sweep":
                ReportWriter.Write(Samples.Sweep, format, writer);
                break;
            case "copies":
                ReportWriter.Write(Samples.Copies, format, writer);
                break;
            case "copies-table":
                ReportWriter.Write(Samples.CopiesTable, format, writer);
                break;
            case "tolerance":
                ReportWriter.Write(Samples.Tolerance, format, writer);
                break;
            case "state":
                ReportWriter.Write(Samples.State, "0.1.0", format, writer);
                break;
            default:
                RunResult run = name switch { "run-full" => Samples.Full, "run-bare" => Samples.Bare, "run-uncertain" => Samples.Uncertain, _ => Samples.Odd };
                ReportWriter.Write(run, format, writer);
                break;
        }

        return writer.ToString();
    }
}
