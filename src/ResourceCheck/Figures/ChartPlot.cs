using System.Globalization;
using System.Text;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;
using ResourceCheck.Reports;

namespace ResourceCheck.Figures;

/// <summary>Draws curve charts.</summary>
internal static class ChartPlot
{
    /// <summary>Up to so many points each is marked; beyond, marks would run together.</summary>
    private const int MarkedPoints = 30;

    private const double Clearance = 0.04;
    private const double Thin = 1.2;

    /// <summary>Draws a chart.</summary>
    public static FigureImage Of(Chart chart)
    {
        PlotModel model = PlotStyle.Model();
        model.Axes.Add(Bottom(chart));
        model.Axes.Add(Left(chart));
        if (chart.Series.Count + chart.Lines.Count > 1)
            model.Legends.Add(PlotStyle.Legend());
        for (int i = 0; i < chart.Series.Count; i++)
        {
            if (Band(chart.Series[i], i) is { } band)
                model.Series.Add(band);
        }

        for (int i = 0; i < chart.Series.Count; i++)
            model.Series.Add(Curve(chart.Series[i], i));
        foreach (ChartLine line in chart.Lines)
            AddLine(model, line);
        return new FigureImage(chart.Id, chart.Title, chart.Description, SvgText.Of(model, chart.Id, chart.Title, chart.Description), Data(chart));
    }

    private static LineSeries Curve(ChartSeries series, int i)
    {
        LineSeries curve = new()
        {
            Title = Visible.InLine(series.Name),
            Color = series.Joined ? PlotStyle.Colour(i) : OxyColors.Transparent,
            LineStyle = series.Joined ? PlotStyle.Dash(i) : LineStyle.None,
            StrokeThickness = 1.7,
            LineJoin = LineJoin.Round,
        };
        if (!series.Joined || series.Points.Count <= MarkedPoints)
        {
            curve.MarkerType = PlotStyle.Marker(i);
            curve.MarkerSize = 3.2;
            curve.MarkerFill = i % 2 == 0 ? PlotStyle.Colour(i) : OxyColors.White;
            curve.MarkerStroke = PlotStyle.Colour(i);
            curve.MarkerStrokeThickness = 1.2;
        }

        curve.Points.AddRange(series.Points.Select(p => new DataPoint(p.X, double.IsFinite(p.Y) ? p.Y : double.NaN)));
        return curve;
    }

    private static Series? Band(ChartSeries series, int i)
    {
        ChartPoint[] known = [.. series.Points.Where(p => double.IsFinite(p.Low) && double.IsFinite(p.High) && p.High > p.Low)];
        if (known.Length == 0)
            return null;
        OxyColor fill = OxyColor.FromAColor(0x38, PlotStyle.Colour(i));
        if (series.Joined && known.Length > 1)
        {
            AreaSeries area = new() { Color = OxyColors.Transparent, Color2 = OxyColors.Transparent, Fill = fill, RenderInLegend = false, StrokeThickness = 0 };
            area.Points.AddRange(known.Select(p => new DataPoint(p.X, p.Low)));
            area.Points2.AddRange(known.Select(p => new DataPoint(p.X, p.High)));
            return area;
        }

        return new ScatterErrorSeries
        {
            ErrorBarColor = PlotStyle.Colour(i),
            MarkerType = MarkerType.None,
            RenderInLegend = false,
            ItemsSource = known.Select(p => new ScatterErrorPoint(p.X, (p.Low + p.High) / 2, 0, p.High - p.Low)).ToArray(),
        };
    }

    // Its words stand in the legend, where they cover no curve.
    private static void AddLine(PlotModel model, ChartLine line)
    {
        LineStyle style = line.IsVertical ? LineStyle.Dot : LineStyle.LongDash;
        model.Annotations.Add(new LineAnnotation
        {
            Type = line.IsVertical ? LineAnnotationType.Vertical : LineAnnotationType.Horizontal,
            X = line.IsVertical ? line.Value : 0,
            Y = line.IsVertical ? 0 : line.Value,
            Color = PlotStyle.Goal,
            LineStyle = style,
            StrokeThickness = Thin,
            Layer = AnnotationLayer.BelowSeries,
        });
        model.Series.Add(new LineSeries { Title = Visible.InLine(line.Text), Color = PlotStyle.Goal, LineStyle = style, StrokeThickness = Thin });
    }

