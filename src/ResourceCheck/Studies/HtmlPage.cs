using System.Globalization;
using System.Net;
using System.Text;
using ResourceCheck.Figures;
using ResourceCheck.Quantities;
using ResourceCheck.Reports;

namespace ResourceCheck.Studies;

/// <summary>Writes a report as one HTML file that asks nothing of a network: style, script and figures stand in it. Text from inputs is escaped everywhere.</summary>
internal static class HtmlPage
{
    /// <summary>Writes the page.</summary>
    public static string Of(StudyPage page, string version)
    {
        StringBuilder html = new();
        html.Append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n");
        html.Append("<meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; style-src 'unsafe-inline'; script-src 'unsafe-inline'; img-src data:\">\n");
        html.Append($"<title>{Escape(page.Title)}</title>\n<style>\n{HtmlParts.Style}</style>\n</head>\n<body>\n<a class=\"skip\" href=\"#verdicts\">To the verdicts</a>\n<header>\n<h1>{Escape(page.Title)}</h1>\n");
        if (page.About is { } about)
            html.Append($"<p>{Escape(about)}</p>\n");
        html.Append("</header>\n<nav aria-label=\"Sections\"><ul>\n");
        foreach (PageSection section in page.Sections)
            html.Append($"<li><a href=\"#{section.Id}\">{Escape(section.Title)}</a></li>\n");
        html.Append("</ul></nav>\n<main>\n");
        foreach (PageSection section in page.Sections)
            Write(section, html);
        html.Append($"</main>\n<footer><p>ResourceCheck {Escape(version)}. {Escape(Report.Caution)}</p></footer>\n<script>\n{HtmlParts.Script}</script>\n</body>\n</html>\n");
        return html.ToString();
    }

    private static void Write(PageSection section, StringBuilder html)
    {
        html.Append($"<section id=\"{section.Id}\" aria-labelledby=\"h-{section.Id}\">\n<h2 id=\"h-{section.Id}\">{Escape(section.Title)}</h2>\n");
        foreach (PageItem item in section.Items)
            Write(item, section, html);
        html.Append("</section>\n");
    }

    private static void Write(PageItem item, PageSection section, StringBuilder html)
    {
        string about = item.Title ?? section.Title;
        html.Append("<article>\n");
        if (item.Title is { } title)
            html.Append($"<h3>{Escape(title)}</h3>\n");
        if (item.Headline is { } headline)
            html.Append($"<p class=\"headline{item.Standing switch { true => " good", false => " bad", _ => "" }}\">{Escape(headline)}</p>\n");
        foreach (FigureImage figure in item.Figures)
            html.Append($"<figure><div class=\"drawing\">{figure.Svg}</div><figcaption>{Escape(figure.Title)}.</figcaption></figure>\n");
        foreach (Section part in item.Sections)
            Write(part, about, html);
        html.Append("</article>\n");
    }

    private static void Write(Section section, string about, StringBuilder html)
    {
        if (section.Table is { Rows.Count: > 0 } table)
            Write(table.WithoutEmptyColumns(), section.Title ?? about, html);
        else if (section.Title is { } title)
            html.Append($"<h4>{Escape(title)}</h4>\n");
        foreach (string line in section.Lines)
            html.Append($"<p>{Escape(line)}</p>\n");
    }

    private static void Write(Table table, string caption, StringBuilder html)
    {
        html.Append($"<div class=\"wide\" tabindex=\"0\" role=\"region\" aria-label=\"{Escape(caption)}\">\n<table>\n<caption>{Escape(caption)}</caption>\n<thead><tr>");
        foreach (Column column in table.Columns)
            html.Append($"<th scope=\"col\"><button type=\"button\">{Escape(column.Title)}</button></th>");
        html.Append("</tr></thead>\n<tbody>\n");
        foreach (IReadOnlyList<Cell> row in table.Rows)
        {
            html.Append("<tr>");
            foreach (Cell cell in row)
                html.Append(Show(cell));
            html.Append("</tr>\n");
        }

        html.Append("</tbody>\n</table>\n</div>\n");
    }

    private static string Show(Cell cell) => cell switch
    {
        NumberCell number => Number(number.Value, FigureText.Of(number.Value, number.Unit, number.Rounding)),
        DifferenceCell difference => Number(difference.Value, difference.Shown),
        TextCell text => $"<td>{Escape(text.Text)}</td>",
        _ => "<td></td>",
    };

    private static string Number(double value, string shown) => string.Create(CultureInfo.InvariantCulture, $"<td class=\"number\" data-value=\"{value:R}\">{Escape(shown)}</td>");

    private static string Escape(string text) => WebUtility.HtmlEncode(Visible.InLine(text));
}
