using ResourceCheck.Quantities;

namespace ResourceCheck.Reports;

/// <summary>A value of a table, still typed: writers decide about digits and escapes.</summary>
internal abstract record Cell
{
    /// <summary>Nothing to show.</summary>
    public static Cell Empty { get; } = new TextCell("");

    /// <summary>A text cell; null is empty.</summary>
    public static Cell Of(string? text) => string.IsNullOrEmpty(text) ? Empty : new TextCell(text);

    /// <summary>A number cell; null is empty.</summary>
    public static Cell Of(double? value, string unit = FigureText.One, Rounding rounding = Rounding.Nearest) =>
        value is { } number ? new NumberCell(number, unit, rounding) : Empty;
}

/// <summary>Words.</summary>
internal sealed record TextCell(string Text) : Cell;

/// <summary>A number with its unit and the way it may be rounded for people.</summary>
internal sealed record NumberCell(double Value, string Unit, Rounding Rounding) : Cell;

/// <summary>A difference of two figures: what is below the round-off of both shows as 0. That of a bound is a bound itself, and says its side.</summary>
internal sealed record DifferenceCell(double Value, Rounding Rounding, string Side) : Cell
{
    /// <summary>The difference as people read it.</summary>
    public string Shown => Side + FigureText.Difference(Value, Rounding);
}
