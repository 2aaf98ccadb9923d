using System.Globalization;
using System.Xml.Linq;
using ResourceCheck.Engines;
using ResourceCheck.Figures;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Tests.Reports;
using ResourceCheck.Timeline;
using Xunit;

namespace ResourceCheck.Tests.Figures;

public sealed class FigureTests
{
    private const string Odd = "a <script>&amp;_% \\ \"b\" \u001b 'c'";

    private static readonly Dictionary<string, Func<FigureImage>> Kinds = new()
    {
        ["curve"] = () => FigureBuilder.Of(Samples.Sweep, "curve", tolerated: 1.5)[0],
        ["tolerance"] = () => FigureBuilder.Of(Samples.Tolerance),
        ["budget"] = () => FigureBuilder.Of(Samples.Budget)!,
        ["copies"] = () => FigureBuilder.Of(Samples.Copies),
        ["timeline"] = () => FigureBuilder.Of(Timed)!,
        ["storage"] = () => FigureBuilder.Of(Samples.Storage),
        ["relaxation"] = () => FigureBuilder.Of(Samples.Relaxation),
        ["map"] = () => FigureBuilder.Of(Map, "map")[0],
        ["odd"] = () => FigureBuilder.Of(Samples.Sweep with { Title = Odd, Varied = [Samples.Sweep.Varied[0] with { Path = Odd }], Goals = [new("success", Odd, 0.8)] }, "odd")[0],
    };

    private static RunResult Timed => Samples.Full with
    {
        Parties = ["Ada", "Ben", Odd],
        Timeline =
        [
            new(0, 3e-6, "Ada", TimelineKind.Flight, "qudit arrives", null),
            new(3e-6, 9e-6, "Ada", TimelineKind.Waiting, "holds", null),
            new(1e-6, 1e-6, "Ben", TimelineKind.Detection, "measures", null),
            new(1e-6, 9e-6, "Ben", TimelineKind.Message, "x", "Ada"),
            new(2e-6, 7e-6, Odd, TimelineKind.Message, "y", null),
            new(9e-6, 9e-6, "all", TimelineKind.Checkpoint, "after", null),
        ],
    };

    private static SweepResult Map => Samples.Sweep with
    {
        Varied = [new("flight.length", false, 1, 3, "km", 3, false, false), new("flight.depolarising", false, 1e-3, 0.1, "", 3, true, false)],
        Points = [.. Enumerable.Range(0, 9).Select(i => new SweepPoint([1 + (i / 3), Math.Pow(10, -3 + (i % 3))], i == 4 ? [] : [new("success", Estimate.Exact(0.95 - (0.03 * i)))], null, i == 4 ? "failed" : null))],
    };

    public static TheoryData<string> Names => [.. Kinds.Keys];

    [Theory]
    [MemberData(nameof(Names))]
    public void A_figure_stands_alone_and_beside_others(string kind)
    {
        FigureImage figure = Kinds[kind]();
        XElement svg = XElement.Parse(figure.Svg);
        XNamespace ns = "http://www.w3.org/2000/svg";
        Assert.Equal(ns + "svg", svg.Name);
        Assert.Equal("img", svg.Attribute("role")?.Value);
        Assert.False(string.IsNullOrWhiteSpace(svg.Element(ns + "title")?.Value));
        Assert.False(string.IsNullOrWhiteSpace(svg.Element(ns + "desc")?.Value));
        Assert.Equal(figure.Description.Replace("\u001b", "\\u{1b}", StringComparison.Ordinal), svg.Element(ns + "desc")!.Value);
        string[] ids = [.. svg.Descendants().Attributes("id").Select(a => a.Value)];
        Assert.Equal(ids.Length, ids.Distinct().Count());
        Assert.All(ids, id => Assert.StartsWith(figure.Id + "-", id, StringComparison.Ordinal));
        string[] used = [.. svg.DescendantsAndSelf().Attributes().Where(a => a.Value.Contains("url(#", StringComparison.Ordinal)).Select(a => a.Value.Split("url(#")[1].Split(')')[0])];
        Assert.NotEmpty(used);
        Assert.All(used, id => Assert.Contains(id, ids));
        Assert.DoesNotContain(svg.Descendants().Attributes(), a => a.Name.LocalName is "href" or "src");
        Assert.Empty(svg.Descendants(ns + "script"));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void A_culture_with_comma_decimals_changes_no_byte(string kind)
    {
        (string svg, string data) = (Kinds[kind]().Svg, Kinds[kind]().Data);
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = GoldenReportTests.CommaCulture();
            Assert.Equal((svg, data), (Kinds[kind]().Svg, Kinds[kind]().Data));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void A_figure_is_the_one_looked_at(string kind) => Golden.Compare($"tests/ResourceCheck.Tests/Figures/Golden/{kind}.svg", Kinds[kind]().Svg + "\n");

    [Fact]
    public void The_table_beside_a_figure_holds_its_numbers()
    {
        string[] lines = Kinds["curve"]().Data.Split('\n');
        Assert.Equal("x y1 low1 high1", lines[0]);
        Assert.Equal("1 0.9 0.876 0.924", lines[1]);
        Assert.Equal("2 nan nan nan", lines[2]);
        Assert.Equal("3 nan nan nan", lines[3]);
    }

    [Fact]
    public void What_takes_no_time_has_no_timeline_and_what_loses_nothing_no_budget()
    {
        Assert.Null(FigureBuilder.Of(Samples.Full with { Timeline = [] }));
        Assert.Null(FigureBuilder.Of(Samples.Budget with { Shares = [] }));
    }

    /// <summary>Two failures 1e-12 and 1e-3 apart, a single point, a flat curve: axes stay finite and lines are drawn.</summary>
    [Theory]
    [InlineData(1e-12, 1e-3, 5)]
    [InlineData(0.5, 0.5, 5)]
    [InlineData(0.25, 0.25, 1)]
    public void Any_range_gives_finite_axes(double first, double last, int count)
    {
        SweepResult sweep = Samples.Sweep with
        {
            Goals = [new("failure", "failure <= 1e-6", 1e-6)],
            Points = [.. Enumerable.Range(0, count).Select(i => new SweepPoint([i], [new("failure", Estimate.Exact(first + ((last - first) * i / Math.Max(1, count - 1))))], true, null))],
        };
        string svg = FigureBuilder.Of(sweep)[0].Svg;
        Assert.DoesNotContain("NaN", svg, StringComparison.Ordinal);
        Assert.DoesNotContain("Infinity", svg, StringComparison.Ordinal);
    }
}
