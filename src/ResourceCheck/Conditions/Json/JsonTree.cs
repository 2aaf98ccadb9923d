using System.Text;
using System.Text.Json;
using ResourceCheck.Scripts;

namespace ResourceCheck.Conditions.Json;

/// <summary>
/// Reads strict JSON (RFC 8259) into a tree with places. The reader of the base library is used because it refuses trailing commas, single quotes and NaN by itself and tells where every token starts.
/// </summary>
internal sealed class JsonTree
{
    /// <summary>Longest text taken, in characters: conditions are written by people, anything larger is a mistaken file.</summary>
    public const int MaxLength = 4 * 1024 * 1024;

    /// <summary>Deepest nesting taken; the deepest that any key needs is 7.</summary>
    public const int MaxDepth = 32;

    /// <summary>Length of what opens a comment.</summary>
    private const int CommentMark = 2;

    private readonly SourceText _source;
    private readonly bool _isOption;
    private readonly Findings _findings;
    private readonly byte[] _bytes;
    private int _lastByte;
    private int _lastChar;
    private bool _rootRead;
    private bool _tooDeep;

    private JsonTree(SourceText source, bool isOption, Findings findings)
    {
        _source = source;
        _isOption = isOption;
        _findings = findings;
        _bytes = Encoding.UTF8.GetBytes(source.Text);
    }

    /// <summary>The tree; null when the text is not JSON, which the findings then tell.</summary>
    public static Node? Read(SourceText source, bool isOption, Findings findings)
    {
        if (source.Text.Length > MaxLength)
        {
            findings.Add(ConditionsMessages.TooLarge(source.Name, source.Text.Length));
            return null;
        }

        return new JsonTree(source, isOption, findings).ReadAll();
    }

    private Node? ReadAll()
    {
        Utf8JsonReader reader = new(_bytes, new JsonReaderOptions { MaxDepth = 2 * MaxDepth, CommentHandling = JsonCommentHandling.Allow });
        try
        {
            Next(ref reader);
            Node root = ReadValue(ref reader, 0);
            _rootRead = true;
            Next(ref reader);
            return _tooDeep ? null : root;
        }
        catch (JsonException exception)
        {
            if (!_tooDeep)
                _findings.Add(JsonMistake.Explain(_source, _isOption, OffsetOf(exception), _rootRead));
            return null;
        }
    }

    /// <summary>The next token. Comments are told and passed over, so that mistakes behind them are told as well.</summary>
    private bool Next(ref Utf8JsonReader reader)
    {
        while (reader.Read())
        {
            if (reader.TokenType != JsonTokenType.Comment)
                return true;
            _findings.Add(ConditionsMessages.Comment(new Spot(_source, new Span(ToChar((int)reader.TokenStartIndex), CommentMark), _isOption)));
        }

        return false;
    }

    private Node ReadValue(ref Utf8JsonReader reader, int depth)
    {
        Spot spot = SpotOf(ref reader);
        if (depth > MaxDepth)
        {
            if (!_tooDeep)
                _findings.Add(ConditionsMessages.TooDeep(spot, MaxDepth));
            _tooDeep = true;
            throw new JsonException();
        }

        return reader.TokenType switch
        {
            JsonTokenType.StartObject => ReadObject(ref reader, spot, depth),
            JsonTokenType.StartArray => ReadArray(ref reader, spot, depth),
            JsonTokenType.String => new TextNode(spot, TextOf(ref reader, spot)),
            JsonTokenType.Number => new NumberNode(spot, Encoding.UTF8.GetString(reader.ValueSpan)),
            JsonTokenType.Null => new NullNode(spot),
            _ => new TruthNode(spot, reader.TokenType == JsonTokenType.True),
        };
    }

    private ObjectNode ReadObject(ref Utf8JsonReader reader, Spot start, int depth)
    {
        Dictionary<string, Member> members = new(StringComparer.Ordinal);
        while (Next(ref reader) && reader.TokenType != JsonTokenType.EndObject)
        {
            Spot nameSpot = SpotOf(ref reader);
            string name = TextOf(ref reader, nameSpot);
            Next(ref reader);
            Member member = new(name, nameSpot, ReadValue(ref reader, depth + 1));
            if (!members.TryAdd(name, member))
                _findings.Add(ConditionsMessages.DuplicateKey(nameSpot, name, members[name].NameSpot));
        }

        return new ObjectNode(Through(start, ref reader), [.. members.Values]);
    }

    private ArrayNode ReadArray(ref Utf8JsonReader reader, Spot start, int depth)
    {
        List<Node> items = [];
        while (Next(ref reader) && reader.TokenType != JsonTokenType.EndArray)
            items.Add(ReadValue(ref reader, depth + 1));
        return new ArrayNode(Through(start, ref reader), items);
    }

    private string TextOf(ref Utf8JsonReader reader, Spot spot)
    {
        try
        {
            return reader.GetString()!;
        }
        catch (InvalidOperationException)
        {
            // an escaped half of a surrogate pair is allowed by the grammar but is no text
            _findings.Add(ConditionsMessages.BrokenText(spot));
            return "";
        }
    }

    private Spot SpotOf(ref Utf8JsonReader reader)
    {
        int start = ToChar((int)reader.TokenStartIndex);
        bool isText = reader.TokenType is JsonTokenType.String or JsonTokenType.PropertyName;
        int length = Encoding.UTF8.GetCharCount(reader.ValueSpan) + (isText ? 2 : 0);
        return new Spot(_source, new Span(start, length), _isOption);
    }

    private Spot Through(Spot start, ref Utf8JsonReader reader) =>
        start with { Span = new Span(start.Span.Start, ToChar((int)reader.TokenStartIndex) + 1 - start.Span.Start) };

    /// <summary>Offsets only grow while reading, so that the whole walk costs one pass.</summary>
    private int ToChar(int byteOffset)
    {
        if (byteOffset > _lastByte)
        {
            _lastChar += Encoding.UTF8.GetCharCount(_bytes, _lastByte, byteOffset - _lastByte);
            _lastByte = byteOffset;
        }

        return _lastChar;
    }

    private int OffsetOf(JsonException exception)
    {
        int start = 0;
        for (long line = 0; line < exception.LineNumber; line++)
            start = Array.IndexOf(_bytes, (byte)'\n', start) + 1;
        int offset = (int)Math.Min(_bytes.Length, start + (exception.BytePositionInLine ?? 0));
        return Encoding.UTF8.GetCharCount(_bytes, 0, offset);
    }
}
