using System.Text.RegularExpressions;
using System.Xml.Linq;
using OxyPlot;
using ResourceCheck.Reports;

namespace ResourceCheck.Figures;

/// <summary>Turns a plot into an <c>svg</c> element that can stand in a page with others.</summary>
internal static partial class SvgText
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    /// <summary>Draws a plot.</summary>
    /// <param name="model">The plot.</param>
    /// <param name="id">Beginning of all ids.</param>
    /// <param name="title">Title for readers who cannot see it.</param>
    /// <param name="description">Description for them.</param>
    /// <param name="height">Height in units of 1/96 inch.</param>
    public static string Of(PlotModel model, string id, string title, string description, double height = PlotStyle.Height)
    {
        SvgExporter exporter = new() { Width = PlotStyle.Width, Height = height, IsDocument = false, TextMeasurer = new TextWidths(), UseVerticalTextAlignmentWorkaround = true };
        XElement root = XElement.Parse(exporter.ExportToString(model).TrimStart('\uFEFF'));
        Name(root, id);
        Describe(root, id, title, description, height);
        foreach (XElement element in root.DescendantsAndSelf())
            element.Name = Svg + element.Name.LocalName;
        root.Attributes().Where(a => a.IsNamespaceDeclaration).Remove();
        return root.ToString(SaveOptions.DisableFormatting);
    }

    private static void Name(XElement root, string id)
    {
        foreach (XAttribute attribute in root.Descendants().Attributes().Where(a => a.Name == "id"))
            attribute.Value = $"{id}-{attribute.Value}";
        foreach (XAttribute attribute in root.Descendants().Attributes().Where(a => a.Value.Contains("url(#", StringComparison.Ordinal)))
            attribute.Value = Reference().Replace(attribute.Value, $"url(#{id}-");
    }

    private static void Describe(XElement root, string id, string title, string description, double height)
    {
        root.Attributes().Where(a => !a.IsNamespaceDeclaration).Remove();
        root.SetAttributeValue("viewBox", FormattableString.Invariant($"0 0 {PlotStyle.Width} {height}"));
        root.SetAttributeValue("width", PlotStyle.Width);
        root.SetAttributeValue("height", height);
        root.SetAttributeValue("role", "img");
        root.SetAttributeValue("aria-labelledby", $"{id}-title {id}-desc");
        root.AddFirst(
            new XElement("title", new XAttribute("id", $"{id}-title"), Visible.InLine(title)),
            new XElement("desc", new XAttribute("id", $"{id}-desc"), Visible.InLine(description)));
    }

    [GeneratedRegex(@"url\(#")]
    private static partial Regex Reference();
}
