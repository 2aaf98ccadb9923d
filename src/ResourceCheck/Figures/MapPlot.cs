using System.Globalization;
using System.Text;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;
using ResourceCheck.Judgement.Studies;
using ResourceCheck.Quantities;
using ResourceCheck.Reports;

namespace ResourceCheck.Figures;

/// <summary>Draws a figure over two varied values, with the contour at its goal. Darker is more, so that it reads in grey.</summary>
internal static class MapPlot
{
    private const double MapHeight = 440;
    private const double BarWidth = 16;
    private const double Thick = 2;

    private static readonly OxyPalette Lightness = OxyPalette.Interpolate(64, OxyColor.FromRgb(0xfa, 0xfa, 0xf7), OxyColor.FromRgb(0xb4, 0xcc, 0xdd), OxyColor.FromRgb(0x4d, 0x84, 0xad));

    /// <summary>Draws a map.</summary>
    /// <param name="sweep">Sweep of two values.</param>
    /// <param name="figure">Figure shown.</param>
    /// <param name="id">Name of the map.</param>
    public static FigureImage Of(SweepResult sweep, string figure, string id)
    {
        Variation x = sweep.Varied[0], y = sweep.Varied[1];
        double[,] values = Values(sweep, figure);
        SweepGoal? goal = sweep.Goals.FirstOrDefault(g => g.Figure == figure);
        PlotModel model = PlotStyle.Model();
        model.Axes.Add(Along(x, AxisPosition.Bottom));
        model.Axes.Add(Along(y, AxisPosition.Left));
        model.Axes.Add(Colours(values, figure));
        model.Series.Add(new HeatMapSeries
        {
            X0 = Position(x, x.Values[0]),
            X1 = Position(x, x.Values[^1]),
            Y0 = Position(y, y.Values[0]),
            Y1 = Position(y, y.Values[^1]),
            Data = values,
            Interpolate = false,
            RenderMethod = HeatMapRenderMethod.Rectangles,
            EdgeRenderingMode = EdgeRenderingMode.PreferSharpness,
        });
        if (goal is not null)
        {
            model.Series.Add(Contour(x, y, values, goal));
            model.Series.Add(new LineSeries { Title = Visible.InLine($"goal: {goal.Text}"), Color = PlotStyle.Ink, StrokeThickness = Thick });
            model.Legends.Add(PlotStyle.Legend());
        }

        string title = $"{sweep.Title}: {figure} against {x.Path} and {y.Path}";
        string description = Describe(sweep, figure, goal, values);
        return new FigureImage(id, title, description, SvgText.Of(model, id, title, description, MapHeight), Data(sweep, figure));
    }

    private static ContourSeries Contour(Variation x, Variation y, double[,] values, SweepGoal goal) => new()
    {
        ColumnCoordinates = [.. x.Values.Select(v => Position(x, v))],
        RowCoordinates = [.. y.Values.Select(v => Position(y, v))],
        ContourLevels = [goal.Threshold],
        ContourColors = [PlotStyle.Ink],
        Data = values,
        StrokeThickness = Thick,
        LineStyle = LineStyle.Solid,
        LabelSpacing = double.PositiveInfinity,
    };

    private static LinearAxis Along(Variation varied, AxisPosition position)
    {
        LinearAxis axis = new()
        {
            Position = position,
            LabelFormatter = p => FigureNumbers.Tick(varied.IsLogarithmic ? Math.Pow(10, p) : p),
        };
        if (varied.IsLogarithmic)
            axis.MajorStep = Math.Max(1, Math.Ceiling(Math.Log10(varied.To / varied.From) / 6));
        if (varied.WholeOnly)
            axis.MinimumMajorStep = 1;
        PlotStyle.Styled(axis, Visible.InLine(SweepFigures.AxisTitle(varied)));
        axis.MajorGridlineStyle = LineStyle.None;
        return axis;
    }

    private static LinearColorAxis Colours(double[,] values, string figure)
    {
        double[] known = [.. values.Cast<double>().Where(double.IsFinite)];
        LinearColorAxis axis = new() { Position = AxisPosition.Right, Palette = Lightness, InvalidNumberColor = OxyColors.White, LabelFormatter = FigureNumbers.Tick };
        if (known.Length > 0 && known.Min() < known.Max())
            (axis.Minimum, axis.Maximum) = (known.Min(), known.Max());
        PlotStyle.Styled(axis, Visible.InLine(figure));
        axis.MajorGridlineStyle = LineStyle.None;
        axis.MajorTickSize = BarWidth; // the library takes the width of the bar from it
        axis.MinorTickSize = 0;
        return axis;
    }

    private static double Position(Variation varied, double value) => varied.IsLogarithmic ? Math.Log10(value) : value;

    private static double[,] Values(SweepResult sweep, string figure)
    {
        int rows = sweep.Varied[1].Values.Count;
        double[,] values = new double[sweep.Varied[0].Values.Count, rows];
        for (int i = 0; i < sweep.Points.Count; i++)
            values[i / rows, i % rows] = SweepFigures.FigureOf(sweep.Points[i], figure)?.Value ?? double.NaN;
        return values;
    }

    private static string Describe(SweepResult sweep, string figure, SweepGoal? goal, double[,] values)
    {
        double[] known = [.. values.Cast<double>().Where(double.IsFinite)];
        string range = known.Length == 0 ? "nothing could be computed" : $"{figure} lies between {FigureText.Number(known.Min())} and {FigureText.Number(known.Max())}";
        string met = goal is null ? "" : $" The line is the goal {goal.Text}.";
        string over = string.Join(" and ", sweep.Varied.Select(v => $"{v.Path} from {SweepFigures.Value(v, v.From)} to {SweepFigures.Value(v, v.To)}"));
        return $"Over {over}, {range}; darker is more.{met}";
    }

    private static string Data(SweepResult sweep, string figure)
    {
        StringBuilder text = new("x y z\n");
        int rows = sweep.Varied[1].Values.Count;
        for (int i = 0; i < sweep.Points.Count; i++)
        {
            SweepPoint p = sweep.Points[i];
            text.Append(CultureInfo.InvariantCulture, $"{FigureNumbers.Data(p.Values[0])} {FigureNumbers.Data(p.Values[1])} {FigureNumbers.Data(SweepFigures.FigureOf(p, figure)?.Value ?? double.NaN)}\n");
            if (i % rows == rows - 1)
                text.Append('\n'); // pgfplots takes a blank line for the end of a scan line
        }

        return text.ToString();
    }
}
