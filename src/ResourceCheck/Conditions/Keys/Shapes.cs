using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Keys;

/// <summary>The shapes that several keys share.</summary>
internal static class Shapes
{
    /// <summary>More levels than any evaluator could hold.</summary>
    private const int MostLevels = 64;

    /// <summary>A probability.</summary>
    public static Shape Probability(string example) => new NumberShape(Bounds.Probability, example);

    /// <summary>A time from 0.</summary>
    public static Shape Duration(string example) => new QuantityShape([Dimension.Time], Bounds.NotNegative, example);

    /// <summary>A time constant: above 0.</summary>
    public static Shape TimeConstant(string example) => new QuantityShape([Dimension.Time], Bounds.Positive, example);

    /// <summary>A rate from 0.</summary>
    public static Shape Rate(string example) => new QuantityShape([Dimension.Rate], Bounds.NotNegative, example);

    /// <summary>A length from 0.</summary>
    public static Shape Length(string example) => new QuantityShape([Dimension.Length], Bounds.NotNegative, example);

    /// <summary>A speed above 0.</summary>
    public static Shape Speed { get; } = new QuantityShape([Dimension.Speed], Bounds.Positive, "2.04e8 m/s");

    /// <summary>An angle.</summary>
    public static Shape Angle(Bounds bounds, string example) => new QuantityShape([Dimension.Angle], bounds, example);

    /// <summary>The number of a level.</summary>
    public static Shape Level { get; } = new LevelShape();

    /// <summary>Two levels.</summary>
    public static Shape TwoLevels { get; } = new ListShape(Level, 2, 2, "two levels such as [0, 1]");

    /// <summary>A file name.</summary>
    public static Shape File { get; } = new TextShape(true);

    /// <summary>A list with one entry per level.</summary>
    public static Shape PerLevel(Shape item, string example) => new ListShape(item, 1, MostLevels, $"a list with one entry per level such as {example}");

    /// <summary>One shape, or a list of it.</summary>
    public static Shape OneOrSeveral(GroupShape group) => new ChoiceShape([group, new ListShape(group, 0, MostLevels * MostLevels, $"a list of such objects")]);

    /// <summary>A time constant for all pairs, or one per pair of levels.</summary>
    public static Shape PairTimes(string example) => new ChoiceShape([TimeConstant(example), new MapShape(MapKey.LevelPair, TimeConstant(example))]);
}