    private static Axis Bottom(Chart chart)
    {
        double[] x = [.. chart.Series.SelectMany(s => s.Points).Select(p => p.X).Concat(chart.Lines.Where(l => l.IsVertical).Select(l => l.Value)).Where(double.IsFinite)];
        return Axis(chart.X, AxisPosition.Bottom, x, padded: chart.Series.Any(s => !s.Joined) || x.Distinct().Count() < 2);
    }

    private static Axis Left(Chart chart)
    {
        double[] y = [.. chart.Series.SelectMany(s => s.Points).SelectMany(p => (double[])[p.Y, p.Low, p.High]).Concat(chart.Lines.Where(l => !l.IsVertical).Select(l => l.Value)).Where(double.IsFinite)];
        return Axis(chart.Y, AxisPosition.Left, y, padded: true);
    }

    private static Axis Axis(ChartAxis form, AxisPosition position, double[] values, bool padded)
    {
        double[] usable = [.. form.IsLogarithmic ? values.Where(v => v > 0) : values];
        (double low, double high) = usable.Length == 0 ? (form.IsLogarithmic ? (0.1, 1.0) : (0.0, 1.0)) : (usable.Min(), usable.Max());
        Axis axis = form.IsLogarithmic ? Logarithmic(low, high) : Linear(form, low, high, padded);
        axis.Position = position;
        return PlotStyle.Styled(axis, Visible.InLine(form.Title));
    }

    private static LogarithmicAxis Logarithmic(double low, double high) => new()
    {
        Minimum = low == high ? low / 10 : low / 1.15,
        Maximum = low == high ? high * 10 : high * 1.15,
        UseSuperExponentialFormat = false,
        LabelFormatter = v => FigureNumbers.Tick(v),
    };

    private static LinearAxis Linear(ChartAxis form, double low, double high, bool padded)
    {
        double span = high > low ? high - low : Math.Max(Math.Abs(high), 1) * 0.1;
        double pad = padded || high == low ? Clearance * span : 0;
        LinearAxis axis = new() { Minimum = low - pad, Maximum = high + pad, LabelFormatter = FigureNumbers.Tick, IntervalLength = 70 };
        if (form.WholeOnly)
            axis.MinimumMajorStep = 1;
        if (form.WholeOnly)
            axis.MinimumMinorStep = 1;
        return axis;
    }

    private static string Data(Chart chart)
    {
        StringBuilder text = new("x");
        foreach ((ChartSeries series, int i) in chart.Series.Select((s, i) => (s, i + 1)))
            text.Append(CultureInfo.InvariantCulture, $" y{i} low{i} high{i}");
        text.Append('\n');
        double[] xs = [.. chart.Series.SelectMany(s => s.Points.Select(p => p.X)).Distinct().Order()];
        foreach (double x in xs)
        {
            text.Append(FigureNumbers.Data(x));
            foreach (ChartSeries series in chart.Series)
            {
                ChartPoint point = series.Points.Where(p => p.X == x).DefaultIfEmpty(new ChartPoint(x, double.NaN)).First();
                text.Append(CultureInfo.InvariantCulture, $" {FigureNumbers.Data(point.Y)} {FigureNumbers.Data(point.Low)} {FigureNumbers.Data(point.High)}");
            }

            text.Append('\n');
        }

        foreach ((ChartSeries series, int i) in chart.Series.Select((s, i) => (s, i + 1)))
            text.Append(CultureInfo.InvariantCulture, $"# y{i}: {Visible.InLine(series.Name)}\n");
        return text.ToString();
    }
}
