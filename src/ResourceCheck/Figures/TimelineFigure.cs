using System.Globalization;
using System.Text;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;
using ResourceCheck.Reports;
using ResourceCheck.Timeline;

namespace ResourceCheck.Figures;

/// <summary>Draws who holds, does and tells what when: a lane for each party, messages as arrows.</summary>
internal static class TimelineFigure
{
    private const double PerLane = 44;
    private const double Around = 110;
    private const double Half = 0.22;
    private const string Everybody = "all";

    private static readonly (TimelineKind Kind, string Name, OxyColor Fill)[] Spans =
    [
        (TimelineKind.Storage, "stored side by side", OxyColor.FromRgb(0xe6, 0xd2, 0xa8)),
        (TimelineKind.Flight, "qudit travels", OxyColor.FromRgb(0x6f, 0x93, 0xb5)),
        (TimelineKind.Waiting, "qudit waits", OxyColor.FromRgb(0xe4, 0xe4, 0xe4)),
    ];

    private static readonly (TimelineKind Kind, string Name, MarkerType Marker, OxyColor Fill)[] Marks =
    [
        (TimelineKind.Operation, "local operation", MarkerType.Square, PlotStyle.Colour(0)),
        (TimelineKind.Detection, "measurement", MarkerType.Circle, PlotStyle.Colour(0)),
        (TimelineKind.Interception, "interception", MarkerType.Diamond, PlotStyle.Colour(1)),
    ];

    /// <summary>Draws a timeline; null when nothing takes time.</summary>
    public static FigureImage? Of(RunResult run, string id)
    {
        string[] parties = run.Parties.Count > 0 ? [.. run.Parties] : [.. run.Timeline.SelectMany(l => (string?[])[l.Party, l.To]).OfType<string>().Where(p => p != Everybody).Distinct()];
        double end = run.Timeline.Count == 0 ? 0 : run.Timeline.Max(l => l.End);
        if (!(end > 0) || parties.Length == 0)
            return null;
        (double size, string unit) = TimeUnit.For(end);
        PlotModel model = PlotStyle.Model();
        model.Axes.Add(Lanes(parties));
        model.Axes.Add(PlotStyle.Styled(new LinearAxis { Position = AxisPosition.Bottom, Minimum = -0.015 * end / size, Maximum = 1.02 * end / size, LabelFormatter = FigureNumbers.Tick }, $"time ({unit})"));
        model.Legends.Add(PlotStyle.Legend());
        foreach (ScheduleLine line in run.Timeline)
            Add(model, line, parties, size);
        Explain(model, run.Timeline);
        string title = $"{run.Title}: timeline of parties and messages";
        string description = $"One copy takes {FigureText.Time(end)}. {Sentences(run.Timeline)}";
        return new FigureImage(id, title, description, SvgText.Of(model, id, title, description, Around + (PerLane * parties.Length)), Data(run.Timeline));
    }

    private static LinearAxis Lanes(string[] parties)
    {
        LinearAxis lanes = new()
        {
            Position = AxisPosition.Left,
            Minimum = -0.6,
            Maximum = parties.Length - 0.4,
            StartPosition = 1,
            EndPosition = 0,
            MajorStep = 1,
            MinorTickSize = 0,
            LabelFormatter = v => Math.Round(v) is var i && Math.Abs(v - i) < 1e-9 && i >= 0 && i < parties.Length ? Visible.InLine(parties[(int)i]) : "",
        };
        PlotStyle.Styled(lanes, "");
        lanes.MinorTickSize = 0;
        lanes.TickStyle = TickStyle.None;
        return lanes;
    }

