using System.Numerics;
using System.Text.Json;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources.Formats;

/// <summary>
/// Reads the tool's own JSON form of a state: <c>parties</c>, optionally <c>levels</c>, and one of <c>vector</c>, <c>density</c> (rows) and
/// <c>terms</c> (amplitudes by levels such as <c>0-2-1</c>). A number is <c>0.5</c> or <c>[0.5, -0.25]</c>. The reader of the base library
/// goes through the bytes once, so that large matrices need no tree, and refuses comments, trailing commas and NaN.
/// </summary>
internal ref struct JsonStateReader
{
    private readonly string _file;
    private readonly ReadOnlySpan<byte> _text;
    private readonly Findings _findings;
    private readonly JsonState _state = new();
    private Utf8JsonReader _reader;

    private JsonStateReader(string file, ReadOnlySpan<byte> text)
    {
        (_file, _findings) = (file, new(file));
        _text = text;
        _reader = new(text);
    }

    /// <summary>Reads a state.</summary>
    public static Outcome<RawState> Read(string file, ReadOnlySpan<byte> text)
    {
        ReadOnlySpan<byte> mark = [0xEF, 0xBB, 0xBF];
        JsonStateReader work = new(file, text.StartsWith(mark) ? text[mark.Length..] : text);
        work.ReadAll();
        RawState? raw = work._findings.Any ? null : work.Assemble();
        return work._findings.Any ? Outcome<RawState>.Failed(work._findings.All) : Outcome<RawState>.Of(raw!);
    }

    private void ReadAll()
    {
        try
        {
            _reader.Read();
            if (Opens(JsonTokenType.StartObject, "an object with `parties` and a state"))
                ReadMembers();
            while (_reader.Read())
                _reader.Skip();
        }
        catch (JsonException slip)
        {
            int start = StartOf(slip);
            _findings.Add(StateMessages.JsonSyntax(PlaceOf(start, 1)));
        }
        catch (InvalidOperationException)
        {
            // A string that is no valid UTF-8 or holds half a surrogate pair.
            _findings.Add(StateMessages.JsonSyntax(Here()));
        }
    }

    private void ReadMembers()
    {
        HashSet<string> seen = [];
        while (_reader.Read() && _reader.TokenType != JsonTokenType.EndObject)
        {
            string name = _reader.GetString()!;
            int start = (int)_reader.TokenStartIndex;
            bool first = seen.Add(name);
            if (!first)
                _findings.Add(StateMessages.JsonTwice(Here(), name));
            _reader.Read();
            if (first)
                ReadMember(name, start);
            else
                _reader.Skip();
        }
    }

    private void ReadMember(string name, int start)
    {
        switch (name)
        {
            case "parties":
                _state.Parties = ReadCount();
                break;
            case "levels":
                _state.Levels = ReadCount();
                break;
            case "vector":
                _state.Vector = [];
                ReadNumbers(_state.Vector, StateShape.LargestVector);
                break;
            case "density":
                _state.Density = [];
                ReadRows();
                break;
            case "terms":
                _state.Terms = [];
                ReadTerms(_state.Terms);
                break;
            default:
                _findings.Add(StateMessages.JsonKey(PlaceOf(start, name.Length + 2), name));
                _reader.Skip();
                break;
        }
    }

    private int ReadCount()
    {
        if (_reader.TokenType == JsonTokenType.Number && _reader.TryGetInt32(out int count) && count >= 2)
            return count;
        Refuse("a whole number from 2");
        return 2;
    }

    private void ReadNumbers(List<Complex> numbers, int most)
    {
        if (!Opens(JsonTokenType.StartArray, "a list of numbers"))
            return;
        int start = (int)_reader.TokenStartIndex;
        int end = (int)Math.Min((long)numbers.Count + most, int.MaxValue);
        bool tooLong = false;
        while (_reader.Read() && _reader.TokenType != JsonTokenType.EndArray)
        {
            tooLong |= numbers.Count == end;
            Complex number = ReadNumber();
            if (!tooLong)
                numbers.Add(number);
        }

        if (tooLong)
            _findings.Add(StateMessages.JsonTooLong(PlaceOf(start, 1), most));
    }

    private void ReadRows()
    {
        if (!Opens(JsonTokenType.StartArray, "a list of rows"))
            return;
        while (_reader.Read() && _reader.TokenType != JsonTokenType.EndArray)
        {
            int start = (int)_reader.TokenStartIndex;
            int before = _state.Density!.Count;
            if (_state.Rows == StateShape.LargestDensity)
            {
                _findings.Add(StateMessages.JsonTooLong(PlaceOf(start, 1), StateShape.LargestDensity));
                SkipRest();
                return;
            }

            ReadNumbers(_state.Density, StateShape.LargestDensity);
            int length = _state.Density.Count - before;
            if (_state.Rows++ == 0)
                _state.RowLength = length;
            else if (length != _state.RowLength)
                _findings.Add(StateMessages.JsonRow(PlaceOf(start, 1), _state.Rows, length, _state.RowLength));
        }
    }

    private void ReadTerms(List<JsonTerm> terms)
    {
        if (!Opens(JsonTokenType.StartObject, "an object of amplitudes by levels, such as {\"0-1\": 1}"))
            return;
        HashSet<string> seen = [];
        while (_reader.Read() && _reader.TokenType != JsonTokenType.EndObject)
        {
            string label = _reader.GetString()!;
            int start = (int)_reader.TokenStartIndex;
            if (terms.Count == StateShape.LargestVector)
            {
                _findings.Add(StateMessages.JsonTooLong(Here(), StateShape.LargestVector));
                SkipRest();
                return;
            }

            if (!seen.Add(label))
                _findings.Add(StateMessages.JsonTwice(Here(), label));
            _reader.Read();
            terms.Add(new(label, ReadNumber(), start));
        }
    }

    private Complex ReadNumber()
    {
        if (_reader.TokenType != JsonTokenType.StartArray)
            return new(ReadPart(), 0);
        int start = (int)_reader.TokenStartIndex;
        List<double> parts = [];
        while (_reader.Read() && _reader.TokenType != JsonTokenType.EndArray)
        {
            double part = ReadPart();
            if (parts.Count <= 2)
                parts.Add(part);
        }

        if (parts.Count == 2)
            return new(parts[0], parts[1]);
        _findings.Add(StateMessages.JsonValue(PlaceOf(start, 1), "a number, or its real and imaginary part as [0.5, -0.25],"));
        return Complex.Zero;
    }

    private double ReadPart()
    {
        if (_reader.TokenType == JsonTokenType.Number && _reader.TryGetDouble(out double part) && double.IsFinite(part))
            return part;
        Refuse("a finite number");
        return 0;
    }

    private bool Opens(JsonTokenType bracket, string wanted)
    {
        if (_reader.TokenType == bracket)
            return true;
        Refuse(wanted);
        return false;
    }

    private void Refuse(string wanted)
    {
        _findings.Add(StateMessages.JsonValue(Here(), wanted));
        _reader.Skip();
    }

    private void SkipRest()
    {
        int depth = _reader.CurrentDepth - 1;
        while (_reader.CurrentDepth > depth && _reader.Read())
            _reader.Skip();
    }

    private RawState? Assemble()
    {
        int given = (_state.Vector is null ? 0 : 1) + (_state.Density is null ? 0 : 1) + (_state.Terms is null ? 0 : 1);
        if (_state.Parties is not { } parties || given != 1)
        {
            _findings.Add(StateMessages.JsonMissing(_file, _state.Parties is null, given));
            return null;
        }

        int levels = _state.Levels ?? parties;
        if (StateShape.Of(parties, levels, _state.Density is null) is { } shape)
            return Assemble(shape);
        _findings.Add(StateMessages.TooLarge(_file, Math.Pow(levels, parties), _state.Density is null));
        return null;
    }

    private RawState? Assemble(StateShape shape)
    {
        if (_state.Terms is { } terms)
            return FromTerms(shape, terms);
        int rows = _state.Vector?.Count ?? _state.Rows;
        if (rows != shape.Dimension || (_state.Density is not null && _state.RowLength != shape.Dimension))
            _findings.Add(StateMessages.JsonSize(_file, shape, rows, _state.RowLength));
        return _findings.Any ? null : new(shape, [.. _state.Vector ?? _state.Density!], false);
    }

    private RawState FromTerms(StateShape shape, List<JsonTerm> terms)
    {
        Complex[] ket = new Complex[shape.Dimension];
        foreach (JsonTerm term in terms)
        {
            if (term.IndexIn(shape) is { } index)
                ket[index] = term.Amplitude;
            else
                _findings.Add(StateMessages.JsonLabel(PlaceOf(term.Start, term.Label.Length + 2), term.Label, shape));
        }

        return new(shape, ket, false);
    }

    private readonly int StartOf(JsonException slip)
    {
        int start = 0;
        for (long line = slip.LineNumber ?? 0; line > 0; line--)
            start += _text[start..].IndexOf((byte)'\n') + 1;
        return start + (int)(slip.BytePositionInLine ?? 0);
    }

    private readonly Place Here() =>
        PlaceOf((int)_reader.TokenStartIndex, _reader.HasValueSequence ? 1 : Math.Max(1, (int)(_reader.BytesConsumed - _reader.TokenStartIndex)));

    /// <summary>Finding a line takes a walk through the text, which is spared for findings that are not listed any more.</summary>
    private readonly Place PlaceOf(int start, int length) =>
        _findings.Full ? Place.Of(_file) : TextPlaces.InBytes(_file, _text, start, length);
}
