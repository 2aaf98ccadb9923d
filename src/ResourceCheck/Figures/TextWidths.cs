using OxyPlot;

namespace ResourceCheck.Figures;

/// <summary>
/// Sizes of text for laying out figures: widths of Helvetica from Adobe's published font metrics (core 14 AFM files, entered from memory),
/// so that a figure comes out the same on machines with and without fonts. Only measuring is asked of it, nothing is drawn.
/// </summary>
internal sealed class TextWidths : RenderContextBase
{
    // Readers without Helvetica or Arial see a wider font in its place; with this nothing is cut off for them.
    private const double Wider = 1.17;

    private const double Line = 1.25;
    private const double Bold = 1.07;
    private const double Other = 0.6;
    private const int BoldFrom = 600;

    // Width in thousandths of the size, from the blank to the tilde.
    private static readonly int[] Widths =
    [
        278, 278, 355, 556, 556, 889, 667, 191, 333, 333, 389, 584, 278, 333, 278, 278,
        556, 556, 556, 556, 556, 556, 556, 556, 556, 556, 278, 278, 584, 584, 584, 556,
        1015, 667, 667, 722, 722, 667, 611, 778, 722, 278, 500, 667, 556, 833, 722, 778,
        667, 778, 722, 667, 611, 722, 667, 944, 667, 667, 611, 278, 278, 278, 469, 556,
        333, 556, 556, 500, 556, 556, 278, 556, 556, 222, 222, 500, 222, 833, 556, 556,
        556, 556, 333, 500, 278, 556, 500, 722, 500, 500, 500, 334, 260, 334, 584,
    ];

    /// <summary>Width of a text on one line.</summary>
    public static double Of(string text, double size) => Wider * size * text.Sum(c => c is >= ' ' and <= '~' ? Widths[c - ' '] / 1000.0 : Other);

    /// <inheritdoc/>
    public override OxySize MeasureText(string text, string? fontFamily = null, double fontSize = 10, double fontWeight = 500)
    {
        if (string.IsNullOrEmpty(text))
            return OxySize.Empty;
        string[] lines = text.Split('\n');
        return new OxySize(lines.Max(l => Of(l, fontSize)) * (fontWeight >= BoldFrom ? Bold : 1), lines.Length * fontSize * Line);
    }

    /// <inheritdoc/>
    public override void DrawLine(IList<ScreenPoint> points, OxyColor stroke, double thickness, EdgeRenderingMode edgeRenderingMode, double[] dashArray, LineJoin lineJoin) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void DrawPolygon(IList<ScreenPoint> points, OxyColor fill, OxyColor stroke, double thickness, EdgeRenderingMode edgeRenderingMode, double[] dashArray, LineJoin lineJoin) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void DrawText(ScreenPoint p, string text, OxyColor fill, string fontFamily, double fontSize, double fontWeight, double rotation, HorizontalAlignment horizontalAlignment, VerticalAlignment verticalAlignment, OxySize? maxSize) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void PushClip(OxyRect clippingRectangle) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void PopClip() => throw new NotSupportedException();

    /// <inheritdoc/>
    public override int ClipCount => 0;
}
