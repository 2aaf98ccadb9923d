using ResourceCheck.Conditions.Json;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Keys;

/// <summary>What a value of the conditions file must look like. One tree of shapes drives reading, suggestions, the JSON schema and the reference page.</summary>
internal abstract record Shape
{
    /// <summary>In words, with an example: "a time such as \"80 us\"".</summary>
    public abstract string InWords { get; }

    /// <summary>Whether a node is of a kind that this shape can judge; decides between the options of a <see cref="ChoiceShape"/>.</summary>
    public abstract bool Judges(Node node);
}

/// <summary>Which numbers are taken.</summary>
internal enum Bounds
{
    /// <summary>Every finite number.</summary>
    Any,

    /// <summary>0 and above.</summary>
    NotNegative,

    /// <summary>Above 0.</summary>
    Positive,

    /// <summary>0 to 1.</summary>
    Probability,
}

/// <summary>A number with a unit.</summary>
/// <param name="Fits">Dimensions taken; the first is the one named in messages.</param>
/// <param name="Bounds">Range.</param>
/// <param name="Example">A value that fits, with its unit.</param>
internal sealed record QuantityShape(IReadOnlyList<Dimension> Fits, Bounds Bounds, string Example) : Shape
{
    /// <inheritdoc/>
    public override string InWords => $"{UnitTable.NameOf(Fits[0])} such as \"{Example}\"";

    /// <summary>Whether the unit may be left out: the radian is the number 1.</summary>
    public bool TakesBareNumbers => Fits.Contains(Dimension.Angle);

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is TextNode or NumberNode;
}

/// <summary>A plain number; as a text it may carry its uncertainty.</summary>
/// <param name="Bounds">Range.</param>
/// <param name="Example">A value that fits.</param>
internal sealed record NumberShape(Bounds Bounds, string Example) : Shape
{
    /// <inheritdoc/>
    public override string InWords => Bounds == Bounds.Probability ? $"a number from 0 to 1 such as {Example}" : $"a number such as {Example}";

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is TextNode or NumberNode;
}

/// <summary>The number of a level, from 0; how many there are is known when a protocol is.</summary>
internal sealed record LevelShape : Shape
{
    /// <inheritdoc/>
    public override string InWords => "the number of a level, 0, 1, 2 …";

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is NumberNode;
}

/// <summary>A text in one line.</summary>
/// <param name="IsFile">Whether it names a file.</param>
internal sealed record TextShape(bool IsFile) : Shape
{
    /// <inheritdoc/>
    public override string InWords => IsFile ? "a file name" : "a text in one line";

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is TextNode;
}

/// <summary>One of several words.</summary>
/// <param name="Words">The words.</param>
internal sealed record WordShape(IReadOnlyList<string> Words) : Shape
{
    /// <inheritdoc/>
    public override string InWords => Phrase.Or(Words.Select(w => $"\"{w}\""));

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is TextNode;
}

/// <summary><c>true</c> or <c>false</c>.</summary>
internal sealed record FlagShape : Shape
{
    /// <inheritdoc/>
    public override string InWords => "true or false";

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is TruthNode;
}

/// <summary>A list.</summary>
/// <param name="Item">Shape of every item.</param>
/// <param name="Least">Least number of items.</param>
/// <param name="Most">Largest number of items.</param>
/// <param name="Words">In words.</param>
internal sealed record ListShape(Shape Item, int Least, int Most, string Words) : Shape
{
    /// <inheritdoc/>
    public override string InWords => Words;

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is ArrayNode;
}

/// <summary>An object with fixed keys.</summary>
/// <param name="Name">Name of the group in the schema.</param>
/// <param name="Keys">The keys.</param>
/// <param name="Alternatives">Sets of keys of which at most one may be given.</param>
internal sealed record GroupShape(string Name, IReadOnlyList<Key> Keys, IReadOnlyList<Alternative> Alternatives) : Shape
{
    /// <inheritdoc/>
    public override string InWords => Keys.Any(k => k.Required)
        ? $"an object with {Phrase.And(Keys.Where(k => k.Required).Select(k => $"`{k.Name}`"))}"
        : $"an object with keys such as `{Keys[0].Name}`";

    /// <summary>The key with a name; null when there is none.</summary>
    public Key? Find(string name) => Keys.FirstOrDefault(k => k.Name == name);

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is ObjectNode;
}

/// <summary>A key of a group.</summary>
/// <param name="Name">As written in the file.</param>
/// <param name="Shape">What its value must look like.</param>
/// <param name="Default">What holds when it is absent, in words.</param>
/// <param name="Meaning">What it says, in one sentence without its end.</param>
/// <param name="Required">Whether its group makes no sense without it.</param>
internal sealed record Key(string Name, Shape Shape, string Default, string Meaning, bool Required = false);

/// <summary>Keys that say the same thing in different ways.</summary>
/// <param name="Names">The keys.</param>
/// <param name="Required">Whether one of them must be given.</param>
/// <param name="MayMeet">Whether a finer check decides if they contradict each other; a party that gives one still does not inherit another.</param>
internal sealed record Alternative(IReadOnlyList<string> Names, bool Required, bool MayMeet = false);

/// <summary>A section that is either plain or per party.</summary>
/// <param name="Group">The keys.</param>
internal sealed record PartyShape(GroupShape Group) : Shape
{
    /// <inheritdoc/>
    public override string InWords => $"an object with keys such as `{Group.Keys[0].Name}`, or with `default` and party names";

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is ObjectNode;
}

/// <summary>What the keys of a map name.</summary>
internal enum MapKey
{
    /// <summary>A level: <c>"2"</c>.</summary>
    Level,

    /// <summary>Two different levels: <c>"0-2"</c>.</summary>
    LevelPair,

    /// <summary>Two different qudits, counted from 1: <c>"1-3"</c>.</summary>
    QuditPair,

    /// <summary>Two parties: <c>"Ada-Ben"</c>.</summary>
    PartyPair,
}

/// <summary>An object whose keys are indices or names.</summary>
/// <param name="Keys">What the keys name.</param>
/// <param name="Item">Shape of every value.</param>
internal sealed record MapShape(MapKey Keys, Shape Item) : Shape
{
    /// <inheritdoc/>
    public override string InWords => $"an object such as {{\"{KeyExample}\": …}}";

    /// <summary>A key that fits.</summary>
    public string KeyExample => Keys switch
    {
        MapKey.Level => "1",
        MapKey.LevelPair => "0-1",
        MapKey.QuditPair => "1-3",
        _ => "Ada-Ben",
    };

    /// <inheritdoc/>
    public override bool Judges(Node node) => node is ObjectNode;
}

/// <summary>One of several shapes, told apart by the kind of JSON value.</summary>
/// <param name="Options">The shapes.</param>
internal sealed record ChoiceShape(IReadOnlyList<Shape> Options) : Shape
{
    /// <inheritdoc/>
    public override string InWords => Phrase.Or(Options.Select(o => o.InWords));

    /// <inheritdoc/>
    public override bool Judges(Node node) => Options.Any(o => o.Judges(node));
}
