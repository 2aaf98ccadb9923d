using Microsoft.Playwright;
using Xunit;

namespace ResourceCheck.PageTests;

/// <summary>The report in a browser: opened from disk, in light and dark, on a narrow screen and on paper.</summary>
public sealed class BrowserTests(WrittenReport report) : IClassFixture<WrittenReport>
{
    private const int Desktop = 1200, Phone = 360, Paper = 794;

    [Fact]
    public async Task It_opens_without_a_complaint_and_asks_nothing_of_a_network()
    {
        List<string> complaints = [], requests = [];
        await On(Desktop, page =>
        {
            page.Console += (_, message) => complaints.Add(message.Text);
            page.PageError += (_, error) => complaints.Add(error);
            page.Request += (_, request) => requests.Add(request.Url);
        }, async page =>
        {
            Assert.Equal("50 % of <script>alert(1)</script> & a_b \\ ~#{}$^", await page.TitleAsync());
            Assert.Empty(complaints);
            Assert.Single(requests, r => r.StartsWith("file://", StringComparison.Ordinal));
        });
    }

    [Fact]
    public Task Every_figure_is_there_with_a_text_in_its_place() => On(Desktop, null, async page =>
    {
        IReadOnlyList<ILocator> figures = await page.Locator("figure svg").AllAsync();
        Assert.True(figures.Count >= 5, $"{figures.Count} figures");
        foreach (ILocator figure in figures)
        {
            Assert.Equal("img", await figure.GetAttributeAsync("role"));
            string[] names = (await figure.GetAttributeAsync("aria-labelledby"))!.Split(' ');
            Assert.All(names, name => Assert.False(string.IsNullOrWhiteSpace(page.Locator($"[id='{name}']").TextContentAsync().GetAwaiter().GetResult())));
            Assert.True((await figure.BoundingBoxAsync())!.Height > 100);
        }

        int repeated = await page.EvaluateAsync<int>("(() => { const ids = [...document.querySelectorAll('[id]')].map(e => e.id); return ids.length - new Set(ids).size; })()");
        Assert.Equal(0, repeated);
    });

    [Fact]
    public Task Tables_sort_by_keyboard() => On(Desktop, null, async page =>
    {
        ILocator table = page.Locator("#budget table").First, button = table.Locator("th button").Nth(1);
        await button.FocusAsync();
        await page.Keyboard.PressAsync("Enter");
        Assert.Equal("ascending", await table.Locator("th").Nth(1).GetAttributeAsync("aria-sort"));
        double[] up = await Column(table);
        Assert.Equal(up.Order(), up);
        await page.Keyboard.PressAsync("Enter");
        double[] down = await Column(table);
        Assert.Equal(up.Reverse(), down);
        Assert.True(up.Length > 1 && up[0] < up[^1]);
    });

    [Theory]
    [InlineData(Phone, Media.Screen)]
    [InlineData(Desktop, Media.Screen)]
    [InlineData(Paper, Media.Print)]
    public Task Nothing_runs_over_the_edge(int width, Media media) => On(width, null, async page =>
    {
        await page.EmulateMediaAsync(new() { Media = media, ColorScheme = ColorScheme.Dark });
        int over = await page.EvaluateAsync<int>("document.documentElement.scrollWidth - document.documentElement.clientWidth");
        Assert.True(over <= 0, $"{over} pixels too wide");
    });

    private static async Task<double[]> Column(ILocator table)
    {
        IReadOnlyList<ILocator> cells = await table.Locator("tbody tr td:nth-child(2)[data-value]").AllAsync();
        return [.. await Task.WhenAll(cells.Select(async c => double.Parse((await c.GetAttributeAsync("data-value"))!, System.Globalization.CultureInfo.InvariantCulture)))];
    }

    private async Task On(int width, Action<IPage>? listen, Func<IPage, Task> check)
    {
        Assert.SkipWhen(OutsidePrograms.Chromium is null, "needs chromium");
        using IPlaywright playwright = await Playwright.CreateAsync();
        await using IBrowser browser = await playwright.Chromium.LaunchAsync(new() { ExecutablePath = OutsidePrograms.Chromium, Args = ["--no-sandbox"] });
        IPage page = await browser.NewPageAsync(new() { ViewportSize = new() { Width = width, Height = 900 } });
        listen?.Invoke(page);
        await page.GotoAsync(new Uri(Path.Combine(report.Folder, "report.html")).AbsoluteUri);
        await check(page);
    }
}
