using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Legends;

namespace ResourceCheck.Figures;

/// <summary>One look for all figures: readable in print, in grey and by colour-blind readers, since series differ by dash and marker too.</summary>
internal static class PlotStyle
{
    /// <summary>Width and height of a figure, in units of 1/96 inch: 160 mm wide.</summary>
    public const double Width = 604;

    public const double Height = 360;

    public const string Font = "Helvetica, Arial, sans-serif";

    public const double TextSize = 12;

    public static readonly OxyColor Ink = OxyColor.FromRgb(0x22, 0x22, 0x22);

    public static readonly OxyColor Faint = OxyColor.FromRgb(0xd8, 0xd8, 0xd8);

    public static readonly OxyColor Goal = OxyColor.FromRgb(0x55, 0x55, 0x55);

    // Their lightness in grey differs as well: 0.18, 0.52, 0.40, 0.65, 0.30, 0.55.
    private static readonly OxyColor[] Colours =
    [
        OxyColor.FromRgb(0x14, 0x2f, 0x4f), OxyColor.FromRgb(0xb9, 0x7a, 0x1c), OxyColor.FromRgb(0x1f, 0x77, 0x6d),
        OxyColor.FromRgb(0xc8, 0x9f, 0xb8), OxyColor.FromRgb(0x7a, 0x2e, 0x4e), OxyColor.FromRgb(0x6f, 0x9c, 0xc4),
    ];

    private static readonly LineStyle[] Dashes = [LineStyle.Solid, LineStyle.Dash, LineStyle.DashDot, LineStyle.LongDash, LineStyle.DashDashDot, LineStyle.Dot];

    private static readonly MarkerType[] Markers = [MarkerType.Circle, MarkerType.Square, MarkerType.Triangle, MarkerType.Diamond, MarkerType.Circle, MarkerType.Square];

    /// <summary>Series that one chart takes: more would not be told apart.</summary>
    public static int MostSeries => Colours.Length;

    public static OxyColor Colour(int series) => Colours[series % Colours.Length];

    public static LineStyle Dash(int series) => Dashes[series % Dashes.Length];

    public static MarkerType Marker(int series) => Markers[series % Markers.Length];

    /// <summary>An empty plot in the house style.</summary>
    public static PlotModel Model() => new()
    {
        DefaultFont = Font,
        DefaultFontSize = TextSize,
        TextColor = Ink,
        PlotAreaBorderColor = Ink,
        PlotAreaBorderThickness = new OxyThickness(0.8, 0, 0, 0.8),
        Background = OxyColors.White,
        PlotMargins = new OxyThickness(double.NaN),
        Padding = new OxyThickness(6, 10, 14, 6),
    };

    /// <summary>A legend below the plot, where it hides nothing.</summary>
    public static Legend Legend() => new()
    {
        LegendPlacement = LegendPlacement.Outside,
        LegendPosition = LegendPosition.BottomCenter,
        LegendOrientation = LegendOrientation.Horizontal,
        LegendBorderThickness = 0,
        LegendSymbolLength = 30,
        LegendItemSpacing = 18,
        LegendFontSize = TextSize,
        LegendMargin = 4,
    };

    /// <summary>An axis in the house style.</summary>
    public static Axis Styled(Axis axis, string title)
    {
        axis.Title = title;
        axis.TickStyle = TickStyle.Outside;
        axis.TicklineColor = Ink;
        axis.AxislineColor = Ink;
        axis.MajorGridlineStyle = LineStyle.Solid;
        axis.MajorGridlineColor = OxyColor.FromRgb(0xee, 0xee, 0xee);
        axis.MajorGridlineThickness = 0.7;
        axis.FontSize = TextSize;
        axis.TitleFontSize = TextSize;
        axis.AxisTitleDistance = 8;
        axis.MajorTickSize = 4;
        axis.MinorTickSize = 2;
        return axis;
    }
}
