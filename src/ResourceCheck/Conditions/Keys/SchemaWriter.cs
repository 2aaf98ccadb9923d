using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Keys;

/// <summary>Writes the table of keys as a JSON schema (draft 7, which editors know best).</summary>
internal sealed class SchemaWriter
{
    /// <summary>A number with its optional uncertainty and exponent, as <see cref="QuantityParser"/> reads it.</summary>
    private const string NumberPattern = @"[0-9]+(\.[0-9]+)?(\([0-9]+(\.[0-9]+)?\))?([eE][+-]?[0-9]+)?";

    private const string PartyNamePattern = @"[^\s.\[\]-]+(\[[0-9]+(\.\.[0-9]+)?\])?";

    private static readonly JsonWriterOptions Options = new() { Indented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, NewLine = "\n" };

    private readonly Utf8JsonWriter _json;
    private readonly Dictionary<string, GroupShape> _definitions = [];

    private SchemaWriter(Utf8JsonWriter json) => _json = json;

    /// <summary>The schema of a file whose root is the given group, ending with a newline.</summary>
    public static string Write(GroupShape root)
    {
        using MemoryStream bytes = new();
        using (Utf8JsonWriter json = new(bytes, Options))
            new SchemaWriter(json).WriteRoot(root);
        return Encoding.UTF8.GetString(bytes.ToArray()) + "\n";
    }

    private void WriteRoot(GroupShape root)
    {
        _json.WriteStartObject();
        _json.WriteString("$schema", "http://json-schema.org/draft-07/schema#");
        _json.WriteString("title", "ResourceCheck conditions");
        WriteGroupBody(root, true);
        _json.WriteStartObject("definitions");
        HashSet<string> written = [];
        while (_definitions.Values.FirstOrDefault(g => written.Add(g.Name)) is { } group)
        {
            _json.WriteStartObject(group.Name);
            WriteGroupBody(group, true);
            _json.WriteEndObject();
            // an entry for a party may leave to `default` what the group asks for
            _json.WriteStartObject(group.Name + "OfParty");
            WriteGroupBody(group, false);
            _json.WriteEndObject();
        }

        _json.WriteEndObject();
        _json.WriteEndObject();
    }

    private void WriteGroupBody(GroupShape group, bool complete)
    {
        _json.WriteString("type", "object");
        _json.WriteStartObject("properties");
        foreach (Key key in group.Keys)
        {
            _json.WriteStartObject(key.Name);
            _json.WriteString("description", Capital(key.Meaning));
            WriteShape(key.Shape, complete);
            _json.WriteEndObject();
        }

        _json.WriteEndObject();
        _json.WriteBoolean("additionalProperties", false);
        if (complete)
            WriteRequired(group);
        WriteExclusions(group);
    }

    private void WriteRequired(GroupShape group)
    {
        if (group.Keys.Any(k => k.Required))
            WriteNames("required", group.Keys.Where(k => k.Required).Select(k => k.Name));
    }

    /// <summary>Of each set of alternatives at most one, and exactly one where one is needed.</summary>
    private void WriteExclusions(GroupShape group)
    {
        IEnumerable<string[]> pairs = group.Alternatives.Where(a => !a.MayMeet).SelectMany(a => a.Names.SelectMany((x, i) => a.Names.Skip(i + 1).Select(y => new[] { x, y })));
        string[][] exclusive = [.. pairs];
        if (exclusive.Length == 0)
            return;
        _json.WriteStartArray("allOf");
        foreach (string[] pair in exclusive)
        {
            _json.WriteStartObject();
            _json.WriteStartObject("not");
            WriteNames("required", pair);
            _json.WriteEndObject();
            _json.WriteEndObject();
        }

        _json.WriteEndArray();
    }

    private void WriteShape(Shape shape, bool complete)
    {
        switch (shape)
        {
            case GroupShape group:
                WriteReference(group, complete);
                break;
            case PartyShape party:
                WritePartySection(party.Group);
                break;
            case MapShape map:
                WriteMap(map, complete);
                break;
            case ListShape list:
                WriteList(list);
                break;
            case ChoiceShape choice:
                WriteAny(choice.Options, complete);
                break;
            default:
                WriteScalar(shape);
                break;
        }
    }

    private void WriteReference(GroupShape group, bool complete)
    {
        _definitions[group.Name] = group;
        WriteAllOf($"#/definitions/{group.Name}{(complete ? "" : "OfParty")}");
    }

