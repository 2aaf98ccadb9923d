namespace ResourceCheck.Figures;

/// <summary>What a curve chart shows, before it is drawn.</summary>
/// <param name="Id">Name of the figure.</param>
/// <param name="Title">Title.</param>
/// <param name="Description">What there is to see.</param>
/// <param name="X">Horizontal axis.</param>
/// <param name="Y">Vertical axis.</param>
/// <param name="Series">Series in the order of the legend.</param>
/// <param name="Lines">Lines across: goals, targets, tolerated values.</param>
internal sealed record Chart(
    string Id, string Title, string Description, ChartAxis X, ChartAxis Y, IReadOnlyList<ChartSeries> Series, IReadOnlyList<ChartLine> Lines);

/// <summary>An axis.</summary>
/// <param name="Title">Quantity and unit.</param>
/// <param name="IsLogarithmic">Whether it is logarithmic.</param>
/// <param name="WholeOnly">Whether only whole numbers are marked.</param>
internal sealed record ChartAxis(string Title, bool IsLogarithmic = false, bool WholeOnly = false);

/// <summary>A series.</summary>
/// <param name="Name">Name in the legend, with the truth label where it is not exact.</param>
/// <param name="Points">Points; one without a value leaves a gap.</param>
/// <param name="Joined">Whether points are joined: not where nothing lies between them.</param>
internal sealed record ChartSeries(string Name, IReadOnlyList<ChartPoint> Points, bool Joined = true);

/// <summary>A point with an interval, if it has one.</summary>
internal readonly record struct ChartPoint(double X, double Y, double Low = double.NaN, double High = double.NaN);

/// <summary>A line across the chart.</summary>
/// <param name="Value">Where.</param>
/// <param name="Text">Words beside it.</param>
/// <param name="IsVertical">Whether it stands at a value of the horizontal axis.</param>
internal sealed record ChartLine(double Value, string Text, bool IsVertical = false);