    private static void Add(PlotModel model, ScheduleLine line, string[] parties, double size)
    {
        int[] lanes = line.Party == Everybody ? [.. Enumerable.Range(0, parties.Length)] : [Array.IndexOf(parties, line.Party)];
        double start = line.Start / size, end = line.End / size;
        if (line.Kind == TimelineKind.Message)
        {
            int from = lanes[0];
            foreach (int to in Enumerable.Range(0, parties.Length).Where(p => p != from && (line.To is null or Everybody || line.To == parties[p])))
                model.Annotations.Add(Arrow(start, from, end, to));
        }
        else if (Spans.FirstOrDefault(s => s.Kind == line.Kind) is { Name: not null } span && end > start)
        {
            foreach (int lane in lanes)
                model.Annotations.Add(new RectangleAnnotation { MinimumX = start, MaximumX = end, MinimumY = lane - Half, MaximumY = lane + Half, Fill = span.Fill, Stroke = PlotStyle.Ink, StrokeThickness = 0.6, Layer = AnnotationLayer.BelowSeries });
        }
        else if (line.Kind == TimelineKind.Checkpoint)
        {
            model.Annotations.Add(new LineAnnotation { Type = LineAnnotationType.Vertical, X = start, Color = PlotStyle.Goal, LineStyle = LineStyle.Dot, StrokeThickness = 1.2, Layer = AnnotationLayer.BelowSeries });
        }
        else if (Marks.FirstOrDefault(m => m.Kind == line.Kind) is { Name: not null } mark)
        {
            foreach (int lane in lanes)
                model.Annotations.Add(new PointAnnotation { X = start, Y = lane, Shape = mark.Marker, Size = 4.5, Fill = mark.Fill, Stroke = PlotStyle.Ink, StrokeThickness = 1, Layer = AnnotationLayer.AboveSeries });
        }
    }

    private static ArrowAnnotation Arrow(double start, int from, double end, int to) => new()
    {
        StartPoint = new DataPoint(start, from + (to > from ? Half : -Half)),
        EndPoint = new DataPoint(end, to - (to > from ? Half : -Half)),
        Color = PlotStyle.Colour(1),
        StrokeThickness = 1.4,
        HeadLength = 6,
        HeadWidth = 2.6,
        Layer = AnnotationLayer.AboveSeries,
    };

    // Annotations have no place in a legend; series without points have.
    private static void Explain(PlotModel model, IReadOnlyList<ScheduleLine> timeline)
    {
        foreach ((TimelineKind kind, string name, OxyColor fill) in Spans.Where(s => timeline.Any(l => l.Kind == s.Kind && l.End > l.Start)))
            model.Series.Add(new LineSeries { Title = name, Color = OxyColors.Transparent, MarkerType = MarkerType.Square, MarkerSize = 6, MarkerFill = fill, MarkerStroke = PlotStyle.Ink, MarkerStrokeThickness = 0.6 });
        foreach ((TimelineKind kind, string name, MarkerType marker, OxyColor fill) in Marks.Where(m => timeline.Any(l => l.Kind == m.Kind)))
            model.Series.Add(new LineSeries { Title = name, Color = OxyColors.Transparent, MarkerType = marker, MarkerSize = 4.5, MarkerFill = fill, MarkerStroke = PlotStyle.Ink, MarkerStrokeThickness = 1 });
        if (timeline.Any(l => l.Kind == TimelineKind.Checkpoint))
            model.Series.Add(new LineSeries { Title = "fidelity is taken", Color = PlotStyle.Goal, LineStyle = LineStyle.Dot, StrokeThickness = 1.2 });
        if (timeline.Any(l => l.Kind == TimelineKind.Message))
            model.Series.Add(new LineSeries { Title = "message", Color = PlotStyle.Colour(1), StrokeThickness = 1.4 });
    }

    private static string Sentences(IReadOnlyList<ScheduleLine> timeline) => string.Join(" ", timeline.Where(l => l.Kind is TimelineKind.Flight or TimelineKind.Detection or TimelineKind.Message or TimelineKind.Operation)
        .Select(l => $"{FigureText.Time(l.Start)}{(l.End > l.Start ? $" to {FigureText.Time(l.End)}" : "")}: {l.Party}, {InspectReport.Name(l.Kind)}, {l.Text}{(l.To is null ? "" : $", to {l.To}")}."));

    private static string Data(IReadOnlyList<ScheduleLine> timeline)
    {
        StringBuilder text = new("start end party kind to\n");
        foreach (ScheduleLine l in timeline)
            text.Append(CultureInfo.InvariantCulture, $"{FigureNumbers.Data(l.Start)} {FigureNumbers.Data(l.End)} {{{l.Party}}} {InspectReport.Name(l.Kind)} {{{l.To}}}\n");
        return text.ToString();
    }
}
