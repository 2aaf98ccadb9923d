using System.Text;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Legends;
using OxyPlot.Series;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Reports;

namespace ResourceCheck.Figures;

/// <summary>Draws a loss budget: three bars for each source, told apart by lightness.</summary>
internal static class BudgetFigure
{
    private const double PerSource = 58;
    private const double Around = 120;

    /// <summary>Draws a budget; null when nothing is lost.</summary>
    public static FigureImage? Of(BudgetResult budget, string id)
    {
        if (budget.Shares.Count == 0)
            return null;
        SourceShare[] upwards = [.. budget.Shares.Reverse()];
        PlotModel model = PlotStyle.Model();
        CategoryAxis sources = new() { Position = AxisPosition.Left, GapWidth = 0.35 };
        sources.Labels.AddRange(upwards.Select(s => BudgetReport.Name(s.Source)));
        PlotStyle.Styled(sources, "");
        sources.MajorGridlineStyle = LineStyle.None;
        sources.TickStyle = TickStyle.None;
        model.Axes.Add(sources);
        model.Axes.Add(PlotStyle.Styled(new LinearAxis { Position = AxisPosition.Bottom, LabelFormatter = FigureNumbers.Tick, ExtraGridlines = [0], ExtraGridlineColor = PlotStyle.Ink, MaximumPadding = 0.06 }, $"loss of {Visible.InLine(budget.Metric)}"));
        Legend legend = PlotStyle.Legend();
        legend.LegendItemOrder = LegendItemOrder.Reverse;
        model.Legends.Add(legend);
        // Series stand from bottom to top, the legend reads from left to right.
        model.Series.Add(Bars("removed", upwards.Select(s => s.Removed), OxyColors.White));
        model.Series.Add(Bars("alone", upwards.Select(s => s.Alone), OxyColor.FromRgb(0xa9, 0xc1, 0xd6)));
        model.Series.Add(Bars("share", upwards.Select(s => s.Share), PlotStyle.Colour(0)));
        string title = $"{budget.Title}: where {budget.Metric} is lost";
        string description = $"Of a loss of {FigureText.Difference(budget.Loss)} in all, {string.Join("; ", budget.Shares.Select(s => $"{BudgetReport.Name(s.Source)} has a share of {FigureText.Difference(s.Share)}, alone {FigureText.Difference(s.Alone)}, regained when removed {FigureText.Difference(s.Removed)}"))}. All exact.";
        return new FigureImage(id, title, description, SvgText.Of(model, id, title, description, Around + (PerSource * upwards.Length)), Data(budget));
    }

    private static BarSeries Bars(string title, IEnumerable<double> values, OxyColor fill)
    {
        BarSeries bars = new() { Title = title, FillColor = fill, StrokeColor = PlotStyle.Ink, StrokeThickness = 0.8 };
        bars.Items.AddRange(values.Select(v => new BarItem(v)));
        return bars;
    }

    private static string Data(BudgetResult budget)
    {
        StringBuilder text = new("source share alone removed\n");
        foreach (SourceShare s in budget.Shares)
            text.Append($"{{{BudgetReport.Name(s.Source)}}} {FigureNumbers.Data(s.Share)} {FigureNumbers.Data(s.Alone)} {FigureNumbers.Data(s.Removed)}\n");
        return text.ToString();
    }
}
