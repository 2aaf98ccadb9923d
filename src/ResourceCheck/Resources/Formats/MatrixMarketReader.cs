using System.Globalization;
using System.Numerics;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources.Formats;

/// <summary>
/// Reads the Matrix Market exchange format (Boisvert, Pozo and Remington, NIST IR 5935 (1996)): a first line with the kind, comment lines
/// that begin with %, a size line, then one entry a line; arrays run column after column. Rows and columns count from 1.
/// </summary>
internal sealed class MatrixMarketReader
{
    private readonly string _file;
    private readonly TextReader _reader;
    private readonly Findings _findings;
    private MatrixMarketHeader _header = new(false, false, MatrixSymmetry.General);
    private int _line;

    private MatrixMarketReader(string file, TextReader reader) => (_file, _reader, _findings) = (file, reader, new(file));

    /// <summary>Reads a state.</summary>
    public static Outcome<RawState> Read(string file, TextReader reader)
    {
        MatrixMarketReader work = new(file, reader);
        RawState? state = work.ReadHeader() && work.ReadSize() is { } size ? work.ReadEntries(size) : null;
        return work._findings.Any ? Outcome<RawState>.Failed(work._findings.All) : Outcome<RawState>.Of(state!);
    }

    private sealed record Size(StateShape Shape, int Rows, int Columns, long Entries);

    private bool ReadHeader()
    {
        string line = _reader.ReadLine() ?? "";
        _line = 1;
        if (MatrixMarketHeader.TryParse(line) is { } header)
            _header = header;
        else
            _findings.Add(StateMessages.MatrixBanner(PlaceOf(line, 0, line.Length)));
        return !_findings.Any;
    }

    private Size? ReadSize()
    {
        string line = NextLine() ?? "";
        long[] counts = [.. Words(line).Select(word => Whole(line[word]))];
        if (counts.Length != (_header.IsSparse ? 3 : 2) || counts.Contains(-1))
        {
            _findings.Add(StateMessages.MatrixSize(PlaceOf(line, 0, line.Length), _header.IsSparse));
            return null;
        }

        Outcome<StateShape> shape = ArrayShape.From(_file, counts[..2]);
        foreach (Diagnostic finding in shape.Findings)
            _findings.Add(finding with { Place = PlaceOf(line, 0, line.Length) });
        if (shape.Value is not { } found)
            return null;
        if (_header.Symmetry != MatrixSymmetry.General && counts[0] != counts[1])
            _findings.Add(StateMessages.MatrixNotSquare(PlaceOf(line, 0, line.Length)));
        return _findings.Any ? null : new(found, (int)counts[0], (int)counts[1], _header.IsSparse ? counts[2] : Stored(counts[0], counts[1]));
    }

    private long Stored(long rows, long columns) =>
        _header.Symmetry == MatrixSymmetry.General ? rows * columns : rows * (rows + 1) / 2;

    private RawState? ReadEntries(Size size)
    {
        MatrixEntries entries = new(size.Rows, size.Columns, _header.Symmetry);
        long read = 0;
        while (!_findings.Full && NextLine() is { } line)
        {
            read++;
            if (read <= size.Entries)
                ReadEntry(line, entries);
        }

        if (read != size.Entries && !_findings.Full)
            _findings.Add(StateMessages.MatrixCount(_file, size.Entries, read));
        return _findings.Any ? null : new(size.Shape, entries.Numbers, false);
    }

    private void ReadEntry(string line, MatrixEntries entries)
    {
        Range[] words = [.. Words(line)];
        int indices = _header.IsSparse ? 2 : 0;
        if (words.Length != indices + (_header.IsComplex ? 2 : 1))
        {
            _findings.Add(StateMessages.MatrixEntry(PlaceOf(line, 0, line.Length), _header.IsSparse, _header.IsComplex));
            return;
        }

        double[] parts = [.. words.Skip(indices).Select(word => Number(line, word))];
        (long row, long column) = _header.IsSparse ? (Whole(line[words[0]]) - 1, Whole(line[words[1]]) - 1) : entries.Next();
        MatrixEntryFault fault = parts.All(double.IsFinite) ? entries.Set(row, column, new(parts[0], parts.ElementAtOrDefault(1))) : MatrixEntryFault.None;
        if (fault != MatrixEntryFault.None)
            _findings.Add(StateMessages.MatrixFault(PlaceOf(line, 0, line.Length), fault, entries.Rows, entries.Columns));
    }

    /// <summary>A finite number, else NaN and a finding.</summary>
    private double Number(string line, Range word)
    {
        const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;
        if (double.TryParse(line[word], Style, CultureInfo.InvariantCulture, out double number) && double.IsFinite(number))
            return number;
        (int start, int length) = word.GetOffsetAndLength(line.Length);
        _findings.Add(StateMessages.MatrixNumber(PlaceOf(line, start, length)));
        return double.NaN;
    }

    private static long Whole(string word) =>
        long.TryParse(word, NumberStyles.None, CultureInfo.InvariantCulture, out long whole) ? whole : -1;

    /// <summary>The next line that is neither blank nor, before the entries, a comment.</summary>
    private string? NextLine()
    {
        while (_reader.ReadLine() is { } line)
        {
            _line++;
            if (line.AsSpan().Trim() is not ("" or ['%', ..]))
                return line;
        }

        return null;
    }

    private static IEnumerable<Range> Words(string line)
    {
        for (int at = 0; at < line.Length;)
        {
            int start = at;
            while (at < line.Length && !char.IsWhiteSpace(line[at]))
                at++;
            if (at > start)
                yield return start..at;
            else
                at++;
        }
    }

    private Place PlaceOf(string line, int start, int length) => TextPlaces.InLine(_file, Math.Max(1, _line), line, start, length);
}