    /// <summary>Draft 7 ignores what stands beside a bare reference, so that the description would be lost.</summary>
    private void WriteAllOf(string reference)
    {
        _json.WriteStartArray("allOf");
        _json.WriteStartObject();
        _json.WriteString("$ref", reference);
        _json.WriteEndObject();
        _json.WriteEndArray();
    }

    private void WritePartySection(GroupShape group)
    {
        _json.WriteStartArray("anyOf");
        _json.WriteStartObject();
        WriteReference(group, true);
        _json.WriteEndObject();
        _json.WriteStartObject();
        _json.WriteString("type", "object");
        _json.WriteStartObject("not");
        _json.WriteStartArray("anyOf");
        foreach (Key key in group.Keys)
        {
            _json.WriteStartObject();
            WriteNames("required", [key.Name]);
            _json.WriteEndObject();
        }

        _json.WriteEndArray();
        _json.WriteEndObject();
        WritePatterned($"^{PartyNamePattern}$", () => WriteReference(group, false));
        _json.WriteEndObject();
        _json.WriteEndArray();
    }

    private void WriteMap(MapShape map, bool complete)
    {
        _json.WriteString("type", "object");
        string pattern = map.Keys switch
        {
            MapKey.Level => "[0-9]+",
            MapKey.LevelPair or MapKey.QuditPair => "[0-9]+-[0-9]+",
            _ => $"{PartyNamePattern}-{PartyNamePattern}",
        };
        WritePatterned($"^{pattern}$", () => WriteShape(map.Item, complete));
    }

    private void WritePatterned(string pattern, Action body)
    {
        _json.WriteStartObject("patternProperties");
        _json.WriteStartObject(pattern);
        body();
        _json.WriteEndObject();
        _json.WriteEndObject();
        _json.WriteBoolean("additionalProperties", false);
    }

    private void WriteList(ListShape list)
    {
        _json.WriteString("type", "array");
        _json.WriteNumber("minItems", list.Least);
        _json.WriteNumber("maxItems", list.Most);
        _json.WriteStartObject("items");
        WriteShape(list.Item, true);
        _json.WriteEndObject();
    }

    private void WriteAny(IReadOnlyList<Shape> options, bool complete)
    {
        _json.WriteStartArray("anyOf");
        foreach (Shape option in options)
        {
            _json.WriteStartObject();
            WriteShape(option, complete);
            _json.WriteEndObject();
        }

        _json.WriteEndArray();
    }

    private void WriteScalar(Shape shape)
    {
        switch (shape)
        {
            case FlagShape:
                _json.WriteString("type", "boolean");
                break;
            case LevelShape:
                _json.WriteString("type", "integer");
                _json.WriteNumber("minimum", 0);
                break;
            case WordShape word:
                WriteNames("enum", word.Words);
                break;
            case QuantityShape { TakesBareNumbers: false } quantity:
                WriteQuantityText(quantity);
                break;
            case QuantityShape quantity:
                WriteNumberOr(quantity.Bounds, () => WriteQuantityText(quantity));
                break;
            case NumberShape number:
                WriteNumberOr(number.Bounds, () => WritePattern($"^{Sign(number.Bounds)}{NumberPattern}$"));
                break;
            default:
                _json.WriteString("type", "string");
                break;
        }
    }

    private void WriteQuantityText(QuantityShape quantity)
    {
        string units = string.Join('|', quantity.Fits.SelectMany(UnitTable.SymbolsOf));
        WritePattern($"^{Sign(quantity.Bounds)}{NumberPattern}\\s*({units}){(quantity.TakesBareNumbers ? "?" : "")}$");
        WriteNames("examples", [quantity.Example]);
    }

    private void WriteNumberOr(Bounds bounds, Action text)
    {
        _json.WriteStartArray("anyOf");
        _json.WriteStartObject();
        _json.WriteString("type", "number");
        if (bounds != Bounds.Any)
            _json.WriteNumber("minimum", 0);
        if (bounds == Bounds.Probability)
            _json.WriteNumber("maximum", 1);
        _json.WriteEndObject();
        _json.WriteStartObject();
        text();
        _json.WriteEndObject();
        _json.WriteEndArray();
    }

    private void WritePattern(string pattern)
    {
        _json.WriteString("type", "string");
        _json.WriteString("pattern", pattern);
    }

    private static string Sign(Bounds bounds) => bounds == Bounds.Any ? "[+-]?" : "\\+?";

    private void WriteNames(string name, IEnumerable<string> values)
    {
        _json.WriteStartArray(name);
        foreach (string value in values)
            _json.WriteStringValue(value);
        _json.WriteEndArray();
    }

    private static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];
}
